import { QueryTypes } from 'sequelize';
import { nextSeries, type Suggested } from '#core/series/next-series.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { SeriesFor } from '#server/queries/series/series-for.ts';
import { openSeries, type OpenSeries } from '#server/queries/shop/open-series.ts';

const MOST = 3;
const LOOKED_THROUGH = 500;

/** Open series that may follow a finished one, of which she has none yet. */
export async function whatNext(actor: Actor, { slug, techniques, workroom: { handle } }: SeriesFor): Promise<Suggested<OpenSeries>[]> {
  const [open, seats] = await Promise.all([
    openSeries({ limit: LOOKED_THROUGH }),
    sequelize.query<{ slug: string }>("SELECT s.slug FROM enrolments e JOIN series s ON s.id = e.series_id WHERE e.user_id = ? AND e.state = 'active'", { replacements: [actor.userId], type: QueryTypes.SELECT }),
  ]);
  return nextSeries({ slug, handle, techniques }, open, new Set(seats.map((seat) => seat.slug)), MOST);
}

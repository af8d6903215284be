/** Pieces on the shared wall, as one person sees them. */
import { QueryTypes } from 'sequelize';
import type { Piece } from '#core/craft/crafts.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { isOnWall, mayTakeDown } from '#server/policies/finish.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

export interface WallPieceShown {
  readonly publicId: string;
  readonly name: string;
  readonly words: string;
  readonly hungAt: Date;
  readonly seriesSlug: string;
  readonly seriesTitle: string;
  readonly photo: { readonly publicId: string; readonly width: number; readonly height: number };
  readonly pattern: Piece | null;
  readonly mine: MyPiece;
  readonly woven: WovenSoFar;
  readonly mayTakeDown: boolean;
}

/** One that was taken down: its words for who may put it back. Its photo is nobody's to see but its maker's. */
export interface TakenDown {
  readonly publicId: string;
  readonly name: string;
  readonly words: string;
  readonly why: string;
  readonly seriesTitle: string;
}

export interface Wall {
  /** The newest first. */
  readonly shown: readonly WallPieceShown[];
  readonly hasMore: boolean;
  /** Empty for whoever may not put one back. */
  readonly takenDown: readonly TakenDown[];
}

interface Row {
  readonly publicId: string; readonly name: string; readonly words: string; readonly hungAt: Date; readonly hiddenAt: Date | null; readonly hiddenWhy: string; readonly withdrawnAt: Date | null;
  readonly seatState: string; readonly seriesState: string; readonly seriesSlug: string; readonly seriesTitle: string; readonly workroomId: number;
  readonly mediaId: string; readonly width: number | null; readonly height: number | null; readonly isSamePhoto: number;
  readonly pattern: Piece | null; readonly mine: MyPiece | null; readonly woven: WovenSoFar | null;
}

const ROWS = `
  SELECT w.public_id AS publicId, w.shown_name AS name, w.words, w.agreed_at AS hungAt, w.hidden_at AS hiddenAt, w.hidden_why AS hiddenWhy, w.withdrawn_at AS withdrawnAt,
         e.state AS seatState, s.state AS seriesState, s.slug AS seriesSlug, s.title AS seriesTitle, s.workroom_id AS workroomId,
         d.public_id AS mediaId, d.width, d.height, (f.media_id <=> w.media_id) AS isSamePhoto, p.data AS pattern, m.data AS mine, m.woven
    FROM wall_pieces w
    JOIN enrolments e ON e.id = w.enrolment_id
    JOIN series s ON s.id = e.series_id
    JOIN finished_pieces f ON f.enrolment_id = e.id
    JOIN media d ON d.id = w.media_id
    LEFT JOIN pieces p ON p.series_id = s.id
    LEFT JOIN my_pieces m ON m.enrolment_id = e.id
   WHERE w.withdrawn_at IS NULL AND e.state = 'active' AND s.state = 'published' AND f.media_id = w.media_id`;

function factsOf(row: Pick<Row, 'seatState' | 'seriesState' | 'withdrawnAt' | 'isSamePhoto' | 'hiddenAt'>) {
  return { seatActive: row.seatState === 'active', seriesPublished: row.seriesState === 'published', agreed: row.withdrawnAt === null && row.isSamePhoto === 1, hidden: row.hiddenAt !== null };
}

/** @param of the slug of one series, and how many at most, from which on */
export async function wallPieces(actor: Actor | null, { series = null, limit, offset = 0 }: { readonly series?: string | null; readonly limit: number; readonly offset?: number }): Promise<Wall> {
  const rows = await sequelize.query<Row>(
    `${ROWS} AND w.hidden_at IS NULL AND (:series IS NULL OR s.slug = :series) ORDER BY w.agreed_at DESC, w.id DESC LIMIT :most OFFSET :offset`,
    { replacements: { series, most: limit + 1, offset }, type: QueryTypes.SELECT },
  );
  const shown = rows.slice(0, limit).filter((row) => isOnWall(factsOf(row))).map(({ publicId, name, words, hungAt, seriesSlug, seriesTitle, workroomId, mediaId, width, height, pattern, mine, woven }) => ({
    publicId, name, words, hungAt, seriesSlug, seriesTitle, pattern, mine: mine ?? {}, woven: woven ?? NOTHING_WOVEN,
    photo: { publicId: mediaId, width: width ?? 1, height: height ?? 1 }, mayTakeDown: mayTakeDown(actor, workroomId),
  }));
  return { shown, hasMore: rows.length > limit, takenDown: await takenDownFor(actor, series) };
}

/** Whether everybody may see this photo of a finished piece. */
export async function isPhotoOnWall(mediaId: number): Promise<boolean> {
  const rows = await sequelize.query<Row>(`${ROWS} AND w.media_id = :mediaId`, { replacements: { mediaId }, type: QueryTypes.SELECT });
  return rows.some((row) => isOnWall(factsOf(row)));
}

async function takenDownFor(actor: Actor | null, series: string | null): Promise<TakenDown[]> {
  if (actor === null || (actor.workroomId === null && !maySeeOffice(actor))) return [];
  const rows = await sequelize.query<Row>(
    `${ROWS} AND w.hidden_at IS NOT NULL AND (:series IS NULL OR s.slug = :series) AND (:all OR s.workroom_id = :workroom) ORDER BY w.hidden_at DESC LIMIT 50`,
    { replacements: { series, all: maySeeOffice(actor), workroom: actor.workroomId ?? 0 }, type: QueryTypes.SELECT },
  );
  return rows.filter(({ workroomId }) => mayTakeDown(actor, workroomId)).map(({ publicId, name, words, hiddenWhy, seriesTitle }) => ({ publicId, name, words, why: hiddenWhy, seriesTitle }));
}

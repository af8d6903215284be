/** A technique as visitors meet it: the open series that teach it, however their teachers write its name. */
import { QueryTypes } from 'sequelize';
import { techniqueKey } from '#core/series/technique-guide.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { seriesTeaching, type ShopSeries } from './shop-series.ts';

export interface TaughtTechnique {
  readonly key: string;
  /** As teachers write it. */
  readonly spellings: readonly string[];
}

/** Those that open series teach. One statement. */
export async function taughtTechniques(): Promise<TaughtTechnique[]> {
  const rows = await sequelize.query<{ techniques: readonly string[] }>("SELECT techniques FROM series WHERE state = 'published'", { type: QueryTypes.SELECT });
  const spelled = new Map<string, string[]>();
  for (const name of new Set(rows.flatMap(({ techniques }) => techniques))) {
    const key = techniqueKey(name);
    if (key !== '') spelled.set(key, [...(spelled.get(key) ?? []), name]);
  }
  return [...spelled].map(([key, spellings]) => ({ key, spellings })).toSorted((a, b) => (a.key < b.key ? -1 : 1));
}

/** Four statements at most; none of the series is a draft. */
export async function techniquePage(key: string): Promise<{ readonly spellings: readonly string[]; readonly series: readonly ShopSeries[] }> {
  const spellings = (await taughtTechniques()).find((technique) => technique.key === key)?.spellings ?? [];
  return { spellings, series: spellings.length === 0 ? [] : await seriesTeaching(spellings) };
}

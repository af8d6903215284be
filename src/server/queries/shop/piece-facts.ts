/**
 * What the shop shows of pieces: their figures and their picture, reckoned once for each change of a piece and then
 * kept, since every visitor asks for the same ones.
 */
import { QueryTypes } from 'sequelize';
import type { ClothPiece } from '#core/craft/cloth/cloth-piece.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import type { Piece } from '#core/craft/crafts.ts';
import { planPiece } from '#core/craft/plan.ts';
import { seriesFigures, type SeriesFigures } from '#core/series/figures.ts';
import { titleHalves } from '#core/series/title.ts';
import { sequelize } from '#server/db/sequelize.ts';

export interface PieceFacts {
  readonly figures: SeriesFigures;
  readonly cloth: ClothPiece;
}

export interface PieceAsked {
  readonly id: number;
  readonly title: string;
  /** Null: the series has no piece. */
  readonly revision: number | null;
}

interface Row { readonly id: number; readonly revision: number; readonly data: Piece }
interface Kept { readonly key: string; readonly facts: PieceFacts | null }

const MOST_KEPT = 400;
const kept = new Map<number, Kept>();

const keyOf = ({ title, revision }: PieceAsked): string => `${String(revision)} ${title}`;

/** By series id; a series without a piece that can be woven is left out. At most one statement. */
export async function pieceFacts(series: readonly PieceAsked[]): Promise<ReadonlyMap<number, PieceFacts>> {
  const described = series.filter(({ revision }) => revision !== null);
  const missing = described.filter((one) => kept.get(one.id)?.key !== keyOf(one));
  if (missing.length > 0) await reckon(missing);
  return new Map(described.flatMap(({ id }): [number, PieceFacts][] => {
    const facts = kept.get(id)?.facts ?? null;
    return facts === null ? [] : [[id, facts]];
  }));
}

async function reckon(missing: readonly PieceAsked[]): Promise<void> {
  const rows = await sequelize.query<Row>('SELECT series_id AS id, revision, data FROM pieces WHERE series_id IN (:ids)', {
    replacements: { ids: missing.map(({ id }) => id) }, type: QueryTypes.SELECT,
  });
  if (kept.size + rows.length > MOST_KEPT) kept.clear();
  for (const asked of missing) {
    const row = rows.find(({ id }) => id === asked.id);
    if (row !== undefined) kept.set(asked.id, { key: keyOf({ ...asked, revision: row.revision }), facts: factsOf(row.data, titleHalves(asked.title).name) });
  }
}

function factsOf(piece: Piece, name: string): PieceFacts | null {
  const plan = planPiece(piece);
  return plan.ok ? { figures: seriesFigures(piece, plan.value), cloth: clothOf(piece, plan.value, name) } : null;
}

/** One band becomes two that come to the same height, woven one after the other. */
import { rowHeights } from '#core/craft/frame-loom/own-heights.ts';
import type { Band, FrameLoomPiece, Shape } from '#core/craft/piece.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import { heightOfShape } from '#core/craft/shapes.ts';
import { bandFields, FILL_KEY } from './asked-of-band.ts';
import { fieldText } from './field-text.ts';
import { judgeTyped } from './judge-typed.ts';
import { nextId, type Texts, type TypedBand, type TypedPiece, type TypedRow } from './typed-piece.ts';

export type Split =
  | { readonly ok: true; readonly typed: TypedPiece }
  /** A sentence for the weaver. */
  | { readonly ok: false; readonly says: string };

const no = (says: string): Split => ({ ok: false, says });

/**
 * The form with two bands in place of band `index`: half the rows each, shapes with the half they stand in, the name with
 * the first. A filling band goes on filling as the second. Soumak loses the tabby between its halves; where no band fills,
 * the piece gets lower by as much. Only what can be woven can be split.
 */
export function splitBand(typed: TypedPiece, index: number): Split {
  const own = typed.bands[index];
  const judged = judgeTyped(typed);
  if (own === undefined) return no('There is no such band.');
  if (!judged.ok) return no('A band can be split once the piece can be woven.');
  const { piece, plan } = judged;
  const band = piece.bands[index];
  const heightMm = plan.bands[index]?.heightMm ?? 0;
  if (band === undefined || band.technique === 'hem-stitch') return no('A hem-stitch has nothing to split.');
  const cut = band.technique === 'tabby' ? cutTabby(piece, index, heightMm) : cutRows(band, heightMm, rowHeights(piece)?.[index] ?? 0);
  if (cut === null) return no(band.technique === 'tabby' && (band.shapes?.length ?? 0) > 0 ? 'Its shapes leave no row to split it at.' : 'It has one row only.');
  const bands = [...typed.bands.slice(0, index), ...halves(typed, own, cut), ...typed.bands.slice(index + 1)];
  const sizeMm = cut.lostMm > 1e-6 && piece.bands.every((one) => !('fill' in one)) ? piece.size.heightMm - cut.lostMm : undefined;
  const texts = sizeMm === undefined ? typed.texts : { ...typed.texts, 'size.heightMm': lengthText(Number(sizeMm.toFixed(4)), typed) };
  return { ok: true, typed: { ...typed, texts, bands } };
}

interface Cut {
  /** What each half is asked, by key. */
  readonly first: Readonly<Record<string, number>>;
  readonly second: Readonly<Record<string, number>>;
  /** The second goes on filling. */
  readonly fills?: boolean;
  /** Where it is cut, for shapes; from the band's first row. */
  readonly atMm: number;
  readonly shapes: readonly Shape[];
  /** What both together are lower than the whole was. */
  readonly lostMm: number;
}

const lengthText = (mm: number, { units }: TypedPiece): string => fieldText(mm, { key: '', kind: 'length', label: '' }, units);

const tenths = (mm: number): number => Number((roundHalfUp(mm * 10) / 10).toFixed(1));

/** At the row nearest to the middle that no shape crosses. */
function cutTabby(piece: FrameLoomPiece, index: number, heightMm: number): Cut | null {
  const band = piece.bands[index];
  const rowMm = rowHeights(piece)?.[index] ?? 0;
  if (band?.technique !== 'tabby' || rowMm <= 0) return null;
  const shapes = band.shapes ?? [];
  const rows = roundHalfUp(heightMm / rowMm);
  const isFree = (row: number): boolean => shapes.every((shape) => { const foot = shape.bottomMm ?? 0; const at = tenths(row * rowMm); return at <= foot || at >= foot + heightOfShape(shape); });
  const row = Array.from({ length: Math.max(0, rows - 1) }, (_, at) => at + 1).filter(isFree).toSorted((a, b) => Math.abs(a - rows / 2) - Math.abs(b - rows / 2))[0];
  if (row === undefined) return null;
  const atMm = tenths(row * rowMm);
  return band.fill === true
    ? { first: { heightMm: atMm }, second: {}, fills: true, atMm, shapes, lostMm: 0 }
    : { first: { heightMm: atMm }, second: { heightMm: Number((heightMm - atMm).toFixed(4)) }, atMm, shapes, lostMm: 0 };
}

/** Rows, passes and height of everything that is no tabby. */
function cutRows(band: Exclude<Band, { technique: 'tabby' | 'hem-stitch' }>, heightMm: number, rowMm: number): Cut | null {
  const key = band.technique === 'roving' ? 'passes' : 'rows';
  const rows = band.technique === 'roving' ? (band.passes ?? 1) : band.rows;
  if (rows < 2) return null;
  const ofFirst = Math.ceil(rows / 2);
  const atMm = tenths((heightMm * ofFirst) / rows);
  const heights = 'heightMm' in band ? [{ heightMm: atMm }, { heightMm: Number((heightMm - atMm).toFixed(4)) }] : [{}, {}];
  return { first: { [key]: ofFirst, ...heights[0] }, second: { [key]: rows - ofFirst, ...heights[1] }, atMm, shapes: [], lostMm: rowMm > 0 ? rows * rowMm - heightMm : 0 };
}

function halves(typed: TypedPiece, own: TypedBand, { first, second, fills = false, atMm, shapes }: Cut): readonly [TypedBand, TypedBand] {
  const { bands, units } = typed;
  const asked = bandFields(own.texts['technique'] ?? '');
  const texts = (values: Readonly<Record<string, number>>): Texts => Object.fromEntries(asked.filter(({ key }) => values[key] !== undefined).map((one) => [one.key, fieldText(values[one.key], one, units)]));
  const stands = (at: number): boolean => (shapes[at]?.bottomMm ?? 0) < atMm;
  const lower = own.shapes.filter((_, at) => stands(at));
  const upper = own.shapes.flatMap((shape, at): TypedRow[] => {
    const foot = shapes[at]?.bottomMm ?? 0;
    return stands(at) ? [] : [{ ...shape, texts: { ...shape.texts, bottomMm: lengthText(Number((foot - atMm).toFixed(4)), typed) } }];
  });
  return [
    { ...own, texts: { ...own.texts, [FILL_KEY]: '', ...texts(first) }, shapes: lower },
    { id: nextId(bands), texts: { ...own.texts, name: '', ...texts(second), [FILL_KEY]: fills ? 'yes' : '', ...(fills ? { heightMm: '' } : {}) }, shapes: upper },
  ];
}

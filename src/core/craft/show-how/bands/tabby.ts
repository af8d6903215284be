/** Tabby: rows in the band's height, and where shapes stand in it the areas of every colour. */
import type { Edge } from '#core/craft/colour-areas.ts';
import { picksInHeight } from '#core/craft/picks.ts';
import type { BandOf, ToldBand, ToldUse } from '#core/craft/show-how/bands/band.ts';
import { noteShape } from '#core/craft/show-how/explain-shape.ts';
import { asWound } from '#core/craft/show-how/explain-warp.ts';
import { ofRole, type PickWorkings } from '#core/craft/show-how/explain-weft.ts';
import { from, standing } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput, WorkingUnit } from '#core/craft/show-how/working.ts';
import { isSymmetric } from '#core/craft/techniques/colour-rows.ts';
import { colourRows, pickIn, type ColourRows } from '#core/craft/techniques/tabby.ts';
import { pickKey } from '#core/craft/techniques/technique.ts';

/** How a yarn of this band lies in its rows. */
const picksIn = ({ on, band }: BandOf<'tabby'>, role: string): PickWorkings => ofRole(on.weft.picks, pickKey(pickIn(band, role)));

const counted = (symbol: string, name: string, value: number, unit: WorkingUnit = 'count'): WorkingInput => standing({ symbol, name, value, unit }, RULES.drawnRows);

/** What each kind of edge adds to an area's steps. */
const EDGES: readonly { readonly symbol: string; readonly name: string; readonly edges: readonly Edge[]; readonly formula: string }[] = [
  { symbol: 'a', name: 'edges at a selvedge or a slit', edges: ['selvedge', 'slit'], formula: 'a * t / 2' },
  { symbol: 'b', name: 'dovetailed edges', edges: ['dovetail'], formula: 'b * (t + l) / 2' },
  { symbol: 'c', name: 'interlocked edges', edges: ['interlock'], formula: 'c * (l / 2 + pi * d / 4)' },
];

/** Thread of one colour beside others; undefined where it lies in full rows only. */
function noteAreas(of: BandOf<'tabby'>, role: string, { shaped }: ColourRows, full: Working | undefined): Working | undefined {
  const { on, prefix, woven } = of;
  const areas = shaped.flat().filter(({ yarn }) => yarn === role);
  if (areas.length === 0) return undefined;
  const { step, turn, weftDiameter } = picksIn(of, role);
  const edges = areas.flatMap(({ left, right }) => [left, right]);
  const kinds = EDGES.map((kind) => ({ ...kind, count: edges.filter((edge) => kind.edges.includes(edge)).length })).filter(({ count }) => count > 0);
  const formula = ['sum(n - 1) * l', ...kinds.map((kind) => kind.formula)].join(' + ');
  const ends: WorkingInput = { symbol: 'n', name: 'ends of each area, row by row', value: areas.map((area) => area.ends), unit: 'count', ...RULES.drawnRows };
  const lengths = [from('l', step), from('t', turn), from('d', weftDiameter)];
  const used = lengths.filter(({ symbol }) => new RegExp(`\\b${symbol}\\b`, 'u').test(formula));
  const threadMm = woven.uses.find((use) => use.role === role)?.threadMm ?? 0;
  return on.book.note({
    id: `${prefix}areasMm.${role}`, name: 'thread in the rows that several colours share', formula, inputs: [ends, ...kinds.map(({ symbol, name, count }) => counted(symbol, name, count)), ...used],
    value: threadMm - (full?.value ?? 0), unit: 'mm', ...RULES.colourRows,
  });
}

function noteShapes(of: BandOf<'tabby'>): void {
  const { band, index, on, prefix } = of;
  const { spacing: p2, endSpacing, ends } = picksIn(of, band.yarn);
  band.shapes?.forEach((shape, at) => {
    const grid = { spacingMm: endSpacing.value, pickSpacingMm: p2.value, ends: ends.value, symmetric: shape.shape !== 'points' && isSymmetric(shape) };
    noteShape(on.book, `${prefix}shapes.${String(at)}.`, shape, grid, {
      path: `/bands/${String(index)}/shapes/${String(at)}`, p: from('p', endSpacing), p2: from('p2', p2), E: asWound('E', ends),
    });
  });
}

/** The rows of the ground from edge to edge; undefined if there are no others beside them. */
function noteFull({ on, prefix, band, woven }: BandOf<'tabby'>, picks: Working, rows: ColourRows, pick: Working): Working | undefined {
  if (rows.shaped.length === 0) return undefined;
  const shaped = counted('s', 'rows that shapes stand in', rows.shaped.length);
  const full = on.book.note({
    id: `${prefix}fullRows`, name: 'rows from edge to edge', formula: 'N - s', inputs: [from('N', picks), shaped], value: rows.fullRows, unit: 'count', ...RULES.count,
  });
  const changes = woven.work.colourChanges ?? 0;
  on.book.note({
    id: `${prefix}colourChanges`, name: 'places where one colour meets another', formula: 'c', inputs: [counted('c', 'places in all rows', changes)], value: changes, unit: 'count', ...RULES.drawnRows,
  });
  return on.book.note({
    id: `${prefix}fullRowsMm.${band.yarn}`, name: 'thread of the rows from edge to edge', formula: 'n * L', inputs: [from('n', full), from('L', pick)],
    value: rows.fullRows * pick.value, unit: 'mm', ...RULES.arithmetic,
  });
}

export function noteTabby(of: BandOf<'tabby'>): ToldBand {
  const { on: { book }, prefix, band, woven, heightMm, height } = of;
  const { spacing: p2, pick } = picksIn(of, band.yarn);
  const raw = book.note({
    id: `${prefix}rawPicks`, name: 'rows before rounding', formula: 'h / p2', inputs: [from('h', height), from('p2', p2)], value: woven.picks?.rawRows ?? 0, unit: 'ratio', ...RULES.arithmetic,
  });
  const picks = book.note({
    id: `${prefix}picks`, name: 'rows', formula: 'floor(n + 0.5 + 1e-9)', inputs: [from('n', raw)], value: picksInHeight(heightMm, p2.value), unit: 'count', ...RULES.wholeNumbers,
  });
  noteShapes(of);
  const rows = colourRows(band, heightMm, of.on.piece.laid);
  const full = noteFull(of, picks, rows, pick);
  const uses = woven.uses.map((use): ToldUse => {
    const own = use.role === band.yarn ? full : undefined;
    const areas = noteAreas(of, use.role, rows, own);
    const parts = [...(own === undefined ? [] : [from('f', own)]), ...(areas === undefined ? [] : [from('a', areas)])];
    const all = parts.length === 0 ? { formula: 'N * L', inputs: [from('N', picks), from('L', pick)] } : { formula: parts.map(({ symbol }) => symbol).join(' + '), inputs: parts };
    const thread = book.note({ id: `${prefix}tabbyMm.${use.role}`, name: 'thread of all rows', ...all, value: use.threadMm, unit: 'mm', ...RULES.arithmetic });
    const fullRows = use.role === band.yarn ? { full: full ?? thread } : {};
    return { kind: 'tabby', role: use.role, carry: use.carry, thread, row: picksIn(of, use.role).pick, strands: picksIn(of, use.role).strands, ...fullRows };
  });
  const changes = book.workings.find(({ id }) => id === `${prefix}colourChanges`);
  return { uses, work: changes === undefined ? { rows: picks } : { rows: picks, colourChanges: changes } };
}

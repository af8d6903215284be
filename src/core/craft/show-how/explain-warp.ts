/** Dressing the loom: ends, nails, height, and the warp yarn they take. */
import { ASHENHURST_K, DEFAULT_ALLOWANCES, HANGING, RAIL_MARGIN_MM, TOP_FOR_TYING_MM } from '#core/craft/defaults.ts';
import { endsPerMm } from '#core/craft/nails.ts';
import { endsFor } from '#core/craft/ends.ts';
import { holderStep, loomKind } from '#core/craft/looms/looms.ts';
import type { Loom } from '#core/craft/piece.ts';
import { layoutOf } from '#core/craft/frame-loom/room.ts';
import { warpRun } from '#core/craft/frame-loom/count-yarn.ts';
import { topForDowel, topForHanging } from '#core/craft/loom-height.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import { noteLowerEnds } from '#core/craft/show-how/explain-lower-ends.ts';
import { noteThread, type ThreadWorkings } from '#core/craft/show-how/explain-thread.ts';
import { from, given, standing, sumOf, WEIGHS_NOTHING, type Notebook } from '#core/craft/show-how/notebook.ts';
import { givenOr, setting, type OnLoom } from '#core/craft/show-how/on-loom.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { warpLength, warpRoundNails, warpStraight, warpTakenUp } from '#core/craft/warp.ts';

export interface WarpWorkings {
  readonly thread: ThreadWorkings;
  /** Compressed, of a working end. */
  readonly workingDiameter: Working;
  readonly count: Working;
  readonly working: Working;
  readonly spacing: Working;
  readonly woundWidth: Working;
  readonly bottom: Working;
  /** Height of the cloth on the loom. */
  readonly height: Working;
  /** Warp yarn without margin. */
  readonly net: Working;
}

/** Before it is known what the warp bends in the cloth. */
export type BareWarp = Omit<WarpWorkings, 'net'>;

/** Ends as others go on from them: once they are wound, they are what they are. */
export const asWound = (symbol: string, ends: Working): WorkingInput => from(symbol, ends, WEIGHS_NOTHING);

interface Nailing {
  readonly pitch: Working;
  readonly perMm: Working;
  readonly spacing: Working;
  readonly together: WorkingInput;
}

/** Two rows set half a pitch aside work as one at half the pitch. */
function stepFormula(loom: Loom, nails: WorkingInput): Pick<Working, 'formula' | 'inputs'> {
  return { formula: loomKind(loom).rows === 2 && (loom.nailRows ?? 'both') === 'both' ? 's / 2' : 's', inputs: [nails] };
}

function noteSpacing({ book, piece }: OnLoom): Nailing {
  const { loom, warp, dressed } = piece;
  const layout = layoutOf(loom);
  const nails = given({ symbol: 's', name: 'from nail to nail', value: loom.nailPitchMm, unit: 'mm' }, '/loom/nailPitchMm', 'measured');
  const nth = { symbol: 'k', name: 'every so-many-th nail', value: loom.everyNthNail ?? 1, unit: 'count' } as const;
  const step = book.note({ id: 'loom.stepMm', name: `from one ${loomKind(loom).holder.one} to the next along the rail`, ...stepFormula(loom, nails), value: holderStep(loom), unit: 'mm', ...RULES.loom });
  const pitch = book.note({
    id: 'loom.pitchMm', name: `from one used ${loomKind(loom).holder.one} to the next`, formula: 's * k', inputs: [from('s', step), loom.everyNthNail === undefined ? standing(nth, DEFAULTS.everyNail) : given(nth, '/loom/everyNthNail', 'counted')],
    value: layout.pitchMm, unit: 'mm', ...RULES.loom,
  });
  const perMm = book.note({
    id: 'ends.perMm', name: 'ends in a millimetre', formula: layout.warping === 'zigzag' ? '2 / s' : '1 / s', inputs: [from('s', pitch)],
    value: endsPerMm(layout), unit: 'per-mm', ...RULES.nails,
  });
  const two = { symbol: 'k', name: 'ends worked as one', value: warp.endsTogether ?? 1, unit: 'count' } as const;
  const together = warp.endsTogether === undefined ? standing(two, DEFAULTS.singleEnds) : given(two, '/warp/endsTogether', 'counted');
  const spacing = book.note({
    id: 'ends.spacingMm', name: 'from end to end', formula: 'k / e', inputs: [together, from('e', perMm)],
    value: dressed.ends.spacingMm, unit: 'mm', ...RULES.loom,
  });
  return { pitch, perMm, spacing, together };
}

/** The number the pattern needs, from the number the width asks for. */
function noteCount({ book, piece }: OnLoom, raw: Working): Working {
  const { warp, dressed } = piece;
  const what = { id: 'ends.count', name: 'warp ends', value: dressed.ends.count, unit: 'count' } as const;
  if (warp.endCount !== undefined) {
    const pinned = given({ symbol: 'E', name: 'ends asked for', value: warp.endCount, unit: 'count' }, '/warp/endCount', 'counted');
    return book.note({ ...what, formula: 'E', inputs: [pinned], ...RULES.asGiven });
  }
  const [together, parity] = [warp.endsTogether ?? 1, warp.parity ?? 'any'];
  const rounded = book.note({
    id: 'ends.rounded', name: 'whole ends', formula: 'floor(x + 0.5 + 1e-9)', inputs: [from('x', raw)],
    value: roundHalfUp(raw.value), unit: 'count', ...RULES.wholeNumbers,
  });
  const every = standing({ symbol: 'm', name: 'ends suit once in so many', value: parity === 'any' ? together : 2 * together, unit: 'count' }, DEFAULTS.parity);
  const rest = standing({ symbol: 'o', name: 'ends that suit, beyond whole rounds of these', value: parity === 'odd' ? together : 0, unit: 'count' }, DEFAULTS.parity);
  const raised = book.note({
    id: 'ends.raisedBy', name: 'ends added so that the pattern comes out', formula: 'mod(o - n, m)', inputs: [rest, from('n', rounded), every],
    value: endsFor(raw.value, together, parity).raisedBy, unit: 'count', ...RULES.count,
  });
  return book.note({ ...what, formula: 'n + r', inputs: [from('n', rounded), from('r', raised)], ...RULES.count });
}

function noteNails({ book, piece }: OnLoom, count: Working, { pitch, perMm }: Nailing): Working {
  const { ends, insideWidthNeededMm } = piece.dressed;
  const zigzag = piece.loom.warping === 'zigzag';
  const E = asWound('E', count);
  const top = book.note({
    id: 'ends.nailsTop', name: 'nails on the upper rail', formula: zigzag ? 'floor((E + 2) / 2)' : 'E', inputs: [E], value: ends.nailsTop, unit: 'count', ...RULES.nails,
  });
  book.note({
    id: 'ends.nailsBottom', name: 'nails on the lower rail', formula: zigzag ? 'floor((E + 1) / 2)' : 'E', inputs: [E], value: ends.nailsBottom, unit: 'count', ...RULES.nails,
  });
  const margin = standing({ symbol: 'm', name: 'rail beyond the first and the last nail', value: RAIL_MARGIN_MM, unit: 'mm' }, DEFAULTS.railMargin, WEIGHS_NOTHING);
  book.note({
    id: 'loom.insideWidthNeededMm', name: 'inside width of the loom, at least', formula: '(n - 1) * s + 2 * m', inputs: [from('n', top), from('s', pitch), margin],
    value: insideWidthNeededMm, unit: 'mm', ...RULES.loom,
  });
  return book.note({
    id: 'ends.woundWidthMm', name: 'from the first end to the last', formula: '(E - 1) / e', inputs: [E, from('e', perMm)],
    value: ends.woundWidthMm, unit: 'mm', ...RULES.loom,
  });
}

/** Loops that are tied to the dowel need a length of their own, and no less than going round it takes. */
function noteTying(book: Notebook, round: Working, value: number): Working {
  const tying = standing({ symbol: 'l', name: 'warp to tie to the dowel', value: TOP_FOR_TYING_MM, unit: 'mm' }, DEFAULTS.topForTying, WEIGHS_NOTHING);
  return book.note({ id: 'loom.topForTyingMm', name: 'unwoven warp for loops that are tied', formula: 'max(l, r)', inputs: [tying, from('r', round)], value, unit: 'mm', ...RULES.loom });
}

/** Answers the workings of the height on the loom and of the unwoven warp at the bottom. */
function noteHeight(of: OnLoom, thread: ThreadWorkings): Pick<WarpWorkings, 'bottom' | 'height'> {
  const { book, piece } = of;
  const { size, loom, edges: { dowel, finish }, height } = piece;
  const finished = given({ symbol: 'H', name: 'height of the cloth', value: size.heightMm, unit: 'mm' }, '/size/heightMm', 'counted');
  const onLoom = book.note({
    id: 'loom.heightOnLoomMm', name: 'height of the cloth on the loom', formula: 'H / ((1 - lambda) * (1 - sigma))',
    inputs: [finished, setting(of, 'lambda', 'relaxation'), setting(of, 'sigma', 'wetShrinkage')], value: height.heightOnLoomMm, unit: 'mm', ...RULES.shrinking,
  });
  const least = standing({ symbol: 'c', name: 'room for the last shed', value: loomKind(loom).leastBareMm.top, unit: 'mm' }, DEFAULTS.topMm, WEIGHS_NOTHING);
  const top = [setting(of, 'a', 'topMm', WEIGHS_NOTHING), least];
  if (dowel !== undefined && dowel.fixing !== 'lashed') {
    const thick = given({ symbol: 'd', name: 'thickness of the dowel', value: dowel.diameterMm, unit: 'mm' }, '/dowel/diameterMm', 'measured');
    const seat = standing({ symbol: 's', name: 'seat of the loops', value: HANGING.seatMm, unit: 'mm' }, DEFAULTS.seat, WEIGHS_NOTHING);
    const round = book.note({
      id: 'loom.topForDowelMm', name: 'unwoven warp the dowel takes', formula: 'pi / 2 * d + s', inputs: [thick, seat], value: topForDowel(dowel.diameterMm), unit: 'mm', ...RULES.euclid,
    });
    top.push(from('t', dowel.fixing === 'tied' ? noteTying(book, round, topForHanging(dowel)) : round));
  }
  const topUsed = book.note({
    id: 'loom.topMm', name: 'unwoven warp at the top', formula: `max(${top.map(({ symbol }) => symbol).join(', ')})`, inputs: top, value: height.topMm, unit: 'mm', ...RULES.loom,
  });
  const knots = standing({ symbol: 'c', name: 'enough to knot or tuck the ends', value: loomKind(loom).leastBareMm.bottom, unit: 'mm' }, DEFAULTS.bottomMm, WEIGHS_NOTHING);
  const asked = [setting(of, 'a', 'bottomMm', WEIGHS_NOTHING), knots];
  if (finish !== undefined) asked.push(from('f', noteLowerEnds(book, finish, thread, piece.dressed.thread.loftMm), WEIGHS_NOTHING));
  const bottom = book.note({
    id: 'loom.bottomMm', name: 'unwoven warp at the bottom', formula: `max(${asked.map(({ symbol }) => symbol).join(', ')})`, inputs: asked, value: height.bottomMm, unit: 'mm', ...RULES.loom,
  });
  const parts = [from('l', onLoom), from('t', topUsed), from('b', bottom)];
  book.note({ id: 'loom.heightNeededMm', name: 'from nail to nail upright, at least', formula: sumOf(parts), inputs: parts, value: height.heightNeededMm, unit: 'mm', ...RULES.arithmetic });
  const frame = given({ symbol: 'H', name: 'from nail to nail upright', value: loom.insideHeightMm, unit: 'mm' }, '/loom/insideHeightMm', 'measured');
  book.note({ id: 'loom.insideHeightMm', name: 'from nail to nail upright', formula: 'H', inputs: [frame], value: loom.insideHeightMm, unit: 'mm', ...RULES.asGiven });
  return { bottom, height: onLoom };
}

/** How far apart bare ends stand where the first row comes to lie, and the rows that set them even. */
function noteGaps({ book, piece: { loom, height } }: OnLoom, bottom: Working, pitch: Working): void {
  const zigzag = loom.warping === 'zigzag';
  const frame = given({ symbol: 'H', name: 'from nail to nail upright', value: loom.insideHeightMm, unit: 'mm' }, '/loom/insideHeightMm', 'measured');
  const [s, b] = [from('s', pitch), from('b', bottom)];
  const gap = (id: 'narrow' | 'wide', share: string): void => {
    book.note({
      id: `loom.firstGapsMm.${id}`, name: `${id} gap between bare ends at the first row`, formula: zigzag ? `${share} * s` : 's', inputs: zigzag ? [b, frame, s] : [s],
      value: height.firstGapsMm[id], unit: 'mm', ...RULES.nails,
    });
  };
  gap('narrow', 'min(0.5, b / H)');
  gap('wide', '(1 - min(0.5, b / H))');
  for (const id of ['fewest', 'most'] as const) {
    const rows = standing({ symbol: 'n', name: 'rows at each edge', value: height.spacingRows[id], unit: 'count' }, zigzag ? RULES.spacingRows : RULES.nails);
    book.note({ id: `loom.spacingRows.${id}`, name: `spacing rows at each edge, ${id}`, formula: 'n', inputs: [rows], value: height.spacingRows[id], unit: 'count', ...RULES.asGiven });
  }
}

/** Warp yarn without margin; `crimp` is what its ends bend in the cloth, missing where they are straight. */
export function noteWarpYarn({ book, piece }: OnLoom, { thread, count, height }: BareWarp, crimp: Working | undefined): Working {
  const { loom, warp, dressed } = piece;
  const run = warpRun(warp, loom, dressed, height.value, crimp?.value ?? 0);
  const E = asWound('E', count);
  const frame = given({ symbol: 'H', name: 'from nail to nail upright', value: loom.insideHeightMm, unit: 'mm' }, '/loom/insideHeightMm', 'measured');
  const straight = book.note({ id: 'warp.straightMm', name: 'warp straight along the frame', formula: 'E * H', inputs: [E, frame], value: warpStraight(run), unit: 'mm', ...RULES.nails });
  const nail = givenOr({ symbol: 'n', name: 'thickness of a nail', value: run.nailDiameterMm, unit: 'mm' }, '/loom/nailDiameterMm', loom.nailDiameterMm !== undefined, DEFAULTS.nailDiameter, WEIGHS_NOTHING);
  const round = book.note({
    id: 'warp.roundNailsMm', name: 'warp round the nails', formula: '(E - 1) * pi * (n + d) / 2', inputs: [E, nail, from('d', thread.compressed, WEIGHS_NOTHING)],
    value: warpRoundNails(run), unit: 'mm', ...RULES.nails,
  });
  const tie = givenOr({ symbol: 't', name: 'one tie', value: run.tieMm, unit: 'mm' }, '/warp/tieMm', warp.tieMm !== undefined, DEFAULTS.tie, WEIGHS_NOTHING);
  const ties = book.note({ id: 'warp.tiesMm', name: 'warp for both ties', formula: '2 * t', inputs: [tie], value: 2 * run.tieMm, unit: 'mm', ...RULES.arithmetic });
  const bent = crimp && book.note({
    id: 'warp.takenUpMm', name: 'warp its bends take', formula: 'E * H * c', inputs: [E, from('H', height), from('c', crimp)], value: warpTakenUp(run), unit: 'mm', ...RULES.peirce,
  });
  const parts = [from('l', straight), ...(bent === undefined ? [] : [from('b', bent)]), from('r', round), from('t', ties)];
  const all = book.note({ id: 'warp.threadMm', name: 'warp as it lies', formula: sumOf(parts), inputs: parts, value: warpLength(run), unit: 'mm', ...RULES.arithmetic });
  return book.note({
    id: 'warp.netMm', name: 'warp yarn, without margin', formula: 'l * m', inputs: [from('l', all), thread.strands], value: all.value * dressed.thread.strands, unit: 'mm', ...RULES.arithmetic,
    margin: DEFAULT_ALLOWANCES.marginWarp,
  });
}

/** Everything up to the dressed loom. */
export function noteWarp(of: OnLoom): BareWarp {
  const { book, piece } = of;
  const { size, dressed } = piece;
  const nailing = noteSpacing(of);
  const finished = given({ symbol: 'W', name: 'width of the cloth', value: size.widthMm, unit: 'mm' }, '/size/widthMm', 'counted');
  const onLoom = book.note({
    id: 'ends.loomWidthMm', name: 'width on the loom, before it draws in', formula: 'W / (1 - delta)', inputs: [finished, setting(of, 'delta', 'drawIn')],
    value: dressed.ends.loomWidthMm, unit: 'mm', ...RULES.shrinking,
  });
  const raw = book.note({
    id: 'ends.raw', name: 'ends before rounding', formula: 'W * e', inputs: [from('W', onLoom), from('e', nailing.perMm)], value: dressed.ends.raw, unit: 'ratio', ...RULES.loom,
  });
  const count = noteCount(of, raw);
  const working = book.note({
    id: 'ends.working', name: 'ends the weft treats as one', formula: 'E / k', inputs: [asWound('E', count), nailing.together], value: dressed.ends.working, unit: 'count', ...RULES.count,
  });
  const woundWidth = noteNails(of, count, nailing);
  const thread = noteThread(book, { prefix: 'warp.', path: '/warp/yarn', yarn: piece.warp.yarn, defaultK: ASHENHURST_K.warp });
  const { bottom, height } = noteHeight(of, thread);
  noteGaps(of, bottom, nailing.pitch);
  const workingDiameter = book.note({
    id: 'warp.workingDiameterMm', name: 'thickness of a working end, under tension', formula: 'sqrt(k) * d', inputs: [nailing.together, from('d', thread.compressed)],
    value: dressed.workingDiameterMm, unit: 'mm', ...RULES.together,
  });
  return { thread, workingDiameter, count, working, spacing: nailing.spacing, woundWidth, bottom, height };
}

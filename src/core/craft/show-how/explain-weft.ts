/** Picks of every weft yarn between these ends: how close rows lie, and what one pick takes. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { pickLength } from '#core/craft/picks.ts';
import { below } from '#core/craft/reading/findings.ts';
import { noteThread, type ThreadWorkings } from '#core/craft/show-how/explain-thread.ts';
import { asWound, type BareWarp } from '#core/craft/show-how/explain-warp.ts';
import { noteBending } from '#core/craft/show-how/explain-bend.ts';
import { from, given, standing } from '#core/craft/show-how/notebook.ts';
import type { OnLoom } from '#core/craft/show-how/on-loom.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { pickSpacingOn, threadInPicks, type LaidPicks } from '#core/craft/techniques/technique.ts';
import { diameterTogether } from '#core/craft/yarn/diameter.ts';

export interface PickWorkings {
  /** From row to row. */
  readonly spacing: Working;
  readonly step: Working;
  readonly turn: Working;
  readonly pick: Working;
  /** Of the weft, compressed, as many strands as lie in a row. */
  readonly weftDiameter: Working;
  readonly strands: WorkingInput;
  /** Between the ends the weft meets. */
  readonly endSpacing: Working;
  readonly ends: Working;
  /** What the warp bends between such picks; missing where it is straight. */
  readonly warpCrimp?: Working;
}

/** What the bands go on from. */
export interface WeftWorkings {
  readonly threads: ReadonlyMap<string, ThreadWorkings>;
  /** By `pickKey`. */
  readonly picks: ReadonlyMap<string, PickWorkings>;
  /** From row to row, of every yarn with its own strands. */
  readonly spacings: ReadonlyMap<string, Working>;
  /** The `pickKey` of the picks most rows are woven in; those are called `weft`. */
  readonly main: string;
}

/** @throws if the role is not among them, which planning the piece has ruled out */
export function ofRole<T>(workings: ReadonlyMap<string, T>, role: string): T {
  const found = workings.get(role);
  if (found === undefined) throw new Error(`no workings of the yarn ${role}`);
  return found;
}

interface Spaced {
  readonly weftDiameter: Working;
  readonly usual: Working;
  readonly endSpacing: Working;
}

/** `usual` is the thickness a swatch was counted with. */
function noteSpacing({ book, piece }: OnLoom, prefix: string, { weftDiameter, usual, endSpacing }: Spaced, value: number): Working {
  const { beat } = piece.laid;
  const what = { id: `${prefix}pickSpacingMm`, name: 'from row to row', value, unit: 'mm' } as const;
  if (beat === 'as-ends') return book.note({ ...what, formula: 'p', inputs: [from('p', endSpacing)], ...RULES.rowsAsEnds });
  if (beat.picksPerCm !== undefined) {
    const counted = given({ symbol: 'n', name: 'rows in a centimetre', value: beat.picksPerCm, unit: 'per-cm' }, '/beat/picksPerCm', 'measured');
    if (weftDiameter === usual) return book.note({ ...what, formula: '10 / n', inputs: [counted], ...RULES.swatch });
    return book.note({ ...what, formula: '10 / n * d / u', inputs: [counted, from('d', weftDiameter), from('u', usual)], ...RULES.swatchStrands });
  }
  const beta = given({ symbol: 'beta', name: 'rows in one thickness of the weft', value: beat.picksPerWeftDiameter, unit: 'ratio' }, '/beat/picksPerWeftDiameter', 'practice');
  return book.note({ ...what, formula: 'd2 / beta', inputs: [from('d2', weftDiameter), beta], ...RULES.beat });
}

type Met = Pick<PickWorkings, 'weftDiameter' | 'strands' | 'endSpacing' | 'ends'> & { readonly warpDiameter: Working };

/** The weft with as many strands as the band takes, and the ends it meets: two as one in basket weave. */
function noteMeeting({ book, piece }: OnLoom, prefix: string, laid: LaidPicks, warp: BareWarp, thread: ThreadWorkings): Met {
  const { strands, pairs } = laid.pick;
  const own = strands === undefined ? thread.strands : standing({ symbol: 'm', name: 'strands in a row', value: strands, unit: 'count' }, RULES.bandStrands);
  const weftDiameter = strands === undefined ? thread.compressed : book.note({
    id: `${prefix}weftDiameterMm`, name: 'thickness of the strands in a row, beaten down', formula: 'd * sqrt(n / m)', inputs: [from('d', thread.compressed), { ...own, symbol: 'n' }, thread.strands],
    value: threadInPicks(piece.laid, laid.pick).compressedMm, unit: 'mm', ...RULES.together,
  });
  if (pairs !== true) return { weftDiameter, strands: own, endSpacing: warp.spacing, ends: warp.working, warpDiameter: warp.workingDiameter };
  return {
    weftDiameter, strands: own,
    endSpacing: book.note({ id: `${prefix}endSpacingMm`, name: 'between pairs of ends', formula: '2 * p', inputs: [from('p', warp.spacing)], value: laid.spacingMm, unit: 'mm', ...RULES.loom }),
    ends: book.note({ id: `${prefix}workingEnds`, name: 'pairs of ends', formula: 'floor(E / 2)', inputs: [asWound('E', warp.working)], value: laid.workingEnds, unit: 'count', ...RULES.count }),
    warpDiameter: book.note({ id: `${prefix}warpDiameterMm`, name: 'thickness of a pair of ends', formula: 'sqrt(2) * d', inputs: [from('d', warp.workingDiameter)], value: diameterTogether(warp.workingDiameter.value, 2), unit: 'mm', ...RULES.together }),
  };
}

function notePicks(of: OnLoom, prefix: string, geometry: LaidPicks, warp: BareWarp, thread: ThreadWorkings): PickWorkings {
  const { book } = of;
  const { warpDiameter, ...met } = noteMeeting(of, prefix, geometry, warp, thread);
  const spacing = noteSpacing(of, prefix, { ...met, usual: thread.compressed }, geometry.pickSpacingMm);
  const sum = book.note({
    id: `${prefix}diameterSumMm`, name: 'warp and weft together', formula: 'd1 + d2', inputs: [from('d1', warpDiameter), from('d2', met.weftDiameter)],
    value: geometry.diameterSumMm, unit: 'mm', ...RULES.arithmetic,
  });
  const [D, p] = [from('D', sum), from('p', met.endSpacing)];
  book.note({ id: `${prefix}tightness`, name: 'share of the room between two ends that warp and weft fill', formula: 'D / p', inputs: [D, p], value: geometry.tightness, unit: 'ratio', ...RULES.loom });
  const { step, ...bent } = noteBending(of, { prefix, geometry, spacing, endSpacing: met.endSpacing, D });
  const turn = book.note({
    id: `${prefix}turnMm`, name: 'weft round the end at a selvedge', formula: 'hypot(pi * D / 2, p2)', inputs: [D, from('p2', spacing)], value: geometry.turnMm, unit: 'mm', ...RULES.turn,
  });
  const pick = book.note({
    id: `${prefix}pickMm`, name: 'weft of one pick, its turn included', formula: '(E - 1) * l + t', inputs: [asWound('E', met.ends), from('l', step), from('t', turn)],
    value: pickLength(geometry.workingEnds, geometry), unit: 'mm', ...RULES.peirce,
  });
  return { ...met, spacing, step, turn, pick, ...bent };
}

/** Both diameters of every yarn, and one pick of each way picks are woven in. */
export function noteWeft(of: OnLoom, main: string, warp: BareWarp): WeftWorkings {
  const { book, piece } = of;
  const threads = new Map<string, ThreadWorkings>();
  for (const [role, yarn] of piece.yarns) {
    if (yarn !== undefined) threads.set(role, noteThread(book, { prefix: `yarns.${role}.`, path: below('/yarns', role), yarn, defaultK: ASHENHURST_K.weft }));
  }
  const picks = new Map<string, PickWorkings>();
  for (const [key, geometry] of piece.laid.picks) {
    const { role } = geometry.pick;
    const prefix = key === main ? 'weft.' : key === role ? `yarns.${role}.` : `picks.${key}.`;
    picks.set(key, notePicks(of, prefix, geometry, warp, ofRole(threads, role)));
  }
  const spacings = new Map<string, Working>();
  for (const [role, thread] of threads) {
    spacings.set(role, picks.get(role)?.spacing ?? noteSpacing(of, `yarns.${role}.`, { weftDiameter: thread.compressed, usual: thread.compressed, endSpacing: warp.spacing }, pickSpacingOn(piece.laid, role)));
  }
  return { threads, picks, spacings, main };
}

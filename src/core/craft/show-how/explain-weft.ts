/** Picks of every weft yarn between these ends: how close rows lie, and what one pick takes. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { weftWaveRange } from '#core/craft/crimp.ts';
import { mainWeft, type WovenBand } from '#core/craft/frame-loom/add-up.ts';
import { pickLength, type PickGeometry } from '#core/craft/picks.ts';
import { below } from '#core/craft/reading/findings.ts';
import { noteThread, type ThreadWorkings } from '#core/craft/show-how/explain-thread.ts';
import { asWound, type WarpWorkings } from '#core/craft/show-how/explain-warp.ts';
import { noteBend, noteWaveRange } from '#core/craft/show-how/explain-wave.ts';
import { from, given } from '#core/craft/show-how/notebook.ts';
import type { OnLoom } from '#core/craft/show-how/on-loom.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { picksOn, pickSpacingOn } from '#core/craft/techniques/technique.ts';

export interface PickWorkings {
  readonly spacing: Working;
  readonly step: Working;
  readonly turn: Working;
  readonly pick: Working;
}

/** What the bands go on from. */
export interface WeftWorkings {
  readonly threads: ReadonlyMap<string, ThreadWorkings>;
  /** Of the yarns picks are woven with. */
  readonly picks: ReadonlyMap<string, PickWorkings>;
  /** From row to row, of every yarn. */
  readonly spacings: ReadonlyMap<string, Working>;
  /** The role of the yarn most picks are woven with; its picks are called `weft`. */
  readonly main: string;
}

/** @throws if the role is not among them, which planning the piece has ruled out */
export function ofRole<T>(workings: ReadonlyMap<string, T>, role: string): T {
  const found = workings.get(role);
  if (found === undefined) throw new Error(`no workings of the yarn ${role}`);
  return found;
}

function noteSpacing({ book, piece }: OnLoom, role: string, prefix: string, thread: ThreadWorkings): Working {
  const { beat } = piece.laid;
  const what = { id: `${prefix}pickSpacingMm`, name: 'from row to row', value: pickSpacingOn(piece.laid, role), unit: 'mm' } as const;
  if (beat.picksPerCm !== undefined) {
    const counted = given({ symbol: 'n', name: 'rows in a centimetre', value: beat.picksPerCm, unit: 'per-cm' }, '/beat/picksPerCm', 'measured');
    return book.note({ ...what, formula: '10 / n', inputs: [counted], ...RULES.swatch });
  }
  const beta = given({ symbol: 'beta', name: 'rows in one thickness of the weft', value: beat.picksPerWeftDiameter, unit: 'ratio' }, '/beat/picksPerWeftDiameter', 'practice');
  return book.note({ ...what, formula: 'd2 / beta', inputs: [from('d2', thread.compressed), beta], ...RULES.beat });
}

interface Laid {
  readonly prefix: string;
  readonly geometry: PickGeometry;
  readonly spacing: Working;
  readonly D: WorkingInput;
}

function noteWave({ book, piece }: OnLoom, warp: WarpWorkings, { prefix, geometry, spacing, D }: Laid): Working {
  const what = { id: `${prefix}waveMm`, name: 'wave of the weft', value: geometry.waveMm, unit: 'mm' } as const;
  if (piece.parts.mode === 'straight-warp') return book.note({ ...what, formula: 'D', inputs: [D], ...RULES.peirce });
  const range = weftWaveRange(geometry.diameterSumMm, warp.spacing.value, geometry.pickSpacingMm);
  if (range === undefined) throw new Error('picks that jam were laid');
  const ids = { min: `${prefix}leastWaveMm`, max: `${prefix}mostWaveMm` };
  const { min, max } = noteWaveRange(book, ids, { D, p1: from('p1', warp.spacing), p2: from('p2', spacing) }, range);
  return book.note({ ...what, formula: 'min(b, max(a, D / 2))', inputs: [from('a', min), from('b', max), D], ...RULES.peirce });
}

function notePicks(of: OnLoom, role: string, prefix: string, warp: WarpWorkings, thread: ThreadWorkings, spacing: Working): PickWorkings {
  const { book, piece } = of;
  const geometry = picksOn(piece.laid, { role });
  const sum = book.note({
    id: `${prefix}diameterSumMm`, name: 'warp and weft together', formula: 'd1 + d2', inputs: [from('d1', warp.workingDiameter), from('d2', thread.compressed)],
    value: geometry.diameterSumMm, unit: 'mm', ...RULES.arithmetic,
  });
  const D = from('D', sum);
  const p = from('p', warp.spacing);
  book.note({ id: `${prefix}tightness`, name: 'share of the room between two ends that warp and weft fill', formula: 'D / p', inputs: [D, p], value: geometry.tightness, unit: 'ratio', ...RULES.loom });
  const wave = noteWave(of, warp, { prefix, geometry, spacing, D });
  const step = noteBend(book, {
    prefix, of: 'weft', lengthId: 'stepMm', spacing: p, D, wave: from('h', wave), lengthMm: geometry.stepMm, angleRad: geometry.angleRad, crimp: geometry.crimp,
  });
  const turn = book.note({
    id: `${prefix}turnMm`, name: 'weft round the end at a selvedge', formula: 'hypot(pi * D / 2, p2)', inputs: [D, from('p2', spacing)], value: geometry.turnMm, unit: 'mm', ...RULES.turn,
  });
  const pick = book.note({
    id: `${prefix}pickMm`, name: 'weft of one pick, its turn included', formula: '(E - 1) * l + t', inputs: [asWound('E', warp.working), from('l', step), from('t', turn)],
    value: pickLength(piece.laid.workingEnds, geometry), unit: 'mm', ...RULES.peirce,
  });
  return { spacing, step, turn, pick };
}

/** Both diameters of every yarn, and one pick of each that is woven in picks. */
export function noteWeft(of: OnLoom, bands: readonly WovenBand[], warp: WarpWorkings): WeftWorkings {
  const { book, piece } = of;
  const main = mainWeft(bands, piece.laid).geometry.pick.role;
  const threads = new Map<string, ThreadWorkings>();
  const picks = new Map<string, PickWorkings>();
  const spacings = new Map<string, Working>();
  for (const [role, yarn] of piece.yarns) {
    if (yarn === undefined) continue;
    const thread = noteThread(book, { prefix: `yarns.${role}.`, path: below('/yarns', role), yarn, defaultK: ASHENHURST_K.weft });
    const prefix = role === main ? 'weft.' : `yarns.${role}.`;
    const spacing = noteSpacing(of, role, prefix, thread);
    threads.set(role, thread);
    spacings.set(role, spacing);
    if (piece.laid.picks.has(role)) picks.set(role, notePicks(of, role, prefix, warp, thread, spacing));
  }
  return { threads, picks, spacings, main };
}

/** The workings of a cloth on a rigid heddle; ids are paths in its plan: `ends.count`, `warpEndMm`, `weft.pickMm` … */
import { weftWaveRange } from '#core/craft/crimp.ts';
import { ASHENHURST_K, PACE } from '#core/craft/defaults.ts';
import type { PickGeometry } from '#core/craft/picks.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import type { HeddlePlan } from '#core/craft/rigid-heddle/piece.ts';
import { crossing, readHeddlePiece, reckonHeddle, type Allowances, type Parts } from '#core/craft/rigid-heddle/plan-heddle.ts';
import { noteThread, type ThreadWorkings } from '#core/craft/show-how/explain-thread.ts';
import { noteBend, noteWaveRange } from '#core/craft/show-how/explain-wave.ts';
import { noteBought } from '#core/craft/show-how/note-bought.ts';
import { noteHoursInAll, pace } from '#core/craft/show-how/note-hours.ts';
import { from, given, standing, WEIGHS_NOTHING, type Notebook, type Standing } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { secondsPerRow } from '#core/craft/time.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';

type Plan = Omit<HeddlePlan, 'warnings'>;

interface On {
  readonly book: Notebook;
  readonly fields: Fields;
  readonly parts: Parts;
  readonly plan: Plan;
}

const PRACTICE: Standing = { source: 'common practice where nothing is known', trust: 'practice' };

const ALLOWANCES: Readonly<Record<keyof Allowances, { readonly name: string; readonly unit: 'share' | 'mm'; readonly source: Standing }>> = {
  drawIn: { name: 'draw-in', unit: 'share', source: DEFAULTS.drawIn },
  widthShrinkage: { name: 'shrinking of the width', unit: 'share', source: PRACTICE },
  lengthShrinkage: { name: 'shrinking of the length', unit: 'share', source: PRACTICE },
  takeUp: { name: 'take-up of the warp', unit: 'share', source: PRACTICE },
  fringeMm: { name: 'fringe', unit: 'mm', source: { source: 'none, unless the piece says more', trust: 'counted' } },
  gapMm: { name: 'between two pieces', unit: 'mm', source: { source: 'none, unless the piece says more', trust: 'counted' } },
  wasteMm: { name: 'what the loom keeps', unit: 'mm', source: { source: 'one loom maker’s 24 inches', trust: 'practice' } },
  margin: { name: 'margin', unit: 'share', source: DEFAULTS.marginWeft },
};

function allowance({ fields, parts }: On, symbol: string, key: keyof Allowances): WorkingInput {
  const { name, unit, source } = ALLOWANCES[key];
  const number = { symbol, name, value: parts.allowances[key], unit };
  return fields.optionalGroup('allowances', 'Allowances')?.has(key) === true ? given(number, `/allowances/${key}`, 'measured') : standing(number, source);
}

const pieces = ({ fields, parts }: On): WorkingInput => {
  const number = { symbol: 'n', name: 'pieces on one warp', value: parts.pieces, unit: 'count' } as const;
  return fields.has('pieces') ? given(number, '/pieces', 'counted') : standing(number, { source: 'one, unless the piece says more', trust: 'counted' });
};
const lengthIn = ({ parts }: On): WorkingInput => given({ symbol: 'l', name: 'length of a piece', value: parts.size.lengthMm, unit: 'mm' }, '/size/lengthMm', 'counted');
const rowsPerCm = ({ parts }: On): WorkingInput => given({ symbol: 'k', name: 'rows in a centimetre', value: parts.picksPerCm, unit: 'per-cm' }, '/picksPerCm', 'measured');
const spacingIn = ({ parts }: On): WorkingInput => given({ symbol: 'p', name: 'from end to end in the heddle', value: parts.heddle.spacingMm, unit: 'mm' }, '/heddle/spacingMm', 'measured');

function noteEnds(on: On): Working {
  const { book, parts, plan: { ends } } = on;
  const finished = given({ symbol: 'W', name: 'width of the cloth', value: parts.size.widthMm, unit: 'mm' }, '/size/widthMm', 'counted');
  const width = book.note({
    id: 'ends.widthInHeddleMm', name: 'width in the heddle', formula: 'W / (1 - delta) / (1 - s)', inputs: [finished, allowance(on, 'delta', 'drawIn'), allowance(on, 's', 'widthShrinkage')], value: ends.widthInHeddleMm, unit: 'mm', ...RULES.shrinking,
  });
  const raw = book.note({ id: 'ends.raw', name: 'ends the width asks for', formula: 'w / p', inputs: [from('w', width), spacingIn(on)], value: ends.raw, unit: 'ratio', ...RULES.loom });
  return book.note({ id: 'ends.count', name: 'warp ends', formula: 'floor(x + 0.5 + 1e-9)', inputs: [from('x', raw)], value: ends.count, unit: 'count', ...RULES.wholeNumbers });
}

/** One row, as both yarns bend alike. */
function notePick(on: On, geometry: PickGeometry, count: Working, warp: ThreadWorkings, weft: ThreadWorkings): Working {
  const { book, plan } = on;
  const rows = book.note({ id: 'weft.pickSpacingMm', name: 'from row to row', formula: '10 / k', inputs: [rowsPerCm(on)], value: geometry.pickSpacingMm, unit: 'mm', ...RULES.swatch });
  const sum = book.note({ id: 'weft.diameterSumMm', name: 'warp and weft together', formula: 'd1 + d2', inputs: [from('d1', warp.compressed), from('d2', weft.compressed)], value: geometry.diameterSumMm, unit: 'mm', ...RULES.arithmetic });
  const D = from('D', sum);
  const range = weftWaveRange(geometry.diameterSumMm, on.parts.heddle.spacingMm, geometry.pickSpacingMm);
  const { bend } = geometry;
  if (range === undefined || bend === undefined) throw new Error('picks that jam were laid');
  const { min, max } = noteWaveRange(book, { min: 'weft.leastWaveMm', max: 'weft.mostWaveMm' }, { D, p1: { ...spacingIn(on), symbol: 'p1' }, p2: from('p2', rows) }, range);
  const wave = book.note({ id: 'weft.waveMm', name: 'wave of the weft', formula: 'min(b, max(a, D / 2))', inputs: [from('a', min), from('b', max), D], value: bend.waveMm, unit: 'mm', ...RULES.peirce });
  const { length: step } = noteBend(book, { prefix: 'weft.', of: 'weft', lengthId: 'stepMm', spacing: spacingIn(on), D, wave: from('h', wave), lengthMm: geometry.stepMm, angleRad: bend.angleRad, crimp: geometry.crimp });
  const turn = book.note({ id: 'weft.turnMm', name: 'weft round the end at a selvedge', formula: 'hypot(pi * D / 2, p2)', inputs: [D, from('p2', rows)], value: geometry.turnMm, unit: 'mm', ...RULES.turn });
  return book.note({
    id: 'weft.pickMm', name: 'weft of one row, its turn included', formula: '(E - 1) * l + t', inputs: [from('E', count, WEIGHS_NOTHING), from('l', step), from('t', turn)], value: plan.weft.pickMm, unit: 'mm', ...RULES.peirce,
  });
}

function noteYarn(on: On, role: 'warp' | 'weft', thread: ThreadWorkings, times: Working, length: Working): Working {
  const id = `yarns.${role}`;
  const plan = on.plan.yarns[role];
  const net = on.book.note({
    id: `${id}.netMm`, name: `${role} of the piece, without margin`, formula: 'n * l * m', inputs: [from('n', times, WEIGHS_NOTHING), from('l', length), thread.strands], value: plan.netMm, unit: 'mm', ...RULES.arithmetic,
  });
  return noteBought(on.book, { id, path: `/yarns/${role}`, ball: on.parts[role].ball, net, tex: thread.tex, margin: allowance(on, 'M', 'margin'), plan });
}

export function noteHeddle(book: Notebook, fields: Fields): boolean {
  const parts = readHeddlePiece(fields);
  const plan = parts && reckonHeddle(parts, fields.findings);
  const geometry = parts && crossing(parts, threadOf(parts.warp, ASHENHURST_K.warp), threadOf(parts.weft, ASHENHURST_K.warp));
  if (parts === undefined || plan === undefined || geometry === undefined) return false;
  const on: On = { book, fields, parts, plan };
  const thread = (role: 'warp' | 'weft'): ThreadWorkings => noteThread(book, { prefix: `yarns.${role}.`, path: `/yarns/${role}`, yarn: parts[role], defaultK: ASHENHURST_K.warp });
  const [warp, weft] = [thread('warp'), thread('weft')];
  const count = noteEnds(on);
  const end = book.note({
    id: 'warpEndMm', name: 'length of one end', formula: 'n * l / ((1 - s) * (1 - t)) + (n - 1) * g + f + o',
    inputs: [pieces(on), lengthIn(on), allowance(on, 's', 'lengthShrinkage'), allowance(on, 't', 'takeUp'), allowance(on, 'g', 'gapMm'), allowance(on, 'f', 'fringeMm'), allowance(on, 'o', 'wasteMm')],
    value: plan.warpEndMm, unit: 'mm', ...RULES.shrinking,
  });
  const picks = book.note({ id: 'picks', name: 'rows', formula: 'n * floor(l / 10 * k + 0.5 + 1e-9)', inputs: [pieces(on), lengthIn(on), rowsPerCm(on)], value: plan.picks, unit: 'count', ...RULES.wholeNumbers });
  const pick = notePick(on, geometry, count, warp, weft);
  const masses = [noteYarn(on, 'warp', warp, count, end), noteYarn(on, 'weft', weft, picks, pick)].map((mass, at) => from(`m${String(at)}`, mass));
  book.note({ id: 'massG', name: 'mass of the yarn in it', formula: 'm0 + m1', inputs: masses, value: plan.massG, unit: 'g', ...RULES.arithmetic });
  const row = book.note({
    id: 'hours.rowSeconds', name: 'seconds for one row', formula: 'E * a + b', inputs: [from('E', count), pace('a', 'seconds for one end', PACE.secondsPerEnd, 's'), pace('b', 'seconds for one turn', PACE.secondsPerRow, 's')], value: secondsPerRow(plan.ends.count), unit: 's', ...RULES.pace,
  });
  noteHoursInAll(book, plan.hours, 'n * s / 3600 + E / v + f', [from('n', picks), from('s', row), from('E', count), pace('v', 'ends in an hour', PACE.warpEndsPerHour), pace('f', 'hours of finishing', PACE.finishingHours, 'h')]);
  return true;
}

/** The workings of the reckoner's single questions: take-up, soumak, rya, a shape. Ids are the answer's own keys. */
import { RULES } from '#core/craft/show-how/sources.ts';
import { noteBend, noteWaveRange } from '#core/craft/show-how/explain-wave.ts';
import { noteShape } from '#core/craft/show-how/explain-shape.ts';
import { noteKnot, noteSoumakRow } from '#core/craft/show-how/explain-stitches.ts';
import { from, given, type Notebook } from '#core/craft/show-how/notebook.ts';
import type { WorkingInput, WorkingUnit } from '#core/craft/show-how/working.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { answerShape, readShapeQuestion } from '#core/craft/reckoning/reckon-shape.ts';
import { answerRya, answerSoumak, readRya, readSoumak } from '#core/craft/reckoning/reckon-stitches.ts';
import { bendBoth, readTakeUp, type TakeUp, type TakeUpQuestion } from '#core/craft/reckoning/reckon-take-up.ts';

/** What was asked, under a symbol. */
function asker(fields: Fields): (symbol: string, name: string, value: number, key: string, unit?: WorkingUnit) => WorkingInput {
  return (symbol, name, value, key, unit = 'mm') => given({ symbol, name, value, unit }, fields.pathOf(key), unit === 'count' ? 'counted' : 'measured');
}

function noteChosenWave(book: Notebook, { cloth, weftWaveMm, mode }: TakeUpQuestion, bent: TakeUp, D: WorkingInput, fields: Fields): WorkingInput {
  const ids = { min: 'waveMm.min', max: 'waveMm.max' };
  const asked = asker(fields);
  const crossed = { D, p1: asked('p1', 'from end to end', cloth.p1, 'warpSpacingMm'), p2: asked('p2', 'from row to row', cloth.p2, 'weftSpacingMm') };
  const { min, max } = noteWaveRange(book, ids, crossed, bent.range);
  const what = { id: 'waveMm.weft', name: 'wave of the weft', value: bent.heightMm, unit: 'mm' } as const;
  if (weftWaveMm !== undefined) {
    return from('h', book.note({ ...what, formula: 'h', inputs: [asked('h', 'wave of the weft', weftWaveMm, 'weftWaveMm')], ...RULES.asGiven }));
  }
  if (mode === 'straight-warp') return from('h', book.note({ ...what, formula: 'D', inputs: [D], ...RULES.peirce }));
  return from('h', book.note({ ...what, formula: 'min(b, max(a, D / 2))', inputs: [from('a', min), from('b', max), D], ...RULES.peirce }));
}

export function noteTakeUp(book: Notebook, fields: Fields): boolean {
  const question = readTakeUp(fields);
  const bent = question && bendBoth(question, fields);
  if (question === undefined || bent === undefined) return false;
  const { cloth } = question;
  const asked = asker(fields);
  const sum = book.note({
    id: 'diameterSumMm', name: 'warp and weft together', formula: 'd1 + d2',
    inputs: [asked('d1', 'thickness of the warp', cloth.d1, 'warpDiameterMm'), asked('d2', 'thickness of the weft', cloth.d2, 'weftDiameterMm')],
    value: cloth.D, unit: 'mm', ...RULES.arithmetic,
  });
  const D = from('D', sum);
  const wave = noteChosenWave(book, question, bent, D, fields);
  const weft = asked('p', 'from end to end', cloth.p1, 'warpSpacingMm');
  noteBend(book, { prefix: 'weft.', of: 'weft', lengthId: 'lengthMm', spacing: weft, D, wave, ...bent.weft });
  const warpWave = book.note({
    id: 'waveMm.warp', name: 'wave of the warp', formula: 'D - h', inputs: [D, wave], value: cloth.D - bent.heightMm, unit: 'mm', ...RULES.peirce,
  });
  const warp = asked('p', 'from row to row', cloth.p2, 'weftSpacingMm');
  noteBend(book, { prefix: 'warp.', of: 'warp', lengthId: 'lengthMm', spacing: warp, D, wave: from('h', warpWave), ...bent.warp });
  return true;
}

export function noteSoumak(book: Notebook, fields: Fields): boolean {
  const question = readSoumak(fields);
  const answer = question && answerSoumak(question, fields);
  if (question === undefined || answer === undefined) return false;
  const asked = asker(fields);
  noteSoumakRow(book, '', question, {
    over: asked('n', 'ends passed over', question.over, 'over', 'count'),
    back: asked('m', 'ends gone back under', question.back, 'back', 'count'),
    p: asked('p', 'from end to end', question.spacingMm, 'spacingMm'),
    D: asked('D', 'warp and weft together', question.diameterSumMm, 'diameterSumMm'),
    E: asked('E', 'ends', question.ends, 'ends', 'count'),
  }, { stitches: 'stitches', row: 'rowMm' });
  return true;
}

export function noteRya(book: Notebook, fields: Fields): boolean {
  const question = readRya(fields);
  const answer = question && answerRya(question, fields);
  if (question === undefined || answer === undefined) return false;
  const asked = asker(fields);
  const { cut, knotsPerRow } = noteKnot(book, '', question, {
    g: asked('g', 'strands in a knot', question.strands, 'strands', 'count'),
    k: asked('k', 'ends in each leg', question.legEnds, 'legEnds', 'count'),
    p: asked('p', 'from end to end', question.spacingMm, 'spacingMm'),
    d1: asked('d1', 'thickness of the warp', question.warpDiameterMm, 'warpDiameterMm'),
    d: asked('d', 'thickness of a strand, lying free', question.strandLoftMm, 'strandLoftMm'),
    pile: asked('P', 'length of the pile', question.pileMm, 'pileMm'),
    trim: asked('t', 'length to trim away', question.trimMm, 'trimMm'),
    E: asked('E', 'ends', question.ends, 'ends', 'count'),
    edge: asked('b', 'plain ends at each edge', question.edgeEnds, 'edgeEnds', 'count'),
    thickness: asked('x', 'thickness of the card', question.cardThicknessMm, 'cardThicknessMm'),
  });
  const rows = asked('r', 'rows', question.rows, 'rows', 'count');
  const strands = book.note({
    id: 'strands', name: 'strands to cut', formula: 'K * r * g', inputs: [from('K', knotsPerRow), rows, asked('g', 'strands in a knot', question.strands, 'strands', 'count')],
    value: answer.strands, unit: 'count', ...RULES.count,
  });
  book.note({ id: 'yarnMm', name: 'yarn of all strands', formula: 'n * S', inputs: [from('n', strands), from('S', cut)], value: answer.yarnMm, unit: 'mm', ...RULES.arithmetic });
  return true;
}

export function noteShapeQuestion(book: Notebook, fields: Fields): boolean {
  const question = readShapeQuestion(fields);
  const answer = question && answerShape(question, fields);
  if (question === undefined || answer === undefined) return false;
  const asked = asker(fields);
  noteShape(book, '', question.measures, question, {
    path: fields.path,
    p: asked('p', 'from end to end', question.spacingMm, 'spacingMm'),
    p2: asked('p2', 'from row to row', question.pickSpacingMm, 'pickSpacingMm'),
    E: asked('E', 'ends', question.ends, 'ends', 'count'),
  });
  return true;
}

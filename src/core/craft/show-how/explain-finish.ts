/** What is left when every yarn is counted: cards, dowel, cord, mass, and hours of work. */
import type { WovenBand } from '#core/craft/frame-loom/add-up.ts';
import { workOf } from '#core/craft/frame-loom/add-up.ts';
import { HANGING, PACE, SPACER_CARD_EXTRA_MM, TIE_MM } from '#core/craft/defaults.ts';
import { cordSpan, cordTension } from '#core/craft/hanging.ts';
import type { Dowel } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { DressedWorkings, ToldBand } from '#core/craft/show-how/bands/band.ts';
import type { NotedBand } from '#core/craft/show-how/explain-bands.ts';
import { asWound } from '#core/craft/show-how/explain-warp.ts';
import { from, given, standing, sumOf, WEIGHS_NOTHING, type Standing } from '#core/craft/show-how/notebook.ts';
import { noteHoursInAll, pace } from '#core/craft/show-how/note-hours.ts';
import { noteCord, noteCordTension, noteFixing, noteLeastRod, noteSpan } from '#core/craft/show-how/note-rod.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput, WorkingUnit } from '#core/craft/show-how/working.ts';
import { hoursByWork, secondsPerRow } from '#core/craft/time.ts';

const rule = (symbol: string, name: string, value: number, unit: WorkingUnit, source: Standing): WorkingInput => standing({ symbol, name, value, unit }, source, WEIGHS_NOTHING);

function noteCard({ book, warp }: DressedWorkings, { cut: { spacerCard } }: FrameLoomPlan): void {
  const extra = rule('x', 'card beyond the warp', SPACER_CARD_EXTRA_MM, 'mm', DEFAULTS.spacerExtra);
  book.note({ id: 'cut.spacerCard.widthMm', name: 'width of the spacer card', formula: 'w + x', inputs: [from('w', warp.woundWidth), extra], value: spacerCard.widthMm, unit: 'mm', ...RULES.arithmetic });
  book.note({ id: 'cut.spacerCard.heightMm', name: 'height of the spacer card', formula: 'b', inputs: [from('b', warp.bottom)], value: spacerCard.heightMm, unit: 'mm', ...RULES.loom });
}

/** Wraps through the cloth's edge, one at each selvedge, with yarn as thick as the warp. */
function noteLashing({ book, piece, warp }: DressedWorkings, dowel: Dowel, lashingMm: number): void {
  const inputs = [
    given({ symbol: 'W', name: 'width of the cloth', value: piece.size.widthMm, unit: 'mm' }, '/size/widthMm', 'counted'), rule('q', 'from one wrap to the next', HANGING.lashingPitchMm, 'mm', DEFAULTS.lashing),
    given({ symbol: 'd', name: 'thickness of the dowel', value: dowel.diameterMm, unit: 'mm' }, '/dowel/diameterMm', 'measured'), from('y', warp.thread.loft), rule('t', 'one tie', TIE_MM, 'mm', DEFAULTS.tie),
  ];
  book.note({ id: 'cut.lashingMm', name: 'yarn that lashes the cloth to its dowel', formula: '(ceil(W / q - 1e-9) + 1) * hypot(pi * (d + y), q) + 2 * t', inputs, value: lashingMm, unit: 'mm', ...RULES.stitchPath });
}

function noteHanging(on: DressedWorkings, { cut, massG }: FrameLoomPlan, mass: Working): void {
  const { book, piece } = on;
  const { dowel } = piece.edges;
  if (dowel === undefined || cut.dowel === undefined || cut.cordMm === undefined) return;
  const what = { id: 'cut.dowel.lengthMm', name: 'length of the dowel', value: cut.dowel.lengthMm, unit: 'mm' } as const;
  const own = dowel.lengthMm === undefined
    ? { formula: 'W + 2 * o', inputs: [given({ symbol: 'W', name: 'width of the cloth', value: piece.size.widthMm, unit: 'mm' }, '/size/widthMm', 'counted'), rule('o', 'dowel beyond the cloth', HANGING.overhangMm, 'mm', DEFAULTS.overhang)] }
    : { formula: 'l', inputs: [given({ symbol: 'l', name: 'length of the dowel', value: dowel.lengthMm, unit: 'mm' }, '/dowel/lengthMm', 'counted')] };
  const length = book.note({ ...what, ...own, ...RULES.arithmetic });
  const span = noteSpan(book, 'cut.cordSpanMm', from('l', length), cordSpan(cut.dowel.lengthMm));
  const [s, rise] = [from('s', span), rule('v', 'how high the cord rises', HANGING.cordRiseMm, 'mm', DEFAULTS.cord)];
  noteLeastRod(book, 'cut.dowel.minDiameterMm', 'thinnest dowel that does not sag', from('m', mass), s, cut.dowel.minDiameterMm);
  noteCord(book, 'cut.cordMm', s, rise, cut.cordMm);
  if (cut.lashingMm !== undefined) noteLashing(on, dowel, cut.lashingMm);
  noteCordTension(book, 'cut.cordTensionN', from('m', mass), s, rise, cordTension(massG, span.value));
}

type WorkKind = keyof ToldBand['work'];

const WORK_WORDS: Readonly<Record<WorkKind, string>> = {
  rows: 'rows of tabby in all bands', colourChanges: 'places where one colour meets another', knots: 'knots in all bands', stitches: 'stitches, loops and crossings in all bands', hemBundles: 'hem-stitched bundles in all bands',
};

/** What there is to do of one kind, in all bands. */
function noteWork({ book }: DressedWorkings, kind: WorkKind, bands: readonly NotedBand[], value: number): Working {
  const inputs = bands.flatMap(({ index, work }) => (work[kind] === undefined ? [] : [from(`b${String(index)}`, work[kind])]));
  return book.note({ id: `work.${kind}`, name: WORK_WORDS[kind], formula: sumOf(inputs), inputs, value, unit: 'count', ...RULES.arithmetic });
}

function noteHours(on: DressedWorkings, bands: readonly NotedBand[], woven: readonly WovenBand[], plan: FrameLoomPlan): void {
  const { book, warp, piece } = on;
  const work = workOf(woven, piece);
  const hours = hoursByWork(work);
  const note = (id: keyof typeof hours, name: string, formula: string, inputs: readonly WorkingInput[]): WorkingInput =>
    from(id, book.note({ id: `hours.${id}`, name, formula, inputs, value: hours[id], unit: 'h', ...RULES.pace }));
  const row = book.note({
    id: 'hours.rowSeconds', name: 'seconds for one row', formula: 'E * a + b', inputs: [asWound('E', warp.working), pace('a', 'seconds for one end', PACE.secondsPerEnd, 's'), pace('b', 'seconds for one turn', PACE.secondsPerRow, 's')],
    value: secondsPerRow(work.workingEnds), unit: 's', ...RULES.pace,
  });
  const count = (kind: WorkKind): WorkingInput => from('n', noteWork(on, kind, bands, work[kind]));
  const parts = [
    note('rows', 'hours of rows', 'n * s / 3600', [count('rows'), from('s', row)]),
    note('colourChanges', 'hours of changing colours', 'n * s / 3600', [count('colourChanges'), pace('s', 'seconds for one change', PACE.secondsPerColourChange, 's')]),
    note('knots', 'hours of rya', 'n / v', [count('knots'), pace('v', 'knots in an hour', PACE.ryaKnotsPerHour, 'per-hour', DEFAULTS.ryaPace)]),
    note('stitches', 'hours of soumak, loops and twining', 'n / v', [count('stitches'), pace('v', 'stitches in an hour', PACE.stitchesPerHour)]),
    note('hemBundles', 'hours of hem-stitch', 'n / v', [count('hemBundles'), pace('v', 'bundles in an hour', PACE.hemBundlesPerHour)]),
    note('warping', 'hours of warping', 'E / v', [asWound('E', warp.count), pace('v', 'ends in an hour', PACE.warpEndsPerHour)]),
    note('finishing', 'hours of finishing', 'f', [pace('f', 'hours of finishing', PACE.finishingHours, 'h')]),
  ];
  noteHoursInAll(book, plan.hours, sumOf(parts), parts);
}

export function noteFinish(on: DressedWorkings, bands: readonly NotedBand[], woven: readonly WovenBand[], plan: FrameLoomPlan, masses: readonly Working[]): void {
  const inputs = masses.map((mass, at) => from(`m${String(at)}`, mass));
  const mass = on.book.note({ id: 'massG', name: 'mass of the finished piece', formula: sumOf(inputs), inputs, value: plan.massG, unit: 'g', ...RULES.arithmetic });
  noteFixing(on.book, 'cut.fixingHoldsG', from('m', mass), plan.cut.fixingHoldsG);
  noteCard(on, plan);
  noteHanging(on, plan, mass);
  noteHours(on, bands, woven, plan);
}

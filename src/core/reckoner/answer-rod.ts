/** The rod a hanging hangs from, and its cord: how thick, how long, how hard it pulls. */
import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { HANGING } from '#core/craft/defaults.ts';
import { cordLength, cordSpan, cordTension, leastDowelDiameter } from '#core/craft/hanging.ts';
import { ceilSafe } from '#core/craft/rounding.ts';
import { explainRod } from '#core/craft/show-how/explain.ts';
import type { AnsweredRod, AskedRod } from '#core/craft/show-how/note-rod.ts';
import { loud, NO_ANSWER, stepped, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

const NEEDS = ['rod-load', 'rod-length', 'rise'] as const;

const MOST_GRAMS = 100_000;
const MOST_MM = 5000;
const NEWTONS_PER_POUND_FORCE = 4.4482216152605;

function checkRanges(grams: number, lengthMm: number, riseMm: number, reader: FormReader): void {
  if (grams <= 0 || grams > MOST_GRAMS) reader.refuse('rod-load', reader.units === 'in' ? 'Anything above 0, up to 3500 oz, works.' : 'Anything above 0, up to 100 kg, works.');
  if (cordSpan(lengthMm) <= 0 || lengthMm > MOST_MM) reader.refuse('rod-length', reader.units === 'in' ? 'Anything above 1 5/8 in, up to 196 in, works.' : 'Anything above 4 cm, up to 5 m, works.');
  if (riseMm <= 0 || riseMm > MOST_MM) reader.refuse('rise', reader.units === 'in' ? 'Anything above 0, up to 196 in, works.' : 'Anything above 0, up to 5 m, works.');
}

/** From one thickness that is sold to the next: whole millimetres, or sixteenths. */
const stockStep = (units: Units): number => (units === 'in' ? MM_PER_INCH / 16 : 1);

function reckonRod({ massG, lengthMm, riseMm, stockStepMm }: AskedRod): AnsweredRod {
  const spanMm = cordSpan(lengthMm);
  const minDiameterMm = leastDowelDiameter(massG, spanMm);
  return {
    spanMm, minDiameterMm,
    stockMm: ceilSafe(Math.max(minDiameterMm, HANGING.leastStockMm) / stockStepMm) * stockStepMm,
    cordMm: cordLength(spanMm, riseMm),
    cordTensionN: cordTension(massG, spanMm, riseMm),
    fixingHoldsG: HANGING.fixingFactor * massG,
  };
}

function rodLines(rod: AnsweredRod, units: Units): AnswerLine[] {
  const pull = units === 'in' ? { value: rod.cordTensionN / NEWTONS_PER_POUND_FORCE, unit: 'lbf' } : { value: rod.cordTensionN, unit: 'N' };
  return [
    stepped('stockMm', loud({ label: 'Take a rod of', value: lengthOf(rod.stockMm, 'fine-least'), how: 'the least thickness, up to the next that is sold; thinner than 8 mm none is sold straight', trust: 'formula' })),
    stepped('cordMm', loud({ label: 'Cord to cut', value: lengthOf(rod.cordMm, 'cut'), how: 'up to the nail and down again, and 15 cm for each knot', trust: 'formula' })),
    stepped('cordTensionN', loud({ label: 'The cord pulls with', value: { kind: 'number', ...pull }, how: 'half the weight on each side ÷ the sine of its slope: the flatter, the harder', trust: 'formula' })),
    stepped('minDiameterMm', { label: 'Least thickness', value: lengthOf(rod.minDiameterMm, 'fine-least'), how: 'a round rod of soft wood, evenly loaded, that sags by no more than a 360th', trust: 'formula' }),
    stepped('spanMm', { label: 'Between the knots', value: lengthOf(rod.spanMm, 'size'), how: 'the cord is tied 2 cm from each end', trust: 'formula' }),
    stepped('fixingHoldsG', { label: 'The nail or hook must hold', value: massOf(rod.fixingHoldsG), how: 'four times the weight of the piece', trust: 'practice' }),
  ];
}

export function answerRod(reader: FormReader): Section {
  const massG = reader.weight('rod-load', 'Weight of the hanging');
  const lengthMm = reader.length('rod-length', 'Length of the rod');
  const riseMm = reader.length('rise', 'Height of the cord');
  const none = { ...NO_ANSWER, needs: NEEDS };
  if (massG === undefined || lengthMm === undefined || riseMm === undefined) return none;
  checkRanges(massG, lengthMm, riseMm, reader);
  if (!reader.isSound(...NEEDS)) return none;
  const asked = { massG, lengthMm, riseMm, stockStepMm: stockStep(reader.units) };
  const rod = reckonRod(asked);
  return { lines: rodLines(rod, reader.units), notes: [], needs: NEEDS, asked: [asked, reader.units], workings: () => explainRod(asked, rod) };
}

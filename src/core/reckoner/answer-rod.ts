/** The rod a hanging hangs from, and its cord: how thick, how long, how hard it pulls. */
import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { HANGING } from '#core/craft/defaults.ts';
import { cordLength, cordSpan, cordTension, leastDowelDiameter } from '#core/craft/hanging.ts';
import { ceilSafe } from '#core/craft/rounding.ts';
import { loud, NO_ANSWER, type Section } from '#core/reckoner/answer-line.ts';
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

/** The next thickness that is sold: whole millimetres, or sixteenths. */
function nextStock(leastMm: number, units: Units): number {
  const wishedMm = Math.max(leastMm, HANGING.leastStockMm);
  return units === 'in' ? (ceilSafe((wishedMm / MM_PER_INCH) * 16) / 16) * MM_PER_INCH : ceilSafe(wishedMm);
}

export function answerRod(reader: FormReader): Section {
  const grams = reader.weight('rod-load', 'Weight of the hanging');
  const lengthMm = reader.length('rod-length', 'Length of the rod');
  const riseMm = reader.length('rise', 'Height of the cord');
  const none = { ...NO_ANSWER, needs: NEEDS };
  if (grams === undefined || lengthMm === undefined || riseMm === undefined) return none;
  checkRanges(grams, lengthMm, riseMm, reader);
  if (!reader.isSound(...NEEDS)) return none;
  const spanMm = cordSpan(lengthMm);
  const leastMm = leastDowelDiameter(grams, spanMm);
  const newtons = cordTension(grams, spanMm, riseMm);
  const pull = reader.units === 'in' ? { value: newtons / NEWTONS_PER_POUND_FORCE, unit: 'lbf' } : { value: newtons, unit: 'N' };
  return {
    lines: [
      loud({ label: 'Take a rod of', value: lengthOf(nextStock(leastMm, reader.units), 'fine-least'), how: 'the least thickness, up to the next that is sold; thinner than 8 mm none is sold straight', trust: 'formula' }),
      loud({ label: 'Cord to cut', value: lengthOf(cordLength(spanMm, riseMm), 'cut'), how: 'up to the nail and down again, and 15 cm for each knot', trust: 'formula' }),
      loud({ label: 'The cord pulls with', value: { kind: 'number', ...pull }, how: 'half the weight on each side ÷ the sine of its slope: the flatter, the harder', trust: 'formula' }),
      { label: 'Least thickness', value: lengthOf(leastMm, 'fine-least'), how: 'a round rod of soft wood, evenly loaded, that sags by no more than a 360th', trust: 'formula' },
      { label: 'Between the knots', value: lengthOf(spanMm, 'size'), how: 'the cord is tied 2 cm from each end', trust: 'formula' },
      { label: 'The nail or hook must hold', value: massOf(HANGING.fixingFactor * grams), how: 'four times the weight of the piece', trust: 'practice' },
    ],
    notes: [],
    needs: NEEDS,
  };
}

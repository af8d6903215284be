/** Amounts for one person half way: what a text says of the whole piece, and what a list must still have. */
import { countOf, lengthOf, massOf, type Amount, type Quantity } from '#core/craft/amounts/amount-types.ts';
import { amountOf } from '#core/craft/amounts.ts';
import type { Material } from '#core/craft/craft.ts';
import { craftOf, isMadeIn } from '#core/craft/crafts.ts';
import type { Made } from '#core/craft/fitting/tell-changes.ts';
import type { MadeFor } from '#core/craft/made-for.ts';
import { planOfRest, rowsLeftIn, type HalfWoven } from '#core/craft/rest/as-it-comes-out.ts';
import { succeed, type Outcome } from '#core/outcome.ts';

export type MadeSoFar = Pick<MadeFor, 'piece' | 'plan' | 'halfway'>;

/** What is left of the amount a key names; undefined where the whole of it says all. */
function leftOf(key: string, made: Made, halfway: HalfWoven): Quantity | undefined {
  const { rest, woven } = halfway;
  if (key === 'hours') return { kind: 'time', hours: rest.hours.likely, low: rest.hours.low, high: rest.hours.high };
  const [subject, name = '', what] = key.split('.');
  if (subject === 'yarn') {
    const yarn = Object.hasOwn(rest.yarns, name) ? rest.yarns[name] : undefined;
    if (yarn === undefined || (what !== undefined && what !== 'mass')) return undefined;
    return what === 'mass' ? massOf(yarn.massG) : lengthOf(yarn.netMm, 'yarn');
  }
  const inHand = made.piece.bands[woven.bandsDone];
  if (subject !== 'band' || what !== 'rows' || inHand?.name !== name || (woven.rows ?? 0) === 0) return undefined;
  const rows = rowsLeftIn(made, halfway);
  return rows === undefined ? undefined : countOf(rows, 'row', 'rows');
}

/** Rows that are still to come are told by those she counted and measured. */
function isByMeasure(key: string, { piece }: Made, { rest, woven }: HalfWoven): boolean {
  if (rest.trust !== 'measured') return false;
  const index = piece.bands.findIndex(({ name }) => name !== undefined && key === `band.${name}.rows`);
  return index >= woven.bandsDone && piece.bands[index]?.technique === 'tabby';
}

/** As `amountOf`, of the whole piece as it will come out; the way it was got says what of it is still to weave. */
export function amountFor(key: string, made: MadeSoFar): Outcome<Amount> {
  const amount = amountOf(key, made.piece, made.plan);
  const { halfway } = made;
  if (!amount.ok || halfway === null || !isMadeIn('frame-loom', made)) return amount;
  const left = leftOf(key, made, halfway);
  const how = amount.value.howReckoned;
  const measured = isByMeasure(key, made, halfway) ? { trust: 'measured', source: 'the rows you counted and measured' } as const : {};
  const inputs = left === undefined ? how.inputs : [...how.inputs, { name: 'still to weave', value: left }];
  return succeed({ ...amount.value, howReckoned: { ...how, ...measured, inputs } });
}

/** Why nothing of it is to be had any more. */
export type UsedUp = 'woven' | 'on-loom';

/** What must be in hand for what is still to weave: all of it while nothing is woven. */
export function amountToHave(key: string, made: MadeSoFar): Outcome<Amount> | UsedUp {
  const { halfway } = made;
  if (halfway === null || !isMadeIn('frame-loom', made)) return amountFor(key, made);
  const [subject, name = '', what] = key.split('.');
  if (subject === 'warp') return 'on-loom';
  const ofRest = (): Outcome<Amount> => amountOf(key, made.piece, planOfRest(made, halfway));
  if (subject === 'yarn') return halfway.rest.yarns[name]?.netMm === 0 ? 'woven' : ofRest();
  if (subject !== 'band' || what !== 'yarn') return amountFor(key, made);
  const index = made.piece.bands.findIndex((band) => band.name === name);
  return index >= 0 && !halfway.rest.bands.some((band) => band.index === index) ? 'woven' : ofRest();
}

/** What must be had by length or weight for what is still to weave. */
export function materialsToHave(made: MadeSoFar): readonly Material[] {
  const { halfway } = made;
  const still = halfway !== null && isMadeIn('frame-loom', made) ? { piece: made.piece, plan: planOfRest(made, halfway) } : made;
  return craftOf(still.piece).materials(still);
}

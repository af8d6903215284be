/** How a page says for what its amounts are reckoned once a piece is half woven. */
import type { MadeFor } from '#core/craft/made-for.ts';
import { rowsIn } from '#core/craft/rest/woven-share.ts';
import { isMadeIn } from '#core/craft/crafts.ts';
import type { Units } from '#core/units/units.ts';

const MM_IN = { cm: 10, in: 25.4 } as const;

/** How far she is: `3 of 14 bands and 30 of 88 rows of the next are woven`. */
function placeWords({ halfway, ...made }: MadeFor): string {
  if (halfway === null || !isMadeIn('frame-loom', made)) return '';
  const { bandsDone, rows = 0 } = halfway.woven;
  const bands = made.piece.bands.length;
  if (bandsDone >= bands) return 'every band is woven';
  const all = rowsIn(made.plan.bands[bandsDone], made.piece.bands[bandsDone]);
  const done = bandsDone === 0 ? '' : `${String(bandsDone)} of ${String(bands)} bands`;
  const inHand = rows === 0 || all === undefined ? '' : `${String(rows)} of ${String(all)} rows of the ${bandsDone === 0 ? 'first band' : 'next'}`;
  return `${[done, inHand].filter(Boolean).join(' and ')} are woven`;
}

/** A sentence for texts; empty while nothing is woven. */
export function restWords(made: MadeFor | null, units: Units): string {
  if (made === null || made.halfway === null) return '';
  const { rest } = made.halfway;
  const rows = `${((rest.picksPerCm / 10) * MM_IN[units]).toFixed(1)} rows in ${units === 'in' ? 'an inch' : 'a centimetre'}`;
  const how = rest.trust === 'measured'
    ? `What is woven stays as it is, and the rest is reckoned anew with the ${rows} you measured.`
    : 'What is woven stays as it is, and the rest follows the plan.';
  return `You said that ${placeWords(made)}. ${how}`;
}

/** A sentence for lists; empty while nothing is woven. */
export function restListWords(made: MadeFor | null): string {
  return made === null || made.halfway === null ? '' : `You said that ${placeWords(made)}: yarn is listed for what is still to weave.`;
}

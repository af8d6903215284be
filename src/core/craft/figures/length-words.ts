/** Lengths as a figure says them: short, in the person's own units. */
import type { Units } from '#core/units/format-amount.ts';

/** For example `5 mm`, `42 cm`, `3 1/4 in`. Inches go in sixteenths below four inches, else in quarters. */
export function lengthWords(mm: number, units: Units): string {
  if (units === 'in') return `${inches(mm)} in`;
  if (mm < 100) return `${trimmed(mm, mm < 10 ? 10 : 1)} mm`;
  return `${trimmed(mm / 10, 10)} cm`;
}

function trimmed(value: number, per: number): string {
  return String(Math.round(value * per) / per);
}

function inches(mm: number): string {
  const parts = mm < 101.6 ? 16 : 4;
  const all = Math.floor((mm / 25.4) * parts + 0.5 + 1e-9);
  const whole = Math.floor(all / parts);
  let over = all % parts;
  let under = parts;
  while (over > 0 && over % 2 === 0) {
    over /= 2;
    under /= 2;
  }
  if (over === 0) return String(whole);
  return whole === 0 ? `${over}/${under}` : `${whole} ${over}/${under}`;
}

export function countWords(count: number, one: string, many: string): string {
  return count === 1 ? `1 ${one}` : `${count} ${many}`;
}

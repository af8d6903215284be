/**
 * How far a number can be trusted, best first:
 * - `counted` given as it is, or exact arithmetic on numbers so given
 * - `measured` by the person, on a swatch or with a rule
 * - `label` read off what the yarn came with
 * - `formula` from a formula that is published or derived
 * - `class` from a table of classes
 * - `practice` what is commonly done, without a source
 */
export type Trust = 'counted' | 'measured' | 'label' | 'formula' | 'class' | 'practice';

const TRUST_ORDER: readonly Trust[] = ['counted', 'measured', 'label', 'formula', 'class', 'practice'];

/** A result is as certain as its least certain input. */
export function leastTrust(first: Trust, ...more: readonly Trust[]): Trust {
  return more.reduce((least, trust) => (TRUST_ORDER.indexOf(trust) > TRUST_ORDER.indexOf(least) ? trust : least), first);
}

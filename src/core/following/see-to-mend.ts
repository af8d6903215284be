/**
 * Where it says how to mend what a teacher saw: a common fault's place in the handbook, the page of a technique, or a step
 * of the part. Kept as a short text with the verdict: `fault:crossed-ends`, `technique:rya`, `step:tie-on`.
 */
import type { TechniqueName } from '#core/craft/piece.ts';
import { TECHNIQUE_WORDS } from '#core/craft/techniques/technique-words.ts';
import { COMMON_FAULTS, handbookAddress, isCommonFault, TECHNIQUE_PAGES, type CommonFaultName } from '#core/handbook/pages-for.ts';
import { stepAnchor } from '#core/lesson-text/tree.ts';

/** A step of a part's text, as its facts tell of it. */
export interface StepOfPart {
  readonly id: string;
  readonly words: string;
}

export interface SeeToMend {
  readonly label: string;
  readonly href: string;
}

const STEP = /^step:[a-z0-9-]{1,64}$/;
const brief = (words: string): string => (words.length > 64 ? `${words.slice(0, 61).trimEnd()}…` : words);

/** Whether `see` is a text of this kind. A step is not looked for: the part's text may change. */
export function isSeeToMend(see: string): boolean {
  return STEP.test(see) || techniqueIn(see) !== null || (see.startsWith('fault:') && isCommonFault(see.slice(6)));
}

function techniqueIn(see: string): TechniqueName | null {
  const names = Object.keys(TECHNIQUE_PAGES) as TechniqueName[];
  return names.find((name) => see === `technique:${name}`) ?? null;
}

/** What stands chosen until somebody chooses otherwise: the technique the part teaches; empty where it teaches none. */
export function firstToSee(techniques: readonly TechniqueName[]): string {
  const name = techniques.find((one) => one !== 'tabby') ?? techniques[0];
  return name === undefined ? '' : `technique:${name}`;
}

/** Everything a verdict on a photo of this part can lead to: the techniques it teaches, its steps, then the common faults. */
export function seesToMend(steps: readonly StepOfPart[], techniques: readonly TechniqueName[]): { readonly value: string; readonly label: string }[] {
  const faults = Object.keys(COMMON_FAULTS) as CommonFaultName[];
  return [
    ...techniques.map((name) => ({ value: `technique:${name}`, label: `Handbook: ${TECHNIQUE_WORDS[name].label}` })),
    ...steps.map(({ id, words }, index) => ({ value: `step:${id}`, label: `Step ${index + 1}: ${brief(words)}` })),
    ...faults.map((name) => ({ value: `fault:${name}`, label: `Handbook: ${COMMON_FAULTS[name].says}` })),
  ];
}

/** The link for a student; null when the step is no longer in the part's text. */
export function seeToMend(see: string, steps: readonly StepOfPart[]): SeeToMend | null {
  const name = see.slice(see.indexOf(':') + 1);
  if (see.startsWith('fault:') && isCommonFault(name)) return { label: `${COMMON_FAULTS[name].says}: how to mend it`, href: handbookAddress(COMMON_FAULTS[name].at) };
  const technique = techniqueIn(see);
  if (technique !== null) return { label: `${TECHNIQUE_WORDS[technique].label}: how it is worked`, href: handbookAddress({ page: TECHNIQUE_PAGES[technique] }) };
  const index = see.startsWith('step:') ? steps.findIndex(({ id }) => id === name) : -1;
  return index < 0 ? null : { label: `Step ${index + 1}, once more`, href: `#${stepAnchor(name)}` };
}

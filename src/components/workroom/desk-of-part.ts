/** What the pages of a series and its parts draw alike. */
import type { SitePerson } from '#components/site/person.ts';
import { amountChoices, type AmountGroup } from '#core/craft/amount-choices.ts';
import { exampleLooms } from '#core/craft/fitting/example-looms.ts';
import { FIGURE_KINDS } from '#core/craft/figures/figure-kinds.ts';
import { planPiece } from '#core/craft/plan.ts';
import { titleHalves } from '#core/series/title.ts';
import type { Units } from '#core/units/units.ts';
import type { Sayable } from '#islands/writing/sayable.ts';
import type { LessonDesk } from '#server/queries/workroom/lesson-desk.ts';

/** The amounts the pattern piece tells; empty while it is not described. */
export function amountsOfDesk({ pattern }: Pick<LessonDesk, 'pattern'>, units: Units): AmountGroup[] {
  const plan = pattern === null ? null : planPiece(pattern, units);
  return pattern !== null && plan?.ok === true ? amountChoices(pattern, plan.value, units) : [];
}

export function sayableOf({ media }: Pick<LessonDesk, 'media'>, amounts: readonly AmountGroup[]): Sayable {
  return {
    amounts: amounts.flatMap(({ choices }) => choices.map(({ key, label, text }) => ({ key, label, text }))),
    figures: FIGURE_KINDS.map((kind) => ({ value: kind, label: capital(kind.replaceAll('-', ' ')) })),
    media: media.map(({ kind, name, title }) => ({ value: `${kind}/${name}`, label: `${capital(kind)}: ${title === '' ? name : title}` })),
  };
}

/** Whose eyes a part can be seen with: its teacher's, those of an example loom, each student's. */
export function eyesOfDesk({ pattern, seats }: Pick<LessonDesk, 'pattern' | 'seats'>, units: Units): { value: string; label: string }[] {
  return [
    { value: 'pattern', label: 'Your pattern piece' },
    ...exampleLooms(pattern, units).map(({ name, label }) => ({ value: name, label })),
    ...seats.map(({ seat, studentName }) => ({ value: seat, label: studentName })),
  ];
}

export function crumbsOf({ series: { slug, title } }: Pick<LessonDesk, 'series'>): { href: string; label: string }[] {
  return [{ href: '/workroom#series', label: 'Series' }, { href: `/workroom/series/${slug}`, label: titleHalves(title).name }];
}

/** The person with the name of her workroom beside the mark. */
export function inWorkroom(person: SitePerson | null | undefined, workroom: string): SitePerson | null {
  return person === null || person === undefined ? null : { ...person, workroom };
}

/** `Part 3, Rya fringe`, for the head of the document. */
export function nameOfPart({ number, title }: Pick<LessonDesk, 'number' | 'title'>): string {
  return number === null ? title : `Part ${number}, ${title}`;
}

const capital = (words: string): string => `${words.charAt(0).toUpperCase()}${words.slice(1)}`;

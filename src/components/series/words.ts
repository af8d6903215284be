/** What the pages of the shop say of a series, from its data. */
import { firstName } from '#core/following/opening-words.ts';
import { listed } from '#core/listed.ts';
import type { PartFor, SeriesFor } from '#server/queries/series/series-for.ts';

/** What a student should bring along. */
export const LEVEL_WORDS = { beginner: 'First steps', 'some-practice': 'Some rows behind you', 'sure-hand': 'Practised hands' } as const satisfies Record<SeriesFor['level'], string>;

const NUMBERS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten', 'Eleven', 'Twelve'];

/** `Seven parts`. */
export function partsHeading(count: number): string {
  return `${NUMBERS[count] ?? String(count)} ${count === 1 ? 'part' : 'parts'}`;
}

/** `1 h 40`, `50 min`. */
export function minutesWords(minutes: number): string {
  if (minutes < 60) return `${minutes}\u00a0min`;
  const rest = minutes % 60;
  return `${Math.floor(minutes / 60)}\u00a0h${rest === 0 ? '' : `\u00a0${String(rest).padStart(2, '0')}`}`;
}

/** `Wren Okafor helps at the bench.`; empty without helpers. */
export function helpersSentence(helpers: readonly string[]): string {
  return helpers.length === 0 ? '' : `${listed(helpers, 'and')} ${helpers.length === 1 ? 'helps' : 'help'} at the bench.`;
}

const DAYS = ['the same day', 'within a day', 'within two days', 'within three days', 'within four days', 'within five days', 'within six days', 'within a week'];

/** A text of a teacher as paragraphs: an empty line parts them. */
export function paragraphs(text: string): readonly string[] {
  return text.split(/\n\s*\n/u).map((words) => words.trim()).filter((words) => words !== '');
}

export interface CheckpointWords {
  /** `Two checkpoints: in Part 2 and Part 5.` */
  readonly where: string;
  /** `The next part opens when Ilse or Wren has said` … or an empty string where no part waits for it. */
  readonly who: string;
  readonly when: string;
}

/** Null where no part asks for a photo. */
export function checkpointWords(parts: readonly PartFor[], { workroom }: Pick<SeriesFor, 'workroom'>, helpers: readonly string[]): CheckpointWords | null {
  const asked = parts.filter(({ checkpoint }) => checkpoint !== null).map(({ number }) => `Part ${number}`);
  if (asked.length === 0) return null;
  const lookers = listed([workroom.teacherName, ...helpers].map(firstName), 'or');
  const waits = parts.some(({ opens }) => opens.rule === 'after-verdict');
  return {
    where: `${NUMBERS[asked.length] ?? String(asked.length)} ${asked.length === 1 ? 'checkpoint' : 'checkpoints'}: in ${listed(asked, 'and')}.`,
    who: waits ? `The next part opens when ${lookers} has said` : `${lookers} looks at your photo and says`,
    when: `most often ${DAYS[workroom.answerDays] ?? `within ${workroom.answerDays} days`}.`,
  };
}

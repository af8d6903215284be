/** What the reckoner's page answers: lines of amounts, each with the way it was got. */
import type { Input } from '#core/craft/amounts/amount-types.ts';
import type { Trust } from '#core/craft/trust.ts';
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

export interface AnswerLine {
  readonly label: string;
  readonly value: Input | { readonly kind: 'words'; readonly words: string };
  /** In words and signs. */
  readonly how: string;
  readonly trust: Trust;
}

/** A sentence for each field that cannot be used. */
export type FieldErrors = Partial<Record<ReckonerField, string>>;

export interface Section {
  readonly lines: readonly AnswerLine[];
  /** What is worth knowing about the answer. */
  readonly notes: readonly string[];
}

export const NO_ANSWER: Section = { lines: [], notes: [] };

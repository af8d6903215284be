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
  /** Told first and largest. */
  readonly loud?: true;
}

/** A sentence for each field that cannot be used. */
export type FieldErrors = Partial<Record<ReckonerField, string>>;

export interface Section {
  readonly lines: readonly AnswerLine[];
  /** What is worth knowing about the answer. */
  readonly notes: readonly string[];
  /** Fields it cannot answer without. */
  readonly needs: readonly ReckonerField[];
  /** Something in it broke that never should. */
  readonly failed?: true;
}

export const NO_ANSWER: Omit<Section, 'needs'> = { lines: [], notes: [] };

/** Length, weight and balls of a yarn to have in hand. */
export const loud = (line: AnswerLine): AnswerLine => ({ ...line, loud: true });

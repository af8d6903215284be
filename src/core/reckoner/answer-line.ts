/** What the reckoner's page answers: lines of amounts, each with the way it was got. */
import type { Input } from '#core/craft/amounts/amount-types.ts';
import type { Working } from '#core/craft/show-how/working.ts';
import type { Trust } from '#core/craft/trust.ts';
import type { Problem } from '#core/outcome.ts';
import type { Outcome } from '#core/outcome.ts';
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

export interface AnswerLine {
  readonly label: string;
  readonly value: Input | { readonly kind: 'words'; readonly words: string };
  /** In words and signs. */
  readonly how: string;
  readonly trust: Trust;
  /** Id of its working, where the part has one. */
  readonly step?: string;
  /** Told first and largest. */
  readonly loud?: true;
}

/** A sentence for each field that cannot be used. */
export type FieldErrors = Partial<Record<ReckonerField, string>>;

export interface Section {
  readonly lines: readonly AnswerLine[];
  /** What is worth knowing about the answer. */
  readonly notes: readonly Problem[];
  /** Fields it cannot answer without. */
  readonly needs: readonly ReckonerField[];
  /** Every step of the reckoning, for who asks to see it. */
  readonly workings?: () => readonly Working[];
  /** What the workings are of: of the same they are the same. */
  readonly asked?: unknown;
  /** Something in it broke that never should. */
  readonly failed?: true;
}

export const NO_ANSWER: Omit<Section, 'needs'> = { lines: [], notes: [] };

/** The line as one of those that matter most. */
export const loud = (line: AnswerLine): AnswerLine => ({ ...line, loud: true });

/** The line with the working that gave it. */
export const stepped = (step: string, line: AnswerLine): AnswerLine => ({ ...line, step });

/** The line with its working's id, by its label. */
export function named(line: AnswerLine, steps: Readonly<Record<string, string>>): AnswerLine {
  const step = steps[line.label];
  return step === undefined ? line : stepped(step, line);
}

/** What could be written down of a reckoning; nothing where it could not be carried out. */
export const written = (outcome: Outcome<readonly Working[]>): readonly Working[] => (outcome.ok ? outcome.value : []);

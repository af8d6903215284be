/** What a lesson is made of besides its text, as it crosses the wire. */

/** The photo a lesson asks for: `ask` in words, `look` are the points the teacher wants to see. */
export interface Checkpoint {
  readonly ask: string;
  readonly look: readonly string[];
}

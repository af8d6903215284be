/** Everything the reckoner's page answers to what was typed. */
import type { FieldErrors, Section } from '#core/reckoner/answer-line.ts';
import { answerEnds } from '#core/reckoner/answer-ends.ts';
import { answerPiece, type PieceSection } from '#core/reckoner/answer-piece.ts';
import { answerYarn } from '#core/reckoner/answer-yarn.ts';
import { FormReader, readTypedLoom, readTypedYarn } from '#core/reckoner/read-fields.ts';
import type { ReckonerForm } from '#core/reckoner/reckoner-form.ts';

export interface ReckonerAnswer {
  readonly errors: FieldErrors;
  readonly yarn: Section;
  readonly ends: Section;
  readonly piece: PieceSection;
}

/** The yarn feeds the ends' advice, both feed the piece; each section answers as far as its own fields can be used. */
export function answerForm(form: ReckonerForm): ReckonerAnswer {
  const reader = new FormReader(form);
  const typedYarn = readTypedYarn(reader);
  const yarn = answerYarn(typedYarn, reader);
  const typedLoom = readTypedLoom(reader);
  const piece = answerPiece(typedLoom, typedYarn, reader);
  const ends = answerEnds(typedLoom, typedYarn, reader);
  return { errors: reader.errors, yarn, ends, piece };
}

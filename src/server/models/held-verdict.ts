import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { NoteInput } from '#contracts/bench.ts';
import { count, json, maybeMoment, maybeText, moment, oneOf, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/**
 * What somebody said of a photo and the student has not been told yet. `goesOutAt` is when it will be; null when it was
 * taken back: then it is what was written so far. `round` counts how often it was said, so that the job of an earlier
 * time finds that it is not meant.
 */
export class HeldVerdict extends Model<InferAttributes<HeldVerdict>, InferCreationAttributes<HeldVerdict>> {
  declare photoId: number;
  declare byId: number;
  declare verdict: 'weave-on' | 'mend-first';
  declare words: string;
  /** Where it says how to mend it (`core/following/see-to-mend.ts`). */
  declare see: CreationOptional<string | null>;
  declare notes: readonly NoteInput[];
  declare round: number;
  declare goesOutAt: Date | null;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

HeldVerdict.init({
  photoId: { ...ref(), primaryKey: true },
  byId: ref(),
  verdict: oneOf(['weave-on', 'mend-first']),
  words: text(2000),
  see: maybeText(80),
  notes: json(),
  round: count(),
  goesOutAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'held_verdicts' });

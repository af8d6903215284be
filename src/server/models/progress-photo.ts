import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeRef, maybeText, oneOf, publicId, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/**
 * A photo posted at a checkpoint, and what was said of it. The thread of a checkpoint is its photos in order. Further
 * shots that were shown with it are `FurtherShot`s; words, verdict and notes are of all together.
 */
export class ProgressPhoto extends Model<InferAttributes<ProgressPhoto>, InferCreationAttributes<ProgressPhoto>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare enrolmentId: number;
  declare lessonId: number;
  declare mediaId: number;
  declare words: CreationOptional<string>;
  declare verdict: CreationOptional<'waits' | 'weave-on' | 'mend-first'>;
  declare verdictWords: CreationOptional<string>;
  /** Where it says how to mend it (`core/following/see-to-mend.ts`). */
  declare see: CreationOptional<string | null>;
  declare verdictAt: CreationOptional<Date | null>;
  declare verdictById: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

ProgressPhoto.init({
  id: id(),
  publicId: publicId(),
  enrolmentId: ref(),
  lessonId: ref(),
  mediaId: ref(),
  words: { ...text(1000), defaultValue: '' },
  verdict: oneOf(['waits', 'weave-on', 'mend-first'], 'waits'),
  verdictWords: { ...text(2000), defaultValue: '' },
  see: maybeText(80),
  verdictAt: maybeMoment(),
  verdictById: maybeRef(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'progress_photos' });

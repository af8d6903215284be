import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeRef, maybeText, moment, publicId, ref, text, yes } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What a student asks on a part. It waits until `answeredAt` is set, which follows from its answers. */
export class Question extends Model<InferAttributes<Question>, InferCreationAttributes<Question>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare enrolmentId: number;
  declare lessonId: number;
  declare authorId: number;
  /** The step of the part's text it is about; the text may have lost it since. */
  declare stepId: CreationOptional<string | null>;
  /** The photo of hers it is about. */
  declare photoId: CreationOptional<number | null>;
  declare words: string;
  declare isForClass: boolean;
  declare wantsLetter: boolean;
  declare answeredAt: CreationOptional<Date | null>;
  declare changedAt: CreationOptional<Date | null>;
  declare takenOutAt: CreationOptional<Date | null>;
  declare takenOutById: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Question.init({
  id: id(),
  publicId: publicId(),
  enrolmentId: ref(),
  lessonId: ref(),
  authorId: ref(),
  stepId: maybeText(64),
  photoId: maybeRef(),
  words: text(2000),
  isForClass: yes(false),
  wantsLetter: yes(false),
  answeredAt: maybeMoment(),
  changedAt: maybeMoment(),
  takenOutAt: maybeMoment(),
  takenOutById: maybeRef(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'questions' });

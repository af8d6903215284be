import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeRef, moment, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What the teacher or a helper says to a question. Whoever does not own the workroom answered as a helper. */
export class QuestionAnswer extends Model<InferAttributes<QuestionAnswer>, InferCreationAttributes<QuestionAnswer>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare questionId: number;
  declare authorId: number;
  declare words: string;
  declare changedAt: CreationOptional<Date | null>;
  declare takenOutAt: CreationOptional<Date | null>;
  declare takenOutById: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

QuestionAnswer.init({
  id: id(),
  publicId: publicId(),
  questionId: ref(),
  authorId: ref(),
  words: text(2000),
  changedAt: maybeMoment(),
  takenOutAt: maybeMoment(),
  takenOutById: maybeRef(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'question_answers' });

import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeRef, moment, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Somebody says that a question or an answer should not stand there. The steward judges it. */
export class WordReport extends Model<InferAttributes<WordReport>, InferCreationAttributes<WordReport>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  /** Exactly one of both is set. */
  declare questionId: CreationOptional<number | null>;
  declare answerId: CreationOptional<number | null>;
  declare reporterId: number;
  declare why: string;
  declare settledAt: CreationOptional<Date | null>;
  declare settledById: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

WordReport.init({
  id: id(),
  publicId: publicId(),
  questionId: maybeRef(),
  answerId: maybeRef(),
  reporterId: ref(),
  why: text(600),
  settledAt: maybeMoment(),
  settledById: maybeRef(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'word_reports' });

import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, longText, maybeRef, moment, publicId, ref } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A lesson's text that another one took the place of before it was published. Rows are added, never changed. */
export class EarlierDraft extends Model<InferAttributes<EarlierDraft>, InferCreationAttributes<EarlierDraft>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare lessonId: number;
  declare source: string;
  declare authorId: CreationOptional<number | null>;
  /** When it was typed last, as far as is known. */
  declare writtenAt: Date;
  declare createdAt: CreationOptional<Date>;
}

EarlierDraft.init({
  id: id(),
  publicId: publicId(),
  lessonId: ref(),
  source: longText(),
  authorId: maybeRef(),
  writtenAt: moment(),
  createdAt: moment(),
}, { sequelize, tableName: 'earlier_drafts', updatedAt: false });

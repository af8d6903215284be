import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, maybeRef, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Words on a photo; pinned when it has a place, in thousandths of width and height from the upper left. */
export class PhotoNote extends Model<InferAttributes<PhotoNote>, InferCreationAttributes<PhotoNote>> {
  declare id: CreationOptional<number>;
  declare photoId: number;
  declare position: number;
  /** Which photo of the showing it is about; 1 for the first. */
  declare shot: CreationOptional<number>;
  declare words: string;
  declare xPermille: CreationOptional<number | null>;
  declare yPermille: CreationOptional<number | null>;
  declare authorId: number;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

PhotoNote.init({
  id: id(),
  photoId: ref(),
  position: count(),
  shot: count(1),
  words: text(600),
  xPermille: maybeRef(),
  yPermille: maybeRef(),
  authorId: ref(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'photo_notes' });

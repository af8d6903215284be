import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { maybeText, moment, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** The picture that goes along where a series is passed on. A drawing that comes out the same is not made again. */
export class SharePicture extends Model<InferAttributes<SharePicture>, InferCreationAttributes<SharePicture>> {
  declare seriesId: number;
  /** SHA-256 of the drawing, in hex. */
  declare drawingHash: string;
  /** Null where it could not be made; it is tried again when the series changes. */
  declare fileKey: CreationOptional<string | null>;
  /** State of the series it was drawn from, by when that last changed. */
  declare drawnOf: Date;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

SharePicture.init({
  seriesId: { ...ref(), primaryKey: true },
  drawingHash: text(64),
  fileKey: maybeText(120),
  drawnOf: moment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'share_pictures' });

import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { maybeMoment, maybeText, moment, ref, yes } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A photo that arrives in pieces, until it is shown: what was promised, and which process is writing its bytes just now. */
export class PhotoUpload extends Model<InferAttributes<PhotoUpload>, InferCreationAttributes<PhotoUpload>> {
  declare mediaId: number;
  /** As promised; how much has come is what lies on the disk. */
  declare byteCount: number;
  /** Who holds it for writing, until when, and whether another request waits for it. */
  declare heldBy: CreationOptional<string | null>;
  declare heldUntil: CreationOptional<Date | null>;
  declare isWanted: CreationOptional<boolean>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

PhotoUpload.init({
  mediaId: { ...ref(), primaryKey: true },
  byteCount: { type: DataTypes.BIGINT, allowNull: false },
  heldBy: maybeText(64),
  heldUntil: maybeMoment(),
  isWanted: yes(false),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'photo_uploads' });

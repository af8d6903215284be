import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { maybeMoment, maybeText, moment, ref, yes } from '#server/db/columns.ts';

/** A file that arrives in pieces: what was promised, and which process is writing its bytes just now. */
export abstract class Arriving extends Model<InferAttributes<Arriving>, InferCreationAttributes<Arriving>> {
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

export const arrivingColumns = () => ({
  mediaId: { ...ref(), primaryKey: true },
  byteCount: { type: DataTypes.BIGINT, allowNull: false },
  heldBy: maybeText(64),
  heldUntil: maybeMoment(),
  isWanted: yes(false),
  createdAt: moment(),
  updatedAt: moment(),
});

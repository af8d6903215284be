import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeRef, moment, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Somebody is asked by mail to help in a workroom. Open until it is accepted, taken back, or a week has passed. */
export class HelperInvitation extends Model<InferAttributes<HelperInvitation>, InferCreationAttributes<HelperInvitation>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare workroomId: number;
  declare invitedById: number;
  declare address: string;
  /** The same for every way of writing the address. */
  declare addressKey: string;
  /** Of the token in the letter's link. */
  declare tokenHash: string;
  declare expiresAt: Date;
  declare acceptedAt: CreationOptional<Date | null>;
  declare acceptedById: CreationOptional<number | null>;
  /** By the teacher, or because a newer letter went to the same address. */
  declare takenBackAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

HelperInvitation.init({
  id: id(),
  publicId: publicId(),
  workroomId: ref(),
  invitedById: ref(),
  address: text(254),
  addressKey: text(254),
  tokenHash: { type: DataTypes.CHAR(64), allowNull: false },
  expiresAt: moment(),
  acceptedAt: maybeMoment(),
  acceptedById: maybeRef(),
  takenBackAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'helper_invitations' });

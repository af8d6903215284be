import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, moment, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A signed-in browser. `id` is the SHA-256 of the token in its cookie; `expiresAt` slides, `endsAt` does not; `provedAt` is when the password was last typed. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: string;
  declare userId: number;
  declare expiresAt: Date;
  declare endsAt: Date;
  /** How long the session lives without a request. */
  declare idleSeconds: number;
  declare provedAt: Date;
  declare device: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
}

Session.init({
  id: { type: DataTypes.CHAR(64), primaryKey: true },
  userId: ref(),
  expiresAt: moment(),
  endsAt: moment(),
  idleSeconds: count(),
  provedAt: moment(),
  device: { ...text(160), defaultValue: '' },
  createdAt: moment(),
}, { sequelize, tableName: 'sessions', updatedAt: false });

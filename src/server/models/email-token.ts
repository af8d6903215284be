import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { moment, oneOf, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A link sent by mail, kept as a hash, good once. */
export class EmailToken extends Model<InferAttributes<EmailToken>, InferCreationAttributes<EmailToken>> {
  declare tokenHash: string;
  declare userId: number;
  declare purpose: 'confirm-address' | 'new-password';
  declare address: string;
  declare expiresAt: Date;
  declare createdAt: CreationOptional<Date>;
}

EmailToken.init({
  tokenHash: { type: DataTypes.CHAR(64), primaryKey: true },
  userId: ref(),
  purpose: oneOf(['confirm-address', 'new-password']),
  address: text(254),
  expiresAt: moment(),
  createdAt: moment(),
}, { sequelize, tableName: 'email_tokens', updatedAt: false });

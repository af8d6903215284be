import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeText, oneOf, publicId, text, yes, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A person with an account. Every role she has follows from other rows, but for the steward. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare email: string;
  declare emailKey: string;
  declare emailConfirmedAt: CreationOptional<Date | null>;
  declare name: string;
  declare passwordHash: CreationOptional<string | null>;
  declare units: CreationOptional<'cm' | 'in'>;
  declare timeZone: CreationOptional<string>;
  declare scheme: CreationOptional<'system' | 'light' | 'dark'>;
  declare isSteward: CreationOptional<boolean>;
  declare suspendedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

User.init({
  id: id(),
  publicId: publicId(),
  email: text(254),
  emailKey: text(254),
  emailConfirmedAt: maybeMoment(),
  name: text(80),
  passwordHash: maybeText(255),
  units: oneOf(['cm', 'in'], 'cm'),
  timeZone: { ...text(64), defaultValue: 'UTC' },
  scheme: oneOf(['system', 'light', 'dark'], 'system'),
  isSteward: yes(false),
  suspendedAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'users' });

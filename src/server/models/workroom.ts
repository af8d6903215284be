import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, longText, publicId, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A teacher and all that is hers. She is the owner; `answerDays` is what she promises for a photo. */
export class Workroom extends Model<InferAttributes<Workroom>, InferCreationAttributes<Workroom>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare ownerId: number;
  declare handle: string;
  declare name: string;
  declare about: CreationOptional<string>;
  declare timeZone: string;
  declare currency: CreationOptional<string>;
  declare answerDays: CreationOptional<number>;
  /** Stands at the foot of letters to many; empty until she writes one. */
  declare postalAddress: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Workroom.init({
  id: id(),
  publicId: publicId(),
  ownerId: ref(),
  handle: text(40),
  name: text(120),
  about: longText(),
  timeZone: text(64),
  currency: { ...text(3), defaultValue: 'EUR' },
  answerDays: count(2),
  postalAddress: { ...text(300), defaultValue: '' },
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'workrooms' });

import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { OwnLoom } from '#core/craft/my-piece/own-loom.ts';
import { id, json, maybeMoment, moment, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A loom a person has at home. A piece keeps the measures it was planned with, whatever becomes of the loom here. */
export class OwnLoomRow extends Model<InferAttributes<OwnLoomRow>, InferCreationAttributes<OwnLoomRow>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare userId: number;
  declare name: string;
  declare data: OwnLoom;
  declare takenOutAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

OwnLoomRow.init({
  id: id(),
  publicId: publicId(),
  userId: ref(),
  name: text(60),
  data: json(),
  takenOutAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'own_looms' });

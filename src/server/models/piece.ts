import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, json, ref, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { Piece } from '#core/craft/crafts.ts';

/** The teacher's piece of a series, as data. */
export class PatternPiece extends Model<InferAttributes<PatternPiece>, InferCreationAttributes<PatternPiece>> {
  declare seriesId: number;
  declare data: Piece;
  declare revision: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

PatternPiece.init({
  seriesId: { ...ref(), primaryKey: true },
  data: json(),
  revision: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'pieces' });

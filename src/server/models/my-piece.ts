import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, json, ref, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { MyPiece } from '#core/craft/fit.ts';

/** What a student changed of the pattern piece: her loom, width, spacing and yarns. */
export class MyPieceRow extends Model<InferAttributes<MyPieceRow>, InferCreationAttributes<MyPieceRow>> {
  declare enrolmentId: number;
  declare data: MyPiece;
  declare revision: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

MyPieceRow.init({
  enrolmentId: { ...ref(), primaryKey: true },
  data: json(),
  revision: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'my_pieces' });

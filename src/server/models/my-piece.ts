import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, json, maybeJson, ref, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import type { WovenSoFar } from '#core/craft/rest/woven-so-far.ts';

/** What a student changed of the pattern piece: her loom, width, spacing and yarns; and how far she has woven it. */
export class MyPieceRow extends Model<InferAttributes<MyPieceRow>, InferCreationAttributes<MyPieceRow>> {
  declare enrolmentId: number;
  declare data: MyPiece;
  /** Null while nothing of it is woven. */
  declare woven: CreationOptional<WovenSoFar | null>;
  declare revision: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

MyPieceRow.init({
  enrolmentId: { ...ref(), primaryKey: true },
  data: json(),
  woven: maybeJson(),
  revision: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'my_pieces' });

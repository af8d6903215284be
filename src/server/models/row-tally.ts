import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, moment, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What one device of a student has counted in one band; below zero where it took back what another one counted. */
export class RowTally extends Model<InferAttributes<RowTally>, InferCreationAttributes<RowTally>> {
  declare enrolmentId: number;
  declare bandKey: string;
  declare device: string;
  declare counted: number;
  /** Grows with each change on that device: of two states the higher one holds. */
  declare version: number;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

RowTally.init({
  enrolmentId: { ...ref(), primaryKey: true },
  bandKey: { ...text(64), primaryKey: true },
  device: { ...text(32), primaryKey: true },
  counted: { type: DataTypes.INTEGER, allowNull: false },
  version: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'row_tallies' });

import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, moment, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Time at the loom on one day, as the student says it. */
export class WeavingTime extends Model<InferAttributes<WeavingTime>, InferCreationAttributes<WeavingTime>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare enrolmentId: number;
  /** On her calendar: `2026-12-01`. */
  declare day: string;
  declare minutes: number;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

WeavingTime.init({
  id: id(),
  publicId: publicId(),
  enrolmentId: ref(),
  day: text(10),
  minutes: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'weaving_times' });

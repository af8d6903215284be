import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { ref, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A person who may look after a workroom's bench. */
export class WorkroomHelper extends Model<InferAttributes<WorkroomHelper>, InferCreationAttributes<WorkroomHelper>> {
  declare workroomId: number;
  declare userId: number;
  declare createdAt: CreationOptional<Date>;
}

WorkroomHelper.init({
  workroomId: { ...ref(), primaryKey: true },
  userId: { ...ref(), primaryKey: true },
  createdAt: moment(),
}, { sequelize, tableName: 'workroom_helpers', updatedAt: false });

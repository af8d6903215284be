import { Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { moment, oneOf, ref, text, yes } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A thing gathered or a step done. `itemKey` is the gathering item's public id, or lesson public id, colon, step id. */
export class Tick extends Model<InferAttributes<Tick>, InferCreationAttributes<Tick>> {
  declare enrolmentId: number;
  declare subject: 'gather' | 'step';
  declare itemKey: string;
  declare isTicked: boolean;
  declare changedAt: Date;
}

Tick.init({
  enrolmentId: { ...ref(), primaryKey: true },
  subject: { ...oneOf(['gather', 'step']), primaryKey: true },
  itemKey: { ...text(100), primaryKey: true },
  isTicked: yes(false),
  changedAt: moment(),
}, { sequelize, tableName: 'ticks', timestamps: false });

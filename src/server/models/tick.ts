import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, maybeRef, maybeText, moment, oneOf, ref, text, yes } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A thing gathered or a step done. `itemKey` is the gathering item's public id, or lesson public id, colon, step id. */
export class Tick extends Model<InferAttributes<Tick>, InferCreationAttributes<Tick>> {
  declare enrolmentId: number;
  declare subject: 'gather' | 'step';
  declare itemKey: string;
  declare isTicked: boolean;
  /** By the house's clock, less the time it had waited on a device. */
  declare changedAt: Date;
  /** Of the seat: counts its changes. */
  declare revision: CreationOptional<number>;
  /** Of which browser it came, as its how manyth change; null for a page without script. */
  declare device: CreationOptional<string | null>;
  declare sequence: CreationOptional<number | null>;
}

Tick.init({
  enrolmentId: { ...ref(), primaryKey: true },
  subject: { ...oneOf(['gather', 'step']), primaryKey: true },
  itemKey: { ...text(100), primaryKey: true },
  isTicked: yes(false),
  changedAt: moment(),
  revision: count(),
  device: maybeText(32),
  sequence: maybeRef(),
}, { sequelize, tableName: 'ticks', timestamps: false });

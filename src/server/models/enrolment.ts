import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, maybeMoment, maybeRef, moment, oneOf, publicId, ref } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A seat: the right of one person to one series. */
export class Enrolment extends Model<InferAttributes<Enrolment>, InferCreationAttributes<Enrolment>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare userId: number;
  declare seriesId: number;
  declare orderId: CreationOptional<number | null>;
  declare source: 'bought' | 'gift' | 'granted';
  declare state: CreationOptional<'active' | 'closed'>;
  declare startedAt: Date;
  /** When it was first looked at which parts are open; what opened later is told. */
  declare openingsBegunAt: CreationOptional<Date | null>;
  /** Rises when she asks for a new address of her calendar. */
  declare calendarRevision: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Enrolment.init({
  id: id(),
  publicId: publicId(),
  userId: ref(),
  seriesId: ref(),
  orderId: maybeRef(),
  source: oneOf(['bought', 'gift', 'granted']),
  state: oneOf(['active', 'closed'], 'active'),
  startedAt: moment(),
  openingsBegunAt: maybeMoment(),
  calendarRevision: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'enrolments' });

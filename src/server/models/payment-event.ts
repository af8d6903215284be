import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { json, maybeMoment, maybeText, text, yes, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What the payment service told us, once each, before anything is done about it. */
export class PaymentEvent extends Model<InferAttributes<PaymentEvent>, InferCreationAttributes<PaymentEvent>> {
  declare id: string;
  declare type: string;
  declare apiVersion: string;
  declare isLive: boolean;
  declare objectId: string;
  declare payload: unknown;
  declare handledAt: CreationOptional<Date | null>;
  declare outcome: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

PaymentEvent.init({
  id: { type: DataTypes.STRING(255), primaryKey: true },
  type: text(80),
  apiVersion: text(40),
  isLive: yes(false),
  objectId: text(255),
  payload: json(),
  handledAt: maybeMoment(),
  outcome: maybeText(80),
  createdAt: moment(),
}, { sequelize, tableName: 'payment_events', updatedAt: false });

import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { moment, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** An address whose mail server said that it takes no letters. Only letters somebody waits for at the door are tried there still. */
export class RefusedAddress extends Model<InferAttributes<RefusedAddress>, InferCreationAttributes<RefusedAddress>> {
  declare addressKey: string;
  /** What the server said; for the steward. */
  declare reply: string;
  declare createdAt: CreationOptional<Date>;
}

RefusedAddress.init({
  addressKey: { ...text(254), primaryKey: true },
  reply: text(500),
  createdAt: moment(),
}, { sequelize, tableName: 'refused_addresses', updatedAt: false });

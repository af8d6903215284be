import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, oneOf, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Money that moved. Rows are added, never changed; what is earned is their sum. */
export class LedgerEntry extends Model<InferAttributes<LedgerEntry>, InferCreationAttributes<LedgerEntry>> {
  declare id: CreationOptional<number>;
  declare orderId: number;
  declare workroomId: number;
  declare kind: 'sale' | 'fee' | 'refund' | 'fee-refund';
  declare amountMinor: number;
  declare currency: string;
  declare externalId: string;
  declare createdAt: CreationOptional<Date>;
}

LedgerEntry.init({
  id: id(),
  orderId: ref(),
  workroomId: ref(),
  kind: oneOf(['sale', 'fee', 'refund', 'fee-refund']),
  amountMinor: { type: DataTypes.BIGINT, allowNull: false },
  currency: text(3),
  externalId: text(255),
  createdAt: moment(),
}, { sequelize, tableName: 'ledger_entries', updatedAt: false });

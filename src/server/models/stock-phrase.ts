import { Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A sentence that is said often at the bench of a workroom; `position` begins with 1. */
export class StockPhrase extends Model<InferAttributes<StockPhrase>, InferCreationAttributes<StockPhrase>> {
  declare workroomId: number;
  declare position: number;
  declare words: string;
}

StockPhrase.init({
  workroomId: { ...ref(), primaryKey: true },
  position: { ...ref(), primaryKey: true },
  words: text(300),
}, { sequelize, tableName: 'stock_phrases', timestamps: false });

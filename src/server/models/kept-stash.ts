import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { moment, oneOf, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What a student has of one yarn (`core/gathering/to-buy.ts` makes its key). */
export class KeptStash extends Model<InferAttributes<KeptStash>, InferCreationAttributes<KeptStash>> {
  declare enrolmentId: number;
  declare yarnKey: string;
  declare amount: number;
  declare unit: 'g' | 'mm' | 'balls';
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

KeptStash.init({
  enrolmentId: { ...ref(), primaryKey: true },
  yarnKey: { ...text(160), primaryKey: true },
  amount: { type: DataTypes.DOUBLE, allowNull: false },
  unit: oneOf(['g', 'mm', 'balls']),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'stashes' });

import { Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, ref } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A photo shown together with another one, at a checkpoint: from the other side, from closer. */
export class FurtherShot extends Model<InferAttributes<FurtherShot>, InferCreationAttributes<FurtherShot>> {
  declare photoId: number;
  /** From 2: the first shot is the progress photo's own. */
  declare shot: number;
  declare mediaId: number;
}

FurtherShot.init({
  photoId: { ...ref(), primaryKey: true },
  shot: { ...count(2), primaryKey: true },
  mediaId: ref(),
}, { sequelize, tableName: 'further_shots', timestamps: false });

import { Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { moment, oneOf, ref } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/**
 * A part that has opened for one seat. `toldBy` says how the student knows: it was open with her seat, a letter said
 * so, or the verdict did. The row is what keeps her from being told twice.
 */
export class PartOpening extends Model<InferAttributes<PartOpening>, InferCreationAttributes<PartOpening>> {
  declare enrolmentId: number;
  declare lessonId: number;
  declare toldBy: 'seat' | 'letter' | 'verdict';
  declare openedAt: Date;
}

PartOpening.init({
  enrolmentId: { ...ref(), primaryKey: true },
  lessonId: { ...ref(), primaryKey: true },
  toldBy: oneOf(['seat', 'letter', 'verdict']),
  openedAt: moment(),
}, { sequelize, tableName: 'part_openings', timestamps: false });

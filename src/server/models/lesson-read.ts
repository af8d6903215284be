import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { ref, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** The text of a part that a student has read. */
export class LessonRead extends Model<InferAttributes<LessonRead>, InferCreationAttributes<LessonRead>> {
  declare enrolmentId: number;
  declare lessonId: number;
  declare versionId: number;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

LessonRead.init({
  enrolmentId: { ...ref(), primaryKey: true },
  lessonId: { ...ref(), primaryKey: true },
  versionId: ref(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'lesson_reads' });

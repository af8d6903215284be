import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, maybeMoment, ref, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** How far a student is in a lesson. */
export class LessonVisit extends Model<InferAttributes<LessonVisit>, InferCreationAttributes<LessonVisit>> {
  declare enrolmentId: number;
  declare lessonId: number;
  declare finishedAt: CreationOptional<Date | null>;
  declare videoMs: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

LessonVisit.init({
  enrolmentId: { ...ref(), primaryKey: true },
  lessonId: { ...ref(), primaryKey: true },
  finishedAt: maybeMoment(),
  videoMs: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'lesson_visits' });

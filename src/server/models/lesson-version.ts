import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, json, longText, maybeRef, ref, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A lesson's text as it was once published. Rows are added, never changed. */
export class LessonVersion extends Model<InferAttributes<LessonVersion>, InferCreationAttributes<LessonVersion>> {
  declare id: CreationOptional<number>;
  declare lessonId: number;
  declare number: number;
  declare source: string;
  declare tree: unknown;
  /** Names of the videos and pictures the text shows: whoever may read it may see them. */
  declare mediaNames: CreationOptional<string[]>;
  declare authorId: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
}

LessonVersion.init({
  id: id(),
  lessonId: ref(),
  number: count(),
  source: longText(),
  tree: json(),
  mediaNames: { ...json(), defaultValue: [] },
  authorId: maybeRef(),
  createdAt: moment(),
}, { sequelize, tableName: 'lesson_versions', updatedAt: false });

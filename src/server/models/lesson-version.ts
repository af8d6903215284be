import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, json, longText, maybeRef, ref, moment } from '#server/db/columns.ts';
import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A lesson's text as it was once published. Rows are added, never changed. */
export class LessonVersion extends Model<InferAttributes<LessonVersion>, InferCreationAttributes<LessonVersion>> {
  declare id: CreationOptional<number>;
  declare lessonId: number;
  declare number: number;
  declare source: string;
  declare tree: LessonTree;
  /** What the text speaks of: its steps, amounts, figures and media. Whoever may read it may see its media. */
  declare facts: LessonFacts;
  declare authorId: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
}

LessonVersion.init({
  id: id(),
  lessonId: ref(),
  number: count(),
  source: longText(),
  tree: json(),
  facts: json(),
  authorId: maybeRef(),
  createdAt: moment(),
}, { sequelize, tableName: 'lesson_versions', updatedAt: false });

import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { id, json, longText, maybeMoment, maybeRef, moment, oneOf, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What a teacher writes to students of a series: a notice to many, or a nudge to one. `sending` while it is being handed out. */
export class Notice extends Model<InferAttributes<Notice>, InferCreationAttributes<Notice>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare workroomId: number;
  declare seriesId: number;
  declare authorId: number;
  declare kind: 'notice' | 'nudge';
  declare state: CreationOptional<'draft' | 'waiting' | 'sending' | 'sent'>;
  declare title: string;
  /** As it was typed, and as it was read. */
  declare source: string;
  declare tree: LessonTree;
  /** Only those who have this part in hand; null: wherever they are. */
  declare atLessonId: CreationOptional<number | null>;
  /** Only those without a step for so many days. */
  declare stillDays: CreationOptional<number | null>;
  declare sendAt: CreationOptional<Date | null>;
  declare sentAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Notice.init({
  id: id(),
  publicId: publicId(),
  workroomId: ref(),
  seriesId: ref(),
  authorId: ref(),
  kind: oneOf(['notice', 'nudge']),
  state: oneOf(['draft', 'waiting', 'sending', 'sent'], 'draft'),
  title: text(120),
  source: longText(),
  tree: json(),
  atLessonId: maybeRef(),
  stillDays: maybeRef(),
  sendAt: maybeMoment(),
  sentAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'notices' });

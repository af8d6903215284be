import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { TOLD_KINDS, type Said, type ToldKind } from '#core/notices/said.ts';
import { id, json, maybeMoment, maybeRef, moment, oneOf, publicId, ref, text, yes } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/**
 * One thing a person is told in her page: a teacher's notice as she got it, or news of the house about her own doings,
 * which belong to no notice. The key keeps her from being told twice.
 */
export class NoticeReceipt extends Model<InferAttributes<NoticeReceipt>, InferCreationAttributes<NoticeReceipt>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare userId: number;
  declare noticeId: CreationOptional<number | null>;
  declare seriesId: CreationOptional<number | null>;
  declare kind: ToldKind;
  /** With her own amounts, as they were when it was written. */
  declare said: Said;
  /** Whether a letter said it too. */
  declare byLetter: boolean;
  declare dedupeKey: string;
  declare readAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

NoticeReceipt.init({
  id: id(),
  publicId: publicId(),
  userId: ref(),
  noticeId: maybeRef(),
  seriesId: maybeRef(),
  kind: oneOf(TOLD_KINDS),
  said: json(),
  byLetter: yes(false),
  dedupeKey: text(190),
  readAt: maybeMoment(),
  createdAt: moment(),
}, { sequelize, tableName: 'notice_receipts', updatedAt: false });

import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { LIST_KINDS, type ListKind } from '#core/notices/letter-kinds.ts';
import { count, id, json, maybeMoment, maybeRef, maybeText, moment, oneOf, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A letter to send: written in the transaction of what it tells, sent by the worker. */
export class Mail extends Model<InferAttributes<Mail>, InferCreationAttributes<Mail>> {
  declare id: CreationOptional<number>;
  declare dedupeKey: string;
  declare template: string;
  declare userId: CreationOptional<number | null>;
  declare toAddress: string;
  declare toName: string;
  declare data: Record<string, unknown>;
  declare expiresAt: CreationOptional<Date | null>;
  declare sentAt: CreationOptional<Date | null>;
  /** The list it goes to, which she can leave until the moment it is sent; null for letters that always come. */
  declare listWorkroomId: CreationOptional<number | null>;
  declare listKind: CreationOptional<ListKind | null>;
  /** `dropped`: not sent, because she wants no such letters, or her address takes none. */
  declare state: CreationOptional<'ready' | 'done' | 'dead' | 'dropped'>;
  declare runAt: Date;
  declare attempts: CreationOptional<number>;
  declare leaseOwner: CreationOptional<string | null>;
  declare leaseUntil: CreationOptional<Date | null>;
  declare lastError: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Mail.init({
  id: id(),
  dedupeKey: text(190),
  template: text(60),
  userId: maybeRef(),
  toAddress: text(254),
  toName: text(80),
  data: json(),
  expiresAt: maybeMoment(),
  sentAt: maybeMoment(),
  listWorkroomId: maybeRef(),
  listKind: { ...oneOf(LIST_KINDS), allowNull: true, defaultValue: null },
  state: oneOf(['ready', 'done', 'dead', 'dropped'], 'ready'),
  runAt: moment(),
  attempts: count(),
  leaseOwner: maybeText(64),
  leaseUntil: maybeMoment(),
  lastError: maybeText(500),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'mails' });

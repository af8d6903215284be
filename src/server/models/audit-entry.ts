import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, json, maybeRef, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Who changed money, roles or gates, and when. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare id: CreationOptional<number>;
  declare actorId: CreationOptional<number | null>;
  declare action: string;
  declare subjectKind: string;
  declare subjectId: string;
  declare detail: Record<string, unknown>;
  declare requestId: string;
  declare createdAt: CreationOptional<Date>;
}

AuditEntry.init({
  id: id(),
  actorId: maybeRef(),
  action: text(60),
  subjectKind: text(40),
  subjectId: text(64),
  detail: json(),
  requestId: text(64),
  createdAt: moment(),
}, { sequelize, tableName: 'audit_entries', updatedAt: false });

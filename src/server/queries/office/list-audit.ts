import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { paged, type Paged } from './paging.ts';

export interface AuditInList {
  readonly id: number;
  readonly at: Date;
  /** Who did it; null: the house itself, by a job. */
  readonly by: string | null;
  readonly action: string;
  readonly subjectKind: string;
  readonly subjectId: string;
  /** The name of a person or workroom the entry is about. */
  readonly subjectName: string | null;
  readonly detail: Readonly<Record<string, unknown>>;
}

const SELECT = `SELECT a.id, a.created_at AS at, u.name AS \`by\`, a.action, a.subject_kind AS subjectKind, a.subject_id AS subjectId, a.detail,
       COALESCE(p.name, w.name) AS subjectName
  FROM audit_entries a
  LEFT JOIN users u ON u.id = a.actor_id
  LEFT JOIN users p ON a.subject_kind = 'person' AND p.public_id = a.subject_id
  LEFT JOIN workrooms w ON a.subject_kind = 'workroom' AND w.public_id = a.subject_id`;

/** What was done to money, roles and gates, newest first; of one person when `person` is given. */
export async function listAudit(page: number, person?: string): Promise<Paged<AuditInList>> {
  const where = person === undefined ? '' : "WHERE a.subject_kind = 'person' AND a.subject_id = ?";
  const given = person === undefined ? [] : [person];
  const [count] = await sequelize.query<{ total: number }>(`SELECT COUNT(*) AS total FROM audit_entries a ${where}`, { replacements: given, type: QueryTypes.SELECT });
  return paged(page, count?.total ?? 0, (limit, offset) =>
    sequelize.query<AuditInList>(`${SELECT} ${where} ORDER BY a.id DESC LIMIT ? OFFSET ?`, { replacements: [...given, limit, offset], type: QueryTypes.SELECT }));
}

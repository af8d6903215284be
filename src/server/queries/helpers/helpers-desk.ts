/** Who helps in a workroom, who is invited, and what happened with both. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import type { Actor } from '#server/context.ts';

export interface Helper {
  readonly publicId: string;
  readonly name: string;
  readonly email: string;
  readonly since: Date;
}
export interface OpenInvitation {
  readonly publicId: string;
  readonly address: string;
  readonly invitedAt: Date;
  readonly expiresAt: Date;
}
export interface HelperEvent {
  readonly at: Date;
  readonly byName: string;
  readonly action: 'invite-helper' | 'take-back-invitation' | 'accept-invitation' | 'end-help';
  /** A name, or the address of an invitation; null when the address has been forgotten. */
  readonly whom: string | null;
}
export interface HelpersDesk {
  readonly workroom: { readonly publicId: string; readonly name: string };
  readonly helpers: readonly Helper[];
  readonly invitations: readonly OpenInvitation[];
  readonly events: readonly HelperEvent[];
}
/** A workroom in which somebody helps. */
export interface HelpedWorkroom {
  readonly publicId: string;
  readonly name: string;
  readonly teacherName: string;
  readonly since: Date;
}

const MOST_EVENTS = 50;

/** Null for who has no workroom of her own. */
export async function helpersDesk(actor: Actor, now: Date): Promise<HelpersDesk | null> {
  if (actor.workroomId === null) return null;
  const asked = { replacements: { workroom: actor.workroomId, now }, type: QueryTypes.SELECT } as const;
  const [[workroom], helpers, invitations, events] = await Promise.all([
    sequelize.query<HelpersDesk['workroom']>('SELECT public_id AS publicId, name FROM workrooms WHERE id = :workroom', asked),
    sequelize.query<Helper>(
      `SELECT u.public_id AS publicId, u.name, u.email, h.created_at AS since FROM workroom_helpers h JOIN users u ON u.id = h.user_id
        WHERE h.workroom_id = :workroom ORDER BY h.created_at, u.id`, asked),
    sequelize.query<OpenInvitation>(
      `SELECT public_id AS publicId, address, created_at AS invitedAt, expires_at AS expiresAt FROM helper_invitations
        WHERE workroom_id = :workroom AND accepted_at IS NULL AND taken_back_at IS NULL AND expires_at > :now ORDER BY created_at, id`, asked),
    sequelize.query<HelperEvent>(
      `SELECT a.created_at AS at, b.name AS byName, a.action, COALESCE(p.name, i.address) AS whom
         FROM workrooms w
         JOIN audit_entries a ON a.subject_kind = 'workroom' AND a.subject_id = w.public_id AND a.action IN ('invite-helper', 'take-back-invitation', 'accept-invitation', 'end-help')
         JOIN users b ON b.id = a.actor_id
         LEFT JOIN users p ON p.public_id = JSON_VALUE(a.detail, '$.person')
         LEFT JOIN helper_invitations i ON i.public_id = JSON_VALUE(a.detail, '$.invitation')
        WHERE w.id = :workroom ORDER BY a.id DESC LIMIT ${MOST_EVENTS}`, asked),
  ]);
  return workroom === undefined ? null : { workroom, helpers, invitations, events };
}

export async function helpedWorkrooms(actor: Actor): Promise<HelpedWorkroom[]> {
  return sequelize.query<HelpedWorkroom>(
    `SELECT w.public_id AS publicId, w.name, u.name AS teacherName, h.created_at AS since
       FROM workroom_helpers h JOIN workrooms w ON w.id = h.workroom_id JOIN users u ON u.id = w.owner_id
      WHERE h.user_id = ? ORDER BY h.created_at, w.id`,
    { replacements: [actor.userId], type: QueryTypes.SELECT },
  );
}

/**
 * Sessions through Lucia 3, behind this file alone: it is no longer maintained, and this is all that would have to be
 * replaced. The session's key in the database is the hash of the token in the cookie, so that a copy of the tables
 * opens nothing.
 */
import { Lucia, TimeSpan, type Adapter, type DatabaseSession, type DatabaseUser } from 'lucia';
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { Session } from '#server/models/index.ts';

export interface SessionAttributes {
  readonly endsAt: Date;
  readonly idleSeconds: number;
  readonly provedAt: Date;
  readonly device: string;
}

export interface UserAttributes {
  readonly publicId: string;
  readonly name: string;
  readonly email: string;
  readonly addressConfirmed: boolean;
  readonly addressRefused: boolean;
  readonly isSteward: boolean;
  readonly workroomId: number | null;
  readonly workroomName: string | null;
  readonly helpsInWorkroomIds: readonly number[];
  readonly units: 'cm' | 'in';
  readonly timeZone: string;
  readonly scheme: 'system' | 'light' | 'dark';
  readonly unreadNotices: number;
}

declare module 'lucia' {
  interface Register {
    Lucia: Lucia<SessionAttributes, UserAttributes>;
    UserId: number;
    DatabaseSessionAttributes: SessionAttributes;
    DatabaseUserAttributes: UserAttributes;
  }
}

interface SessionAndUserRow {
  id: string; userId: number; expiresAt: Date; endsAt: Date; idleSeconds: number; provedAt: Date; device: string;
  publicId: string; name: string; email: string; confirmedAt: Date | null; isSteward: number; units: 'cm' | 'in'; timeZone: string;
  scheme: 'system' | 'light' | 'dark'; workroomId: number | null; workroomName: string | null; helps: string | null; unreadNotices: number; addressRefused: number;
}

/** One statement a request: session, person and the roles that follow from other rows. A suspended person has no session. */
const SESSION_AND_USER = `
  SELECT s.id, s.user_id AS userId, s.expires_at AS expiresAt, s.ends_at AS endsAt, s.idle_seconds AS idleSeconds, s.proved_at AS provedAt, s.device,
         u.public_id AS publicId, u.name, u.email, u.email_confirmed_at AS confirmedAt, u.is_steward AS isSteward, u.units, u.time_zone AS timeZone, u.scheme,
         w.id AS workroomId,
         COALESCE(w.name, (SELECT MIN(o.name) FROM workroom_helpers h JOIN workrooms o ON o.id = h.workroom_id WHERE h.user_id = u.id HAVING COUNT(*) = 1)) AS workroomName,
         (SELECT GROUP_CONCAT(h.workroom_id) FROM workroom_helpers h WHERE h.user_id = u.id) AS helps,
         (SELECT COUNT(*) FROM notice_receipts r WHERE r.user_id = u.id AND r.read_at IS NULL) AS unreadNotices,
         EXISTS (SELECT 1 FROM refused_addresses f WHERE f.address_key = u.email_key) AS addressRefused
    FROM sessions s
    JOIN users u ON u.id = s.user_id AND u.suspended_at IS NULL
    LEFT JOIN workrooms w ON w.owner_id = u.id
   WHERE s.id = ?`;

function sessionOf(row: Pick<SessionAndUserRow, 'id' | 'userId' | 'expiresAt' | 'endsAt' | 'idleSeconds' | 'provedAt' | 'device'>): DatabaseSession {
  const { id, userId, expiresAt, endsAt, idleSeconds, provedAt, device } = row;
  return { id, userId, expiresAt, attributes: { endsAt, idleSeconds, provedAt, device } };
}

function userOf(row: SessionAndUserRow): DatabaseUser {
  return {
    id: row.userId,
    attributes: {
      publicId: row.publicId,
      name: row.name,
      email: row.email,
      addressConfirmed: row.confirmedAt !== null,
      addressRefused: row.addressRefused === 1,
      isSteward: row.isSteward === 1,
      workroomId: row.workroomId,
      workroomName: row.workroomName,
      helpsInWorkroomIds: row.helps === null ? [] : row.helps.split(',').map(Number),
      units: row.units,
      timeZone: row.timeZone,
      scheme: row.scheme,
      unreadNotices: row.unreadNotices,
    },
  };
}

/** Lucia's store over our tables. */
export const sessionAdapter: Adapter = {
  async getSessionAndUser(sessionId) {
    const [row] = await sequelize.query<SessionAndUserRow>(SESSION_AND_USER, { replacements: [sessionId], type: QueryTypes.SELECT });
    return row === undefined ? [null, null] : [sessionOf(row), userOf(row)];
  },
  async getUserSessions(userId) {
    const rows = await Session.findAll({ where: { userId }, order: [['createdAt', 'DESC']] });
    return rows.map((row) => sessionOf(row));
  },
  async setSession({ id, userId, expiresAt, attributes }) {
    const idleEnd = Date.now() + attributes.idleSeconds * 1_000;
    const earliest = Math.min(idleEnd, attributes.endsAt.getTime(), expiresAt.getTime());
    await Session.create({ id, userId, expiresAt: new Date(earliest), ...attributes });
  },
  /** Slides by the session's own idle time and never past its end, at most once in a tenth of that time. */
  async updateSessionExpiration(sessionId) {
    await sequelize.query(
      `UPDATE sessions SET expires_at = LEAST(ends_at, UTC_TIMESTAMP(3) + INTERVAL idle_seconds SECOND)
        WHERE id = ? AND expires_at < LEAST(ends_at, UTC_TIMESTAMP(3) + INTERVAL FLOOR(idle_seconds * 0.9) SECOND)`,
      { replacements: [sessionId], type: QueryTypes.UPDATE },
    );
  },
  async deleteSession(sessionId) {
    await Session.destroy({ where: { id: sessionId } });
  },
  async deleteUserSessions(userId) {
    await Session.destroy({ where: { userId } });
  },
  async deleteExpiredSessions() {
    await sequelize.query('DELETE FROM sessions WHERE expires_at < UTC_TIMESTAMP(3)', { type: QueryTypes.DELETE });
  },
};

/** Longer than any idle time, so that Lucia asks the store to slide on every request; the store decides. */
const LONGEST = new TimeSpan(60, 'd');

export const lucia = new Lucia<SessionAttributes, UserAttributes>(sessionAdapter, {
  sessionExpiresIn: LONGEST,
  getSessionAttributes: (attributes) => attributes,
  getUserAttributes: (attributes) => attributes,
});

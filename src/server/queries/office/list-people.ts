import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { paged, type Paged } from './paging.ts';

export interface PersonInList {
  readonly publicId: string;
  readonly name: string;
  readonly email: string;
  readonly confirmed: boolean;
  readonly isSteward: boolean;
  readonly suspended: boolean;
  readonly createdAt: Date;
  readonly workroom: string | null;
  readonly helpsIn: string | null;
  readonly seats: number;
}

interface Row extends Omit<PersonInList, 'confirmed' | 'isSteward' | 'suspended'> {
  readonly confirmedAt: Date | null;
  readonly isSteward: number;
  readonly suspendedAt: Date | null;
}

const WHERE = "WHERE (? = '' OR u.name LIKE ? OR u.email LIKE ? OR w.name LIKE ?)";
const FROM = 'FROM users u LEFT JOIN workrooms w ON w.owner_id = u.id';

/** People whose name, address or workroom holds `search`, newest first; all when it is empty. */
export async function listPeople(search: string, page: number): Promise<Paged<PersonInList>> {
  const words = search.trim();
  const like = `%${words.replace(/[\\%_]/g, '\\$&')}%`;
  const given = [words, like, like, like];
  const [count] = await sequelize.query<{ total: number }>(`SELECT COUNT(*) AS total ${FROM} ${WHERE}`, { replacements: given, type: QueryTypes.SELECT });
  return paged(page, count?.total ?? 0, async (limit, offset) => {
    const rows = await sequelize.query<Row>(
      `SELECT u.public_id AS publicId, u.name, u.email, u.email_confirmed_at AS confirmedAt, u.is_steward AS isSteward, u.suspended_at AS suspendedAt, u.created_at AS createdAt,
              w.name AS workroom,
              (SELECT GROUP_CONCAT(hw.name SEPARATOR ', ') FROM workroom_helpers h JOIN workrooms hw ON hw.id = h.workroom_id WHERE h.user_id = u.id) AS helpsIn,
              (SELECT COUNT(*) FROM enrolments e WHERE e.user_id = u.id) AS seats
         ${FROM} ${WHERE} ORDER BY u.id DESC LIMIT ? OFFSET ?`,
      { replacements: [...given, limit, offset], type: QueryTypes.SELECT },
    );
    return rows.map(({ confirmedAt, isSteward, suspendedAt, ...row }) => ({ ...row, confirmed: confirmedAt !== null, isSteward: isSteward === 1, suspended: suspendedAt !== null }));
  });
}

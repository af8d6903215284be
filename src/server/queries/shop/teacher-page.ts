/** A teacher as visitors meet her: her workroom, who helps in it, and what is open there. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { workroomSeries, type ShopSeries } from './shop-series.ts';

export interface TeacherPage {
  readonly handle: string;
  readonly workroomName: string;
  readonly teacherName: string;
  readonly about: string;
  readonly answerDays: number;
  readonly helpers: readonly string[];
  readonly series: readonly ShopSeries[];
}

interface Row extends Omit<TeacherPage, 'helpers' | 'series'> { readonly id: number; readonly helpers: string | null }

const SEPARATOR = '\u001f';

/** Four statements at most. @returns null when nobody teaches under this handle. */
export async function teacherPage(handle: string): Promise<TeacherPage | null> {
  const [row] = await sequelize.query<Row>(
    `SELECT w.id, w.handle, w.name AS workroomName, u.name AS teacherName, w.about, w.answer_days AS answerDays,
            (SELECT GROUP_CONCAT(h.name ORDER BY h.id SEPARATOR '${SEPARATOR}') FROM workroom_helpers wh JOIN users h ON h.id = wh.user_id WHERE wh.workroom_id = w.id) AS helpers
       FROM workrooms w JOIN users u ON u.id = w.owner_id
      WHERE w.handle = ?`,
    { replacements: [handle], type: QueryTypes.SELECT },
  );
  if (row === undefined) return null;
  const { id, helpers, ...teacher } = row;
  return { ...teacher, helpers: helpers?.split(SEPARATOR) ?? [], series: await workroomSeries(id) };
}

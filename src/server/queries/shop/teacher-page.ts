/** A teacher as visitors meet her: her workroom, who helps in it, and what is open there. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { workroomSeries, type ShopSeries } from './shop-series.ts';

export interface TeacherNamed {
  readonly publicId: string;
  /** As it is written in the address of her page. */
  readonly handle: string;
  readonly workroomName: string;
  readonly teacherName: string;
  readonly about: string;
  readonly answerDays: number;
}

/** What a finisher said of one of her series that are open. */
export interface SaidOfHer {
  readonly publicId: string;
  readonly words: string;
  readonly name: string;
  readonly slug: string;
  readonly title: string;
}

export interface TeacherPage extends TeacherNamed {
  readonly helpers: readonly string[];
  readonly series: readonly ShopSeries[];
  /** What can be learned from her, each technique once, in the order of her series. */
  readonly techniques: readonly string[];
  /** The newest first, hidden ones left out. */
  readonly said: readonly SaidOfHer[];
}

interface Row extends TeacherNamed { readonly id: number; readonly helpers: string | null }

const SEPARATOR = '\u001f';
const MOST_SAID = 4;

/** One statement. @returns null when nobody teaches under this handle. */
export async function teacherNamed(handle: string): Promise<TeacherNamed | null> {
  return rowOf(handle);
}

/** Five statements at most. @returns null when nobody teaches under this handle. */
export async function teacherPage(handle: string): Promise<TeacherPage | null> {
  const row = await rowOf(handle);
  if (row === null) return null;
  const { id, helpers, ...teacher } = row;
  const series = await workroomSeries(id);
  return { ...teacher, helpers: helpers?.split(SEPARATOR) ?? [], series, techniques: [...new Set(series.flatMap(({ techniques }) => techniques))], said: await saidOf(id) };
}

async function rowOf(handle: string): Promise<Row | null> {
  const [row] = await sequelize.query<Row>(
    `SELECT w.id, w.public_id AS publicId, w.handle, w.name AS workroomName, u.name AS teacherName, w.about, w.answer_days AS answerDays,
            (SELECT GROUP_CONCAT(h.name ORDER BY h.id SEPARATOR '${SEPARATOR}') FROM workroom_helpers wh JOIN users h ON h.id = wh.user_id WHERE wh.workroom_id = w.id) AS helpers
       FROM workrooms w JOIN users u ON u.id = w.owner_id
      WHERE w.handle = ?`,
    { replacements: [handle], type: QueryTypes.SELECT },
  );
  return row ?? null;
}

function saidOf(workroomId: number): Promise<SaidOfHer[]> {
  return sequelize.query<SaidOfHer>(
    `SELECT r.public_id AS publicId, r.words, r.shown_name AS name, s.slug, s.title
       FROM reviews r JOIN series s ON s.id = r.series_id
      WHERE s.workroom_id = ? AND s.state = 'published' AND r.hidden_at IS NULL
      ORDER BY r.created_at DESC, r.id DESC LIMIT ${MOST_SAID}`,
    { replacements: [workroomId], type: QueryTypes.SELECT },
  );
}

/** Who gets what a teacher writes, and how: always in her page, by letter where she asked for it and letters arrive. */
import { QueryTypes } from 'sequelize';
import type { MyPiece } from '#core/craft/fit.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { LetterKind } from '#core/notices/letter-kinds.ts';
import { isMeant } from '#core/workroom/audience.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { Notice } from '#server/models/index.ts';
import { classOf } from '#server/queries/workroom/class-of.ts';

export interface Recipient {
  /** Public ids of her seat and of herself. */
  readonly seat: string;
  readonly person: string;
  readonly userId: number;
  readonly name: string;
  readonly email: string;
  readonly units: 'cm' | 'in';
  readonly mine: MyPiece;
  readonly woven: WovenSoFar;
  readonly byLetter: boolean;
}

interface Row extends Omit<Recipient, 'mine' | 'woven' | 'byLetter'> { readonly mine: MyPiece | null; readonly woven: WovenSoFar | null; readonly confirmed: number; readonly refused: number; readonly wants: number | null }

const PEOPLE = `
  SELECT e.public_id AS seat, u.public_id AS person, u.id AS userId, u.name, u.email, u.units, m.data AS mine, m.woven, u.email_confirmed_at IS NOT NULL AS confirmed,
         EXISTS (SELECT 1 FROM refused_addresses f WHERE f.address_key = u.email_key) AS refused,
         (SELECT c.is_wanted FROM letter_choices c WHERE c.user_id = u.id AND c.workroom_id = :workroomId AND c.kind = :kind ORDER BY c.id DESC LIMIT 1) AS wants
    FROM enrolments e JOIN users u ON u.id = e.user_id AND u.suspended_at IS NULL LEFT JOIN my_pieces m ON m.enrolment_id = e.id
   WHERE e.public_id IN (:seats) AND e.state = 'active'
   ORDER BY u.name, e.id`;

/** The people behind these seats; closed seats and suspended people are left out. */
export async function recipientsAt(seats: readonly string[], workroomId: number, kind: LetterKind): Promise<Recipient[]> {
  if (seats.length === 0) return [];
  const rows = await sequelize.query<Row>(PEOPLE, { replacements: { seats: [...seats], workroomId, kind }, type: QueryTypes.SELECT });
  return rows.map(({ mine, woven, confirmed, refused, wants, ...row }) => ({ ...row, mine: mine ?? {}, woven: woven ?? NOTHING_WOVEN, byLetter: confirmed === 1 && refused === 0 && wants === 1 }));
}

/** Whom a notice means as things stand at `now`. A part that was taken out since has nobody in hand. */
export async function recipientsOf(notice: Pick<Notice, 'workroomId' | 'seriesId' | 'atLessonId' | 'stillDays'>, now: Date): Promise<Recipient[]> {
  const series = (await classOf([notice.workroomId])).find(({ id }) => id === notice.seriesId);
  if (series === undefined) return [];
  const at = notice.atLessonId === null ? null : series.parts.findIndex(({ id }) => id === notice.atLessonId);
  const meant = series.students.filter((student) => isMeant(student, { at, stillDays: notice.stillDays }, now));
  return recipientsAt(meant.map(({ seat }) => seat), notice.workroomId, 'notices');
}

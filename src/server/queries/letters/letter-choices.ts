/**
 * Which letters a person chose, workroom by workroom. The newest choice of each kind holds; no choice is a no, but for
 * letters about answers, which come at once.
 */
import { QueryTypes } from 'sequelize';
import { LETTER_KINDS, type AnswerPace, type LetterKind, type ListKind } from '#core/notices/letter-kinds.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { LetterChoice } from '#server/models/index.ts';

export interface LetterChoiceOf {
  readonly workroomId: number;
  /** Public id. */
  readonly workroom: string;
  readonly name: string;
  readonly wanted: readonly LetterKind[];
  readonly answers: AnswerPace;
}

/** How often letters of one kind come; a kind that is asked for comes at once or never. */
export async function letterPace(userId: number, workroomId: number, kind: ListKind): Promise<AnswerPace> {
  const newest = await LetterChoice.findOne({ where: { userId, workroomId, kind }, order: [['id', 'DESC']] });
  if (newest === null) return kind === 'answers' ? 'at-once' : 'never';
  if (!newest.isWanted) return 'never';
  return newest.isDaily ? 'daily' : 'at-once';
}

export async function wantsLetters(userId: number, workroomId: number, kind: ListKind): Promise<boolean> {
  return (await letterPace(userId, workroomId, kind)) !== 'never';
}

const CHOICES = `
  SELECT w.id AS workroomId, w.public_id AS workroom, w.name,
         (SELECT GROUP_CONCAT(c.kind) FROM letter_choices c
           WHERE c.user_id = :userId AND c.workroom_id = w.id AND c.is_wanted = 1
             AND NOT EXISTS (SELECT 1 FROM letter_choices n WHERE n.user_id = c.user_id AND n.workroom_id = c.workroom_id AND n.kind = c.kind AND n.id > c.id)) AS wanted,
         COALESCE((SELECT CASE WHEN c.is_wanted = 0 THEN 'never' WHEN c.is_daily = 1 THEN 'daily' ELSE 'at-once' END FROM letter_choices c
                    WHERE c.user_id = :userId AND c.workroom_id = w.id AND c.kind = 'answers' ORDER BY c.id DESC LIMIT 1), 'at-once') AS answers
    FROM workrooms w
   WHERE w.id IN (SELECT s.workroom_id FROM enrolments e JOIN series s ON s.id = e.series_id WHERE e.user_id = :userId
                  UNION SELECT c.workroom_id FROM letter_choices c WHERE c.user_id = :userId)
   ORDER BY w.name, w.id`;

/** Of every workroom in which she has or had a seat. */
export async function letterChoicesOf(userId: number): Promise<LetterChoiceOf[]> {
  const rows = await sequelize.query<Omit<LetterChoiceOf, 'wanted'> & { wanted: string | null }>(CHOICES, { replacements: { userId }, type: QueryTypes.SELECT });
  return rows.map(({ wanted, ...row }) => ({ ...row, wanted: LETTER_KINDS.filter((kind) => wanted?.split(',').includes(kind)) }));
}

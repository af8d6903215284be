/** Which letters a person asked for, workroom by workroom. The newest choice of each kind holds; no choice is a no. */
import { QueryTypes } from 'sequelize';
import { LETTER_KINDS, type LetterKind } from '#core/notices/letter-kinds.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { LetterChoice } from '#server/models/index.ts';

export interface LetterChoiceOf {
  readonly workroomId: number;
  /** Public id. */
  readonly workroom: string;
  readonly name: string;
  readonly wanted: readonly LetterKind[];
}

export async function wantsLetters(userId: number, workroomId: number, kind: LetterKind): Promise<boolean> {
  const newest = await LetterChoice.findOne({ where: { userId, workroomId, kind }, order: [['id', 'DESC']] });
  return newest?.isWanted === true;
}

const CHOICES = `
  SELECT w.id AS workroomId, w.public_id AS workroom, w.name,
         (SELECT GROUP_CONCAT(c.kind) FROM letter_choices c
           WHERE c.user_id = :userId AND c.workroom_id = w.id AND c.is_wanted = 1
             AND NOT EXISTS (SELECT 1 FROM letter_choices n WHERE n.user_id = c.user_id AND n.workroom_id = c.workroom_id AND n.kind = c.kind AND n.id > c.id)) AS wanted
    FROM workrooms w
   WHERE w.id IN (SELECT s.workroom_id FROM enrolments e JOIN series s ON s.id = e.series_id WHERE e.user_id = :userId
                  UNION SELECT c.workroom_id FROM letter_choices c WHERE c.user_id = :userId)
   ORDER BY w.name, w.id`;

/** Of every workroom in which she has or had a seat. */
export async function letterChoicesOf(userId: number): Promise<LetterChoiceOf[]> {
  const rows = await sequelize.query<Omit<LetterChoiceOf, 'wanted'> & { wanted: string | null }>(CHOICES, { replacements: { userId }, type: QueryTypes.SELECT });
  return rows.map(({ wanted, ...row }) => ({ ...row, wanted: LETTER_KINDS.filter((kind) => wanted?.split(',').includes(kind)) }));
}

/** Ids of the steps of a lesson that one student has done. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export async function tickedSteps(enrolmentId: number, lessonPublicId: string): Promise<string[]> {
  const rows = await sequelize.query<{ itemKey: string }>(
    `SELECT item_key AS itemKey FROM ticks WHERE enrolment_id = ? AND subject = 'step' AND is_ticked = 1 AND item_key LIKE CONCAT(?, ':%')`,
    { replacements: [enrolmentId, lessonPublicId], type: QueryTypes.SELECT },
  );
  return rows.map(({ itemKey }) => itemKey.slice(lessonPublicId.length + 1));
}

import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

/** When this person was last nudged from this workroom; null when never. */
export async function lastNudgeOf(userId: number, workroomId: number): Promise<Date | null> {
  const [row] = await sequelize.query<{ at: Date | null }>(
    `SELECT MAX(n.sent_at) AS at FROM notice_receipts r JOIN notices n ON n.id = r.notice_id WHERE r.user_id = :userId AND n.workroom_id = :workroomId AND n.kind = 'nudge'`,
    { replacements: { userId, workroomId }, type: QueryTypes.SELECT },
  );
  return row?.at ?? null;
}

import { readLeaveKey, type LeaveOf } from '#server/auth/leave-key.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found } from '#server/errors.ts';
import { User, Workroom } from '#server/models/index.ts';
import { recordChoice } from './_record-choice.ts';

/**
 * Leaves one kind of letters of one workroom by the key in a letter; again changes nothing more. The other kinds stay.
 * Letters of this kind that wait to be sent are not sent.
 * @throws NOT_FOUND for a key this house did not make.
 */
export async function leaveLetters(ctx: Context, key: string): Promise<void> {
  const { kind, ...of } = found(readLeaveKey(key));
  const { user, workroom } = await whoAndWhere(of);
  await withTransaction(() => recordChoice({ userId: user.id, workroomId: workroom.id, kind, pace: 'never', source: 'letter' }, ctx.clock.now()));
}

async function whoAndWhere({ person, workroom }: Omit<LeaveOf, 'kind'>): Promise<{ user: User; workroom: Workroom }> {
  return { user: found(await User.findOne({ where: { publicId: person } })), workroom: found(await Workroom.findOne({ where: { publicId: workroom } })) };
}

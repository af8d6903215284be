import type { EndHelpInput } from '#contracts/helpers.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { User, Workroom, WorkroomHelper } from '#server/models/index.ts';
import { mayEndHelp } from '#server/policies/workroom.ts';

/**
 * Somebody helps no longer, from the next thing she asks for on. She stays signed in, what she answered stays, and when
 * the teacher ended it she is told by letter.
 * @returns her name.
 * @throws NOT_FOUND unless the teacher or she herself asks; CONFLICT when it had ended already.
 */
export async function endHelp(ctx: Context, input: EndHelpInput): Promise<string> {
  const actor = signedIn(ctx);
  return withTransaction(async () => {
    const workroom = found(await Workroom.findOne({ where: { publicId: input.workroom }, lock: true }));
    const person = found(await User.findOne({ where: { publicId: input.person } }));
    authorize(mayEndHelp(actor, { workroomId: workroom.id, helperId: person.id }));
    const row = await WorkroomHelper.findOne({ where: { workroomId: workroom.id, userId: person.id } });
    if (row === null) throw new AppError('CONFLICT', { says: `${person.name} helped no longer already.` });
    await row.destroy();
    await audit(ctx, 'end-help', { kind: 'workroom', id: workroom.publicId }, { person: person.publicId });
    if (person.id !== actor.userId) {
      await postLetter({
        template: 'help-ended',
        data: { teacherName: actor.name, workroomName: workroom.name },
        to: { userId: person.id, name: person.name, address: person.email },
        dedupeKey: `help-ended:${workroom.publicId}:${person.publicId}:${row.createdAt.getTime()}`,
      });
    }
    return person.name;
  });
}

import type { LetInInput } from '#contracts/office.ts';
import { audit } from '#server/audit.ts';
import { endAllSessions } from '#server/auth/sessions.ts';
import { requireProof } from '#server/auth/step-up.ts';
import type { Context } from '#server/context.ts';
import { orFieldError } from '#server/db/constraint.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { User, Workroom } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

/**
 * Lets a person in as a teacher: she gets a workroom, is signed out everywhere (what her account opens has changed) and
 * is told by mail.
 * @returns her name.
 * @throws NOT_FOUND unless the steward asks; PROOF_NEEDED; CONFLICT when she has a workroom or is suspended; VALIDATION at `handle`.
 */
export async function letInTeacher(ctx: Context, input: LetInInput): Promise<string> {
  authorize(maySeeOffice(ctx.actor));
  requireProof(ctx);
  return withTransaction(async () => {
    const person = found(await User.findOne({ where: { publicId: input.person }, lock: true }));
    if (person.suspendedAt !== null) throw new AppError('CONFLICT', { says: `${person.name} is suspended. Restore her first.` });
    if ((await Workroom.count({ where: { ownerId: person.id } })) > 0) throw new AppError('CONFLICT', { says: `${person.name} has a workroom already.` });
    const workroom = await orFieldError('uq_workrooms_handle', 'handle', 'Another workroom has this handle. Choose a different one.', () =>
      Workroom.create({ ownerId: person.id, handle: input.handle, name: input.workroom, timeZone: person.timeZone }));
    await endAllSessions(person.id);
    await postLetter({
      template: 'workroom-opened',
      data: { workroom: workroom.name },
      to: { userId: person.id, name: person.name, address: person.email },
      dedupeKey: `workroom-opened:${workroom.publicId}`,
    });
    await audit(ctx, 'let-in-teacher', { kind: 'person', id: person.publicId }, { workroom: workroom.publicId });
    return person.name;
  });
}

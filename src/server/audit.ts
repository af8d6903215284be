/** Writes down who changed money, roles or gates. Called inside the transaction of the change. */
import type { Context } from '#server/context.ts';
import { AuditEntry } from '#server/models/index.ts';

/** `detail` holds no secrets and no more of a person than ids. */
export async function audit(ctx: Context, action: string, subject: { kind: string; id: string }, detail: Record<string, unknown> = {}): Promise<void> {
  await AuditEntry.create({
    actorId: ctx.actor?.userId ?? null,
    action,
    subjectKind: subject.kind,
    subjectId: subject.id,
    detail,
    requestId: ctx.requestId,
  });
}

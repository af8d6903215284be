import type { VerdictInput } from '#contracts/bench.ts';
import { HOLD_MS } from '#core/workroom/bench.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found } from '#server/errors.ts';
import { sendVerdict } from '#server/jobs/definitions/bench.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { HeldVerdict, ProgressPhoto } from '#server/models/index.ts';
import { answeredAlready, photoAtBench } from './_at-bench.ts';

/**
 * Says *weave on* or *mend first* of a waiting photo, with words and pinned notes. The student learns of it after ten
 * seconds, in which it can be taken back. Of two who answer at once the first is heard; the other is told who was.
 * @throws NOT_FOUND for another workroom's photo; CONFLICT when it was answered in the meantime.
 */
export async function holdVerdict(ctx: Context, { photo: publicId, verdict, words, notes, see }: Omit<VerdictInput, 'next'>): Promise<HeldVerdict> {
  const { actor, photo } = await photoAtBench(ctx, publicId);
  return withTransaction(async () => {
    const { verdict: said, verdictById } = found(await ProgressPhoto.findByPk(photo.id, { lock: true }));
    if (said !== 'waits') throw await answeredAlready(verdictById, said);
    const before = await HeldVerdict.findByPk(photo.id);
    if (before !== null && before.goesOutAt !== null) throw await answeredAlready(before.byId, before.verdict);
    const goesOutAt = new Date(ctx.clock.now().getTime() + HOLD_MS);
    const round = (before?.round ?? 0) + 1;
    const given = { byId: actor.userId, verdict, words, notes, see: verdict === 'mend-first' ? see ?? null : null, round, goesOutAt };
    const held = before === null ? await HeldVerdict.create({ photoId: photo.id, ...given }) : await before.update(given);
    await audit(ctx, `verdict-${verdict}`, { kind: 'photo', id: publicId });
    await enqueue(sendVerdict, { photoId: photo.id, round }, { runAt: goesOutAt });
    return held;
  });
}

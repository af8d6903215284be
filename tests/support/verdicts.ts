/** Verdicts as they reach students: said at the bench, and sent once the time for taking them back is over. */
import type { VerdictInput } from '#contracts/bench.ts';
import type { Context } from '#server/context.ts';
import { REGISTERED } from '#server/jobs/handlers/index.ts';
import { Job } from '#server/models/index.ts';
import { holdVerdict } from '#server/use-cases/bench/hold-verdict.ts';
import { contextOf } from './context.ts';

/** Does what the worker does with every verdict on its way, once. */
export async function sendVerdicts(): Promise<void> {
  const registered = REGISTERED.find(({ definition }) => definition.type === 'send-verdict');
  const { signal } = new AbortController();
  for (const { payload } of await Job.findAll({ where: { type: 'send-verdict' }, order: ['id'] })) await registered?.run(contextOf(null), payload, { signal });
}

export async function giveVerdict(ctx: Context, input: VerdictInput): Promise<void> {
  await holdVerdict(ctx, input);
  await sendVerdicts();
}

import { VerdictForm } from '#contracts/bench.ts';
import { giveVerdict } from '#server/use-cases/bench/give-verdict.ts';
import { formAction } from './form-action.ts';

export const bench = {
  giveVerdict: formAction(VerdictForm, async (input, ctx) => {
    const photo = await giveVerdict(ctx, input);
    return { to: '/workroom/bench', said: photo.verdict === 'weave-on' ? 'Weave on: sent.' : 'Mend first: sent.' };
  }),
};

import { OwnLoomForm, TakeOutLoomForm } from '#contracts/own-looms.ts';
import { keepOwnLoom } from '#server/use-cases/looms/keep-own-loom.ts';
import { takeOutLoom } from '#server/use-cases/looms/take-out-loom.ts';
import { formAction } from './form-action.ts';

/** A person's own looms. */
export const looms = {
  keep: formAction(OwnLoomForm, async (input, ctx) => {
    const { name } = await keepOwnLoom(ctx, input);
    return { to: '/account/looms', said: `${name} is on your list.` };
  }),

  takeOut: formAction(TakeOutLoomForm, async (input, ctx) => {
    const { name } = await takeOutLoom(ctx, input);
    return { to: '/account/looms', said: input.back === undefined ? `${name} is off your list. For thirty days it can be put back.` : `${name} is on your list again.` };
  }),
};

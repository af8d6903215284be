import { FinishedForm, SaySoForm } from '#contracts/finish.ts';
import { saySo } from '#server/use-cases/finish/say-so.ts';
import { takePhotoOut } from '#server/use-cases/finish/take-photo-out.ts';
import { writeDown } from '#server/use-cases/finish/write-down.ts';
import { formAction } from './form-action.ts';

/** Forms of a piece that is off the loom. */
export const finish = {
  saySo: formAction(SaySoForm, async (input, ctx) => {
    await saySo(ctx, input);
    return { to: `/series/${input.series}/finish`, said: 'Your piece is off the loom. Write down what you want to remember.' };
  }),
  writeDown: formAction(FinishedForm, async (input, ctx) => {
    await writeDown(ctx, input);
    return { to: `/series/${input.series}/finish#record`, said: 'It is written down. The label goes by it.' };
  }),
  takePhotoOut: formAction(SaySoForm, async (input, ctx) => {
    await takePhotoOut(ctx, input);
    return { to: `/series/${input.series}/finish#photo`, said: 'The photo is taken out for good.' };
  }),
};

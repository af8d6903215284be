import { defineAction } from 'astro:actions';
import { PhrasesForm, PromiseForm, TakeBackForm, VerdictForm } from '#contracts/bench.ts';
import { withPhrase } from '#core/workroom/bench.ts';
import { holdVerdict } from '#server/use-cases/bench/hold-verdict.ts';
import { savePhrases } from '#server/use-cases/bench/save-phrases.ts';
import { savePromise } from '#server/use-cases/bench/save-promise.ts';
import { takeBackVerdict } from '#server/use-cases/bench/take-back-verdict.ts';
import { answerForm, drawnAgain, type FormAnswer } from '#server/web/form.ts';
import { formAction } from './form-action.ts';

const addressOf = (photo: string | undefined): string => (photo === undefined ? '/workroom/bench' : `/workroom/bench?photo=${photo}`);

export const bench = {
  /** A phrase's button sends nothing to the student: the form is drawn again with the phrase in it. */
  giveVerdict: defineAction({
    accept: 'form',
    handler: async (form: FormData, { locals: { ctx } }): Promise<FormAnswer> => {
      const [phrase, words] = [form.get('phrase'), form.get('words')];
      if (typeof phrase === 'string') {
        form.set('words', withPhrase(typeof words === 'string' ? words : '', phrase));
        return drawnAgain(form);
      }
      return answerForm(VerdictForm, form, async ({ next, ...said }) => {
        await holdVerdict(ctx, said);
        return { to: addressOf(next) };
      });
    },
  }),
  takeBack: formAction(TakeBackForm, async (input, ctx) => {
    await takeBackVerdict(ctx, input);
    return { to: addressOf(input.photo), said: 'Taken back. Nothing was sent.' };
  }),
  savePhrases: formAction(PhrasesForm, async (input, ctx) => {
    await savePhrases(ctx, input);
    return { to: '/workroom/bench/settings', said: 'The phrases are saved.' };
  }),
  savePromise: formAction(PromiseForm, async (input, ctx) => {
    await savePromise(ctx, input);
    return { to: '/workroom/bench/settings', said: 'Your promise is saved. Students read it from now on.' };
  }),
};

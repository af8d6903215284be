/** Forms of asking and answering. Each goes back to the page it stands on, at its place. */
import { defineAction, type ActionAPIContext } from 'astro:actions';
import { AnswerForm, AskForm, ChangeWordsForm, ReportForm, SettleReportForm, WordsForm, type AskInput } from '#contracts/questions.ts';
import { firstName } from '#core/following/opening-words.ts';
import type { Context } from '#server/context.ts';
import { likeQuestions } from '#server/queries/questions/like-questions.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { answerQuestion } from '#server/use-cases/questions/answer-question.ts';
import { askQuestion } from '#server/use-cases/questions/ask-question.ts';
import { changeWords } from '#server/use-cases/questions/change-words.ts';
import { putBackWords } from '#server/use-cases/questions/put-back-words.ts';
import { reportWords } from '#server/use-cases/questions/report-words.ts';
import { settleReport } from '#server/use-cases/questions/settle-report.ts';
import { takeOutWords } from '#server/use-cases/questions/take-out-words.ts';
import { answerForm, drawnAgain, typedValues, type FormAnswer } from '#server/web/form.ts';
import { formAction } from './form-action.ts';

const at = (api: ActionAPIContext, question?: { readonly publicId: string }): string => `${api.url.pathname}#${question === undefined ? 'questions' : `q-${question.publicId}`}`;

/** Whether something in like words was asked that she has not been shown yet. */
async function wasAskedBefore(ctx: Context, { series: slug, words }: AskInput): Promise<boolean> {
  const series = ctx.actor === null ? null : await seriesFor(ctx.actor, slug, ctx.clock.now());
  return ctx.actor !== null && series !== null && (await likeQuestions(ctx.actor, series, words)).length > 0;
}

export const questions = {
  /** What the class asked before in like words is shown first; then it is asked all the same. */
  ask: defineAction({
    accept: 'form',
    handler: async (form: FormData, api): Promise<FormAnswer> => {
      const { ctx } = api.locals;
      const typed = AskForm.safeParse(typedValues(form));
      if (typed.success && !typed.data.looked && (await wasAskedBefore(ctx, typed.data))) return drawnAgain(form);
      return answerForm(AskForm, form, async (input) => {
        const question = await askQuestion(ctx, input);
        return { to: at(api, question), said: `Your question is asked.${input.letter ? ' You get a letter when it is answered.' : ''}` };
      });
    },
  }),
  answer: formAction(AnswerForm, async (input, ctx, api) => {
    const { question, askerName } = await answerQuestion(ctx, input);
    const to = firstName(askerName);
    return { to: at(api), said: question.isForClass ? `Your answer stands for ${to} and everybody who has the part open.` : `Your answer is sent to ${to}.` };
  }),
  change: formAction(ChangeWordsForm, async (input, ctx, api) => ({ to: at(api, await changeWords(ctx, input)), said: 'Changed.' })),
  takeOut: formAction(WordsForm, async (input, ctx, api) => ({ to: at(api, await takeOutWords(ctx, input)), said: 'Taken out. You can put it back for 30 days.' })),
  putBack: formAction(WordsForm, async (input, ctx, api) => ({ to: at(api, await putBackWords(ctx, input)), said: 'Put back.' })),
  report: formAction(ReportForm, async (input, ctx, api) => ({ to: at(api, await reportWords(ctx, input)), said: 'Told to the steward, who looks at it. Nobody else is told that it was you.' })),
  settle: formAction(SettleReportForm, async (input, ctx) => {
    await settleReport(ctx, input);
    return { to: '/office/reports', said: input.words === 'take-out' ? 'The words are taken out.' : 'The words stand.' };
  }),
};

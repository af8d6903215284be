import { defineAction } from 'astro:actions';
import { PieceForm } from '#contracts/piece.ts';
import { readAct } from '#core/craft/piece-form/change-typed.ts';
import { textsOfTyped, typedOfFields } from '#core/craft/piece-form/field-names.ts';
import { judgeTyped, type Found } from '#core/craft/piece-form/judge-typed.ts';
import { AppError } from '#server/errors.ts';
import { exchangePieceDraft } from '#server/use-cases/workroom/exchange-piece-draft.ts';
import { savePiece } from '#server/use-cases/workroom/save-piece.ts';
import { answerForm, drawnAgain, type FormAnswer } from '#server/web/form.ts';

export const pieces = {
  /**
   * Every button of the form comes here. One that only moves rows saves nothing: the page draws the form again as it
   * was sent, after that act. Two put something else into the form and set aside what stood there.
   */
  describe: defineAction({
    accept: 'form',
    handler: async (form: FormData, api): Promise<FormAnswer> => {
      const wanted = form.get('do');
      if (typeof wanted === 'string' && readAct(wanted) !== null) return drawnAgain(form);
      return answerForm(PieceForm, form, async ({ series, revision, over, ...fields }) => {
        const to = `/workroom/series/${series}/piece`;
        const typed = typedOfFields((name) => { const text = fields[name]; return typeof text === 'string' ? text : text?.[0]; });
        if (wanted === 'as-saved' || wanted === 'set-aside') {
          await exchangePieceDraft(api.locals.ctx, { series, revision, texts: textsOfTyped(typed), to: wanted });
          return { to, said: wanted === 'as-saved' ? 'The piece stands as it was saved. What stood here is set aside.' : 'Taken up again. What stood here is set aside.' };
        }
        const judged = judgeTyped(typed);
        if (!judged.ok) throw refused(judged.problems);
        const saved = await savePiece(api.locals.ctx, { series, revision, piece: judged.piece, over: over !== undefined });
        if (!saved.ok) throw refused(saved.problems.map(({ message }) => ({ field: '', says: message, kind: 'reckoned' as const })));
        return { to, said: 'The piece is saved.' };
      });
    },
  }),
};

function refused(problems: readonly Found[]): AppError {
  return new AppError('VALIDATION', { fields: Object.fromEntries(problems.toReversed().map(({ field, says }) => [field, says])) });
}

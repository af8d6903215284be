/** Forms about notices: reading them, and in the workroom writing them. */
import { LettersForm, MarkReadForm } from '#contracts/notices.ts';
import { chooseLetters } from '#server/use-cases/letters/choose-letters.ts';
import { markRead } from '#server/use-cases/notices/mark-read.ts';
import { safeReturn } from '#server/web/gate.ts';
import { formAction } from './form-action.ts';

export const notices = {
  chooseLetters: formAction(LettersForm, async (input, ctx, api) => {
    const workroom = await chooseLetters(ctx, input);
    return { to: safeReturn(`${api.url.pathname}#letters`, '/account#letters'), said: input.wanted.length === 0 ? `No letters of ${workroom} but those about your own doings.` : `Kept: these letters of ${workroom} come to you.` };
  }),

  /** She stays where she is. */
  markRead: formAction(MarkReadForm, async (input, ctx, api) => {
    const count = await markRead(ctx, input);
    return { to: safeReturn(`${api.url.pathname}${pageAsked(api.url)}`, '/notices'), ...(input.notice === 'all' && { said: count === 0 ? 'All were read already.' : 'All are marked as read.' }) };
  }),
};

/** The page of a long list she was at. */
function pageAsked(url: URL): string {
  const page = url.searchParams.get('page') ?? '';
  return /^\d{1,6}$/.test(page) ? `?page=${page}` : '';
}

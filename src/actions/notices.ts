/** Forms about notices: reading them, and in the workroom writing them. */
import { defineAction } from 'astro:actions';
import { LettersForm, MarkReadForm, NoticeDraftForm, NoticeForm, NudgeForm, SendNoticeForm } from '#contracts/notices.ts';
import type { AnswerPace } from '#core/notices/letter-kinds.ts';
import { momentWords } from '#core/moment-words.ts';
import { signedIn } from '#server/errors.ts';
import { chooseLetters } from '#server/use-cases/letters/choose-letters.ts';
import { keepNotice } from '#server/use-cases/notices/keep-notice.ts';
import { markRead } from '#server/use-cases/notices/mark-read.ts';
import { nudgeStudent } from '#server/use-cases/notices/nudge-student.ts';
import { sendNotice } from '#server/use-cases/notices/send-notice.ts';
import { takeBackNotice } from '#server/use-cases/notices/take-back-notice.ts';
import { throwAwayNotice } from '#server/use-cases/notices/throw-away-notice.ts';
import { answerForm, drawnAgain, type FormAnswer } from '#server/web/form.ts';
import { safeReturn } from '#server/web/gate.ts';
import { formAction } from './form-action.ts';

const deskAt = (notice: string): string => `/workroom/notices/${notice}`;

const ANSWERS_SAID: Readonly<Record<AnswerPace, string>> = {
  'at-once': 'Answers come at once.',
  daily: 'Answers come in one letter a day.',
  never: 'Answers stand under Notices only.',
};

export const notices = {
  keep: formAction(NoticeDraftForm, async (input, ctx) => {
    const { publicId } = await keepNotice(ctx, input);
    return { to: deskAt(publicId), said: 'Kept. Nobody has got it yet.' };
  }),
  send: formAction(SendNoticeForm, async (input, ctx) => {
    const { publicId, sendAt } = await sendNotice(ctx, input);
    return { to: deskAt(publicId), said: input.when === 'now' || sendAt === null ? 'It goes out now.' : `It goes out ${momentWords(sendAt, signedIn(ctx).timeZone)}.` };
  }),
  takeBack: formAction(NoticeForm, async ({ notice }, ctx) => {
    await takeBackNotice(ctx, notice);
    return { to: deskAt(notice), said: 'Taken back. It is a draft again.' };
  }),
  throwAway: formAction(NoticeForm, async ({ notice }, ctx) => {
    await throwAwayNotice(ctx, notice);
    return { to: '/workroom/notices', said: 'Thrown away.' };
  }),
  /** One button draws the form again with how it reads; the other sends. */
  nudge: defineAction({
    accept: 'form',
    handler: async (form: FormData, { locals: { ctx } }): Promise<FormAnswer> => {
      if (form.get('do') === 'look') return drawnAgain(form);
      return answerForm(NudgeForm, form, async (input) => {
        const { name, byLetter } = await nudgeStudent(ctx, input);
        return { to: '/workroom/students', said: `${name} has it under Notices${byLetter ? ' and by letter' : ''}.` };
      });
    },
  }),

  chooseLetters: formAction(LettersForm, async (input, ctx, api) => {
    const workroom = await chooseLetters(ctx, input);
    return { to: safeReturn(`${api.url.pathname}#letters`, '/account#letters'), said: `${input.wanted.length === 0 ? `No letters of ${workroom} but those about your own doings.` : `Kept: these letters of ${workroom} come to you.`} ${ANSWERS_SAID[input.answers]}` };
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

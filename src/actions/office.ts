import { LetInForm, RestoreForm, SendAgainForm, SuspendForm, TryAgainForm } from '#contracts/office.ts';
import { letInTeacher } from '#server/use-cases/office/let-in-teacher.ts';
import { restorePerson } from '#server/use-cases/office/restore-person.ts';
import { sendLetterAgain } from '#server/use-cases/office/send-letter-again.ts';
import { suspendPerson } from '#server/use-cases/office/suspend-person.ts';
import { tryJobAgain } from '#server/use-cases/office/try-job-again.ts';
import { formAction } from './form-action.ts';

export const office = {
  letIn: formAction(LetInForm, async (input, ctx) => {
    const name = await letInTeacher(ctx, input);
    return { to: `/office/people/${input.person}`, said: `${name} is let in as a teacher.` };
  }),

  suspend: formAction(SuspendForm, async (input, ctx) => {
    const name = await suspendPerson(ctx, input);
    return { to: `/office/people/${input.person}`, said: `${name} is suspended and signed out.` };
  }),

  restore: formAction(RestoreForm, async (input, ctx) => {
    const name = await restorePerson(ctx, input);
    return { to: `/office/people/${input.person}`, said: `${name} is restored and can sign in.` };
  }),

  sendAgain: formAction(SendAgainForm, async (input, ctx) => {
    const name = await sendLetterAgain(ctx, input);
    return { to: '/office/mail', said: `The letter to ${name} goes out again.` };
  }),

  tryAgain: formAction(TryAgainForm, async (input, ctx) => {
    await tryJobAgain(ctx, input);
    return { to: '/office/jobs', said: 'The job is tried again.' };
  }),
};

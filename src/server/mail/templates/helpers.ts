/** Letters about helping in a workroom. */
import { z } from 'astro/zod';
import { HELPERS_MAY, HELPERS_MAY_NOT } from '#core/workroom/helper-words.ts';
import { defineTemplate } from '#server/mail/template.ts';

export const helperInvited = defineTemplate({
  data: z.object({ token: z.string(), teacherName: z.string(), workroomName: z.string() }),
  write: ({ token, teacherName, workroomName }, { publicUrl }) => ({
    subject: `${teacherName} asks you to help`,
    blocks: [
      { kind: 'words', words: `${teacherName} asks you to help in ${workroomName} at Fellmark. Who helps may:` },
      { kind: 'list', items: HELPERS_MAY },
      { kind: 'words', words: HELPERS_MAY_NOT },
      { kind: 'act', label: 'Look at the invitation', href: `${publicUrl}/helping/${token}` },
      { kind: 'words', words: 'The link works for seven days, once, and only with an account of this address. If you do not want to help, do nothing.' },
    ],
  }),
});

export const helpEnded = defineTemplate({
  data: z.object({ teacherName: z.string(), workroomName: z.string() }),
  write: ({ teacherName, workroomName }) => ({
    subject: `You help no longer in ${workroomName}`,
    blocks: [{ kind: 'words', words: `${teacherName} has ended your helping in ${workroomName}. Its bench and its questions are closed to you; your account, your own seats and what you answered stay as they are.` }],
  }),
});

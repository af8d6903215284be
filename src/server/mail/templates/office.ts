/** Letters of the steward's office. */
import { z } from 'astro/zod';
import { defineTemplate } from '#server/mail/template.ts';

export const workroomOpened = defineTemplate({
  data: z.object({ workroom: z.string() }),
  write: ({ workroom }, { publicUrl }) => ({
    subject: 'Your workroom is open',
    blocks: [
      { kind: 'words', words: `You are let in as a teacher. Your workroom is called ${workroom}. You were signed out everywhere; sign in again to enter it.` },
      { kind: 'act', label: 'Go to your workroom', href: `${publicUrl}/workroom` },
    ],
  }),
});

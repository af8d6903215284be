/** Letters about having an account. */
import { z } from 'astro/zod';
import { defineTemplate } from '#server/mail/template.ts';

export const confirmAddress = defineTemplate({
  data: z.object({ token: z.string() }),
  write: ({ token }, { publicUrl }) => ({
    subject: 'Confirm your address',
    blocks: [
      { kind: 'words', words: 'Somebody, most likely you, opened an account at Fellmark with this address. Open the link to say that it is yours. It works for 24 hours, once.' },
      { kind: 'act', label: 'Confirm this address', href: `${publicUrl}/confirm/${token}` },
      { kind: 'words', words: 'If it was not you, do nothing. Nothing is sent here again.' },
    ],
  }),
});

export const accountExists = defineTemplate({
  data: z.object({}),
  write: (_data, { publicUrl }) => ({
    subject: 'You have an account already',
    blocks: [
      { kind: 'words', words: 'Somebody, most likely you, tried to open an account at Fellmark with this address. There is one already. Sign in, or have a new password sent.' },
      { kind: 'act', label: 'Sign in', href: `${publicUrl}/sign-in` },
      { kind: 'act', label: 'Choose a new password', href: `${publicUrl}/forgotten` },
    ],
  }),
});

export const newPassword = defineTemplate({
  data: z.object({ token: z.string() }),
  write: ({ token }, { publicUrl }) => ({
    subject: 'Choose a new password',
    blocks: [
      { kind: 'words', words: 'Open the link to choose a new password. It works for 20 minutes, once. Your old password works until then.' },
      { kind: 'act', label: 'Choose a new password', href: `${publicUrl}/new-password/${token}` },
      { kind: 'words', words: 'If you did not ask for this, do nothing.' },
    ],
  }),
});

export const passwordChanged = defineTemplate({
  data: z.object({}),
  write: (_data, { publicUrl }) => ({
    subject: 'Your password was changed',
    blocks: [
      { kind: 'words', words: 'The password of your account was changed just now, and every browser was signed out. If it was not you, choose a new one at once.' },
      { kind: 'act', label: 'Choose a new password', href: `${publicUrl}/forgotten` },
    ],
  }),
});

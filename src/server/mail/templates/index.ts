/** Every letter the house writes, by name. A template's data is checked when the letter is written and again when it is sent. */
import type { z } from 'astro/zod';
import { answersGathered } from './answers.ts';
import { verdict } from './bench.ts';
import { seatBought, seatRefused } from './checkout.ts';
import { helpEnded, helperInvited } from './helpers.ts';
import { notice } from './notices.ts';
import { workroomOpened } from './office.ts';
import { partsOpened } from './openings.ts';
import { questionAnswered } from './questions.ts';
import { accountExists, confirmAddress, newPassword, passwordChanged } from './people.ts';

export const TEMPLATES = {
  'account-exists': accountExists,
  'answers-gathered': answersGathered,
  'confirm-address': confirmAddress,
  'help-ended': helpEnded,
  'helper-invited': helperInvited,
  'new-password': newPassword,
  notice,
  'parts-opened': partsOpened,
  'password-changed': passwordChanged,
  'question-answered': questionAnswered,
  'seat-bought': seatBought,
  'seat-refused': seatRefused,
  verdict,
  'workroom-opened': workroomOpened,
} as const;

export type TemplateName = keyof typeof TEMPLATES;
export type TemplateData<T extends TemplateName> = z.input<(typeof TEMPLATES)[T]['data']>;

/** Kinds of notices in words, each with its flag. */
import type { ToldKind } from '#core/notices/said.ts';
import type { FlagKind } from '#islands/ui/flag-kinds.ts';

export const TOLD: Readonly<Record<ToldKind, { readonly flag: FlagKind; readonly words: string }>> = {
  notice: { flag: 'here', words: 'Notice' },
  nudge: { flag: 'here', words: 'For you' },
  opening: { flag: 'opens', words: 'Open' },
  verdict: { flag: 'on', words: 'Verdict' },
  seat: { flag: 'held', words: 'Your seat' },
  answer: { flag: 'here', words: 'Answer' },
  folder: { flag: 'here', words: 'Series folder' },
};

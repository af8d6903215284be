/** Tells a person something in her page; part of the caller's transaction. The letter that says it too is posted beside it. */
import { UniqueConstraintError } from 'sequelize';
import type { Said, ToldKind } from '#core/notices/said.ts';
import type { LetterTo } from '#server/mail/outbox.ts';
import { TEMPLATES, type TemplateName } from '#server/mail/templates/index.ts';
import { NoticeReceipt } from '#server/models/index.ts';

export interface PutUp {
  readonly userId: number;
  readonly kind: ToldKind;
  readonly seriesId: number | null;
  /** The teacher's notice it comes from; null for news of the house. */
  readonly noticeId: number | null;
  readonly said: Said;
  readonly byLetter: boolean;
  /** Nobody is told twice under one key. */
  readonly dedupeKey: string;
}

/** @returns false when she was told under the same key already. */
export async function putUp(told: PutUp): Promise<boolean> {
  try {
    await NoticeReceipt.create({ ...told });
    return true;
  } catch (error) {
    if (error instanceof UniqueConstraintError) return false;
    throw error;
  }
}

/** Puts up what `letter` says, in the same words, under the same key, also where she wants no letter (`byLetter`). For letters to people with an account. */
export async function putUpLetter<T extends TemplateName>(letter: LetterTo<T>, about: { readonly kind: ToldKind; readonly seriesId: number | null; readonly byLetter?: boolean }): Promise<boolean> {
  const { userId } = letter.to;
  if (userId === null) return false;
  return putUp({ byLetter: true, ...about, userId, noticeId: null, dedupeKey: letter.dedupeKey, said: saidIn(letter.template, letter.data) });
}

/** What a letter says without what makes it a letter. Its addresses become paths of this site. */
export function saidIn(template: TemplateName, data: unknown): Said {
  const { subject, blocks } = TEMPLATES[template].compose(data, { publicUrl: '' });
  const act = blocks.find((block) => block.kind === 'act');
  return {
    title: subject,
    from: '',
    blocks: blocks.filter((block) => block.kind !== 'act' && block.kind !== 'foot'),
    act: act === undefined ? null : { label: act.label, href: act.href },
  };
}

/** Writes a letter into the outbox; part of the caller's transaction. The worker sends it. */
import { UniqueConstraintError } from 'sequelize';
import type { ListKind } from '#core/notices/letter-kinds.ts';
import { Mail } from '#server/models/index.ts';
import type { TemplateData, TemplateName } from '#server/mail/templates/index.ts';

export interface LetterTo<T extends TemplateName> {
  readonly template: T;
  readonly data: TemplateData<T>;
  readonly to: { readonly userId: number | null; readonly name: string; readonly address: string };
  /** At most one letter with this key is ever written, e.g. `receipt:<order>`. */
  readonly dedupeKey: string;
  /** Not sent before; at once when absent. */
  readonly notBefore?: Date;
  /** After this the letter is worthless and is not sent. */
  readonly expiresAt?: Date;
  /** For letters she can leave: asked again when it is sent, so that leaving stops what waits. */
  readonly list?: { readonly workroomId: number; readonly kind: ListKind };
}

/** @returns false when a letter with the same key was there already. */
export async function postLetter<T extends TemplateName>(letter: LetterTo<T>): Promise<boolean> {
  try {
    await Mail.create({
      dedupeKey: letter.dedupeKey,
      template: letter.template,
      userId: letter.to.userId,
      toAddress: letter.to.address,
      toName: letter.to.name,
      data: letter.data,
      expiresAt: letter.expiresAt ?? null,
      listWorkroomId: letter.list?.workroomId ?? null,
      listKind: letter.list?.kind ?? null,
      runAt: letter.notBefore ?? new Date(),
    });
    return true;
  } catch (error) {
    if (error instanceof UniqueConstraintError) return false;
    throw error;
  }
}

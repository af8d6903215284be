import { Mail } from '#server/models/index.ts';
import { paged, type Paged } from './paging.ts';

export type LetterState = Mail['state'];

/** A letter as the office sees it: never its words, which may hold a link that opens something. */
export interface LetterInList {
  readonly id: number;
  readonly template: string;
  readonly toName: string;
  readonly toAddress: string;
  readonly state: LetterState;
  readonly attempts: number;
  readonly lastError: string | null;
  readonly writtenAt: Date;
  readonly sentAt: Date | null;
  readonly nextTryAt: Date;
  /** True once it would be of no use. */
  readonly tooLate: boolean;
}

/** Letters of one state, or all, newest first. */
export async function listLetters(state: LetterState | 'all', page: number, now: Date): Promise<Paged<LetterInList>> {
  const where = state === 'all' ? {} : { state };
  return paged(page, await Mail.count({ where }), async (limit, offset) => {
    const letters = await Mail.findAll({ where, order: [['id', 'DESC']], limit, offset, attributes: { exclude: ['data'] } });
    return letters.map(({ id, template, toName, toAddress, state: is, attempts, lastError, createdAt, sentAt, runAt, expiresAt }) => ({
      id, template, toName, toAddress, state: is, attempts, lastError, sentAt, writtenAt: createdAt, nextTryAt: runAt, tooLate: expiresAt !== null && expiresAt <= now,
    }));
  });
}

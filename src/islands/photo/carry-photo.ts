import { carry, reasonIn } from '#islands/uploading/carry.ts';
import type { Show, StartUpload } from './uploader.ts';

/** Small, so that a phone at the edge of its signal gets on. */
const PIECE_BYTES = 1_048_576;
const NO_ANSWER = 'The photo was not taken, and no reason came back. Send it again in a moment.';

export const carryPhoto: StartUpload = (file, { series, lesson, goesOn, begun }, events) =>
  carry(file, { endpoint: '/api/photos/pieces', pieceBytes: PIECE_BYTES, meta: { series, lesson, filename: file.name }, goesOn, noAnswer: NO_ANSWER, ...(begun !== undefined && { begun }) }, events);

/** Worth another try by itself: a server that is busy. */
const mayTryAgain = (status: number): boolean => status === 408 || status === 429 || status >= 500;

export const showOnServer: Show = async (showing) => {
  const answer = await fetch('/api/photos/show', { method: 'POST', headers: { 'Content-Type': 'application/json', Accept: 'application/json' }, body: JSON.stringify(showing) }).catch(() => null);
  if (answer === null || mayTryAgain(answer.status)) return 'later';
  return answer.ok ? 'shown' : { says: reasonIn(await answer.text().catch(() => '')) ?? NO_ANSWER };
};

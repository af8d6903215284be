/** How a video on its way stands, in words: the same on the page and in the island that watches it. */
import { sizeWords } from '#core/video/limits.ts';

export interface VideoStanding {
  readonly state: 'created' | 'uploaded' | 'probing' | 'processing' | 'ready' | 'failed';
  readonly byteCount: number;
  readonly arrivedBytes: number;
  readonly permille: number;
  readonly before: number | null;
  readonly failure: string | null;
}

export function videoWords({ state, byteCount, arrivedBytes, permille, before, failure }: VideoStanding): string {
  switch (state) {
    case 'created':
      return `${sizeWords(arrivedBytes)} of ${sizeWords(byteCount)} are here. Choose the same file again, and it goes on from there.`;
    case 'uploaded':
      return before === null || before === 0 ? 'All of it is here. It is next to be made ready.' : `All of it is here. ${before === 1 ? 'One video is' : `${before} videos are`} made ready before it.`;
    case 'probing':
      return 'All of it is here, and it is being looked at.';
    case 'processing':
      return `It is being made ready: ${Math.floor(permille / 10)}\u202f%. You can close this page.`;
    case 'ready':
      return 'Ready.';
    case 'failed':
      return failure ?? 'It could not be made ready.';
  }
}

/** Whether anything of it changes by itself. */
export function isMoving({ state }: Pick<VideoStanding, 'state'>): boolean {
  return state === 'uploaded' || state === 'probing' || state === 'processing';
}

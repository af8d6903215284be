/**
 * How much a request may carry, and how long it may take over it. The endpoint behind reads without a limit of its
 * own, so the door counts: by the declared length, and by what really arrives.
 */
import type { IncomingMessage } from 'node:http';
import type { Handler } from '#server/web/front/handler.ts';
import { pathOf } from '#server/web/front/handler.ts';
import { refuse } from '#server/web/front/refuse.ts';

const KIB = 1_024;
const MIB = 1_024 * KIB;

export interface BodyLimit {
  readonly path: RegExp;
  readonly maxBytes: number;
  /** The whole body must be here within so many seconds. */
  readonly withinSeconds: number;
}

/** The first line whose pattern fits counts. Files of people are the only large bodies; a phone in a studio may be slow. */
export const BODY_LIMITS: readonly BodyLimit[] = [
  // A form without script sends a whole showing at once; more than a part of it is then refused photo by photo, with words.
  { path: /^\/api\/photos$/, maxBytes: 151 * MIB, withinSeconds: 1_800 },
  { path: /^\/api\/(?:[a-z0-9/-]+\/)?(?:photos?|pictures?)(?:\/|$)/, maxBytes: 30 * MIB, withinSeconds: 600 },
  { path: /^\/api\/(?:[a-z0-9/-]+\/)?videos?(?:\/|$)/, maxBytes: 20 * MIB, withinSeconds: 600 },
  { path: /^\/workroom\/series\/bring-in$/, maxBytes: 501 * MIB, withinSeconds: 1_800 },
  { path: /^\/(?:sign-in|sign-up|sign-out|forgotten|new-password|confirm|prove|account)(?:\/|$)/, maxBytes: 4 * KIB, withinSeconds: 30 },
  { path: /^\/api\/reckon$/, maxBytes: 64 * KIB, withinSeconds: 30 },
  { path: /^\/api\/payments\/events$/, maxBytes: 256 * KIB, withinSeconds: 30 },
  { path: /^\//, maxBytes: MIB, withinSeconds: 30 },
];

/** Longest time any body may take, in seconds. */
export const SLOWEST_BODY_SECONDS = Math.max(...BODY_LIMITS.map((limit) => limit.withinSeconds));

/** Answers 413 to bodies over the limit of their path and 408 to bodies that do not arrive in time. */
export function limitBody(limits: readonly BodyLimit[] = BODY_LIMITS): Handler {
  return (request, response, next) => {
    const limit = limits.find((line) => line.path.test(pathOf(request)));
    if (limit === undefined || !carriesBody(request)) {
      next();
      return;
    }
    const tooLarge = (): void => { refuse(request, response, 413, `This is larger than ${sizeText(limit.maxBytes)}, the most that is taken here.`); };
    if (Number(request.headers['content-length'] ?? 0) > limit.maxBytes) {
      tooLarge();
      return;
    }
    if (request.headers.expect?.toLowerCase() === '100-continue') response.writeContinue();
    const stop = (answer: () => void): void => {
      answer();
      // Fails whoever reads the body, so that a part of it is never taken for the whole.
      const fail = (): void => { request.destroy(new Error('The body was refused.')); };
      if (response.writableFinished || response.destroyed) fail();
      else response.once('close', fail);
    };
    countBody(request, limit.maxBytes, () => { stop(tooLarge); });
    const timer = setTimeout(() => {
      if (!request.complete) stop(() => { refuse(request, response, 408, 'This took too long to arrive. Try again.'); });
    }, limit.withinSeconds * 1_000);
    timer.unref();
    request.once('close', () => { clearTimeout(timer); });
    next();
  };
}

function carriesBody(request: IncomingMessage): boolean {
  return request.headers['transfer-encoding'] !== undefined || (request.headers['content-length'] ?? '0') !== '0';
}

/** Calls `over` once when more than `maxBytes` have arrived, and lets nothing through from then on, not even the end. */
function countBody(request: IncomingMessage, maxBytes: number, over: () => void): void {
  const push = request.push.bind(request);
  let seen = 0;
  request.push = (chunk: unknown, encoding?: BufferEncoding) => {
    if (chunk instanceof Uint8Array) seen += chunk.length;
    if (seen <= maxBytes) return push(chunk, encoding);
    if (seen - (chunk instanceof Uint8Array ? chunk.length : 0) <= maxBytes) over();
    return true;
  };
}

function sizeText(bytes: number): string {
  return bytes >= MIB ? `${bytes / MIB} MB` : `${bytes / KIB} KB`;
}

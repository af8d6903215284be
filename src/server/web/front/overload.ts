/** Says no in time: an answer that cannot come soon is better refused than waited for without an end. */
import type { Handler } from '#server/web/front/handler.ts';
import { refuse } from '#server/web/front/refuse.ts';

const BUSY = 'We are busy just now. Try again in a moment.';

export interface OverloadRules {
  /** Requests worked on at once; more are turned away. */
  readonly maxInFlight: number;
  /** From the last byte of a request to the head of its answer. */
  readonly answerWithinMs: number;
}

export const OVERLOAD_RULES: OverloadRules = { maxInFlight: 400, answerWithinMs: 30_000 };

/** Answers 503 when too many requests are being worked on, or when one gets no answer in time. */
export function turnAwayOverload(rules: OverloadRules = OVERLOAD_RULES): Handler {
  let inFlight = 0;
  return (request, response, next) => {
    const turnAway = (): void => { refuse(request, response, 503, BUSY, { 'Retry-After': 5 }); };
    if (inFlight >= rules.maxInFlight) {
      turnAway();
      return;
    }
    inFlight += 1;
    let timer: NodeJS.Timeout | undefined;
    const startClock = (): void => {
      timer ??= setTimeout(turnAway, rules.answerWithinMs);
      timer.unref();
    };
    response.once('close', () => {
      inFlight -= 1;
      clearTimeout(timer);
    });
    // A request without a body never says "end" to anybody who does not read it.
    if (request.headers['transfer-encoding'] === undefined && (request.headers['content-length'] ?? '0') === '0') startClock();
    else request.once('end', startClock);
    next();
  };
}

import { createHash } from 'node:crypto';
import { ApiError } from './api-error.ts';
import type { PaymentState, SavedAnswer } from './payment-state.ts';
import type { ServiceClock } from './service-clock.ts';

const LONGEST_KEY = 255;
const KEPT_SECONDS = 24 * 60 * 60;

export interface Performed {
  readonly status: number;
  readonly body: string;
  readonly requestId: string;
  /** Whether the key is used up by this answer: not by refusals made before anything was tried. */
  readonly save: boolean;
}

export type Outcome = Performed & { readonly replayed: boolean; readonly originalRequest: string | undefined };

/**
 * A request that comes twice under one key is carried out once: the second gets the first one's answer, to the octet, for 24
 * hours. The same key with other words is refused, and so is a second request while the first is still under way.
 */
export class IdempotentRequests {
  readonly #state: PaymentState;
  readonly #clock: ServiceClock;
  readonly #underWay = new Set<string>();

  constructor(state: PaymentState, clock: ServiceClock) {
    this.#state = state;
    this.#clock = clock;
  }

  /** @param words what was asked, in one fixed writing: two requests are the same when these are. */
  async once(key: string, words: string, perform: () => Promise<Performed>): Promise<Outcome> {
    if (key.length > LONGEST_KEY) {
      throw new ApiError(400, `Idempotency keys may be at most ${LONGEST_KEY} characters long.`, { code: 'parameter_invalid', beforeTrying: true });
    }
    const fingerprint = createHash('sha256').update(words).digest('hex');
    const saved = this.#saved(key);
    if (saved) {
      if (saved.fingerprint !== fingerprint) throw differentWords(key);
      return { status: saved.status, body: saved.body, requestId: saved.requestId, save: false, replayed: true, originalRequest: saved.requestId };
    }
    if (this.#underWay.has(key)) {
      const message = `There is currently another in-progress request using this idempotent key (that probably means you submitted twice, and the other request is still going through): ${key}. Try again later.`;
      throw new ApiError(409, message, { code: 'idempotency_key_in_use', headers: { 'stripe-should-retry': 'true' }, beforeTrying: true });
    }
    this.#underWay.add(key);
    try {
      const performed = await perform();
      if (performed.save) {
        const { status, body, requestId } = performed;
        this.#state.answers.put({ id: key, fingerprint, status, body, requestId, createdAt: this.#clock.now() });
      }
      return { ...performed, replayed: false, originalRequest: undefined };
    } finally {
      this.#underWay.delete(key);
    }
  }

  #saved(key: string): SavedAnswer | undefined {
    const saved = this.#state.answers.get(key);
    if (!saved || saved.createdAt + KEPT_SECONDS > this.#clock.now()) return saved;
    this.#state.answers.remove(key);
    return undefined;
  }
}

function differentWords(key: string): ApiError {
  const message = `Keys for idempotent requests can only be used with the same endpoint and parameters they were first used with. Try using a key other than '${key}' if you meant to execute a different request.`;
  return new ApiError(400, message, { type: 'idempotency_error', beforeTrying: true });
}

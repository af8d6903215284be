import { createHmac } from 'node:crypto';
import { newId } from './ids.ts';
import type { Delivery, EventRecord, PaymentState } from './payment-state.ts';
import type { ServiceClock } from './service-clock.ts';
import { NO_FAULTS, seededChance, type WebhookFaults } from './webhook-faults.ts';

/** Waits between tries. The service spreads them over three days; a trial cannot wait that long for the first ones. */
const RETRY_SECONDS = [2, 4, 8, 15, 30, 60, 120, 300, 900, 3600, 3 * 3600, 6 * 3600, 12 * 3600, 24 * 3600, 24 * 3600];

const ANSWER_WITHIN_MS = 10_000;
const HOLD_BACK_MS = 2000;
const COPY_WITHIN_MS = 3000;
const MOST_AT_ONCE = 20;

export interface WebhookSettings {
  readonly url: string;
  /** Each signs; the newest first. */
  readonly secrets: readonly string[];
  readonly retrySeconds?: readonly number[] | undefined;
}

/**
 * Sends news to the shop until it says 2xx: signed, in no promised order, at least once. What is due survives a restart.
 */
export class WebhookSender {
  readonly #state: PaymentState;
  readonly #clock: ServiceClock;
  readonly #settings: WebhookSettings;
  readonly #underWay = new Map<string, AbortController>();
  #faults: WebhookFaults = NO_FAULTS;
  #chance = seededChance(NO_FAULTS.seed);
  #timer: NodeJS.Timeout | undefined;
  #stopped = false;

  constructor(state: PaymentState, clock: ServiceClock, settings: WebhookSettings) {
    this.#state = state;
    this.#clock = clock;
    this.#settings = settings;
  }

  get faults(): WebhookFaults {
    return this.#faults;
  }

  set faults(faults: WebhookFaults) {
    this.#faults = faults;
    this.#chance = seededChance(faults.seed);
  }

  /** How many deliveries are in which state. */
  counts(): Record<Delivery['state'], number> {
    const counts = { waiting: 0, delivered: 0, 'given-up': 0 };
    for (const delivery of this.#state.deliveries.oldestFirst()) counts[delivery.state] += 1;
    return counts;
  }

  enqueue(event: EventRecord): void {
    const { duplicate, reorder } = this.#faults;
    // Every fate is drawn for every event, so that one chance does not shift the draws of another.
    const [copied, copyWait, held, heldFor] = [this.#chance(), this.#chance(), this.#chance(), this.#chance()];
    const now = this.#clock.nowMs();
    this.#schedule(event.id, now + (held < reorder ? heldFor * HOLD_BACK_MS : 0));
    if (copied < duplicate) this.#schedule(event.id, now + copyWait * COPY_WITHIN_MS);
    this.wake();
  }

  /** Sends what is due, and sets the alarm for what comes next. */
  wake(): void {
    clearTimeout(this.#timer);
    if (this.#stopped) return;
    const waiting = this.#state.deliveries.oldestFirst().filter((delivery) => delivery.state === 'waiting' && !this.#underWay.has(delivery.id));
    const now = this.#clock.nowMs();
    for (const delivery of waiting.filter(({ dueAtMs }) => dueAtMs <= now).slice(0, MOST_AT_ONCE - this.#underWay.size)) void this.#send(delivery);
    const next = Math.min(...waiting.filter(({ dueAtMs }) => dueAtMs > now).map(({ dueAtMs }) => dueAtMs));
    if (Number.isFinite(next)) this.#timer = setTimeout(() => this.wake(), Math.min(next - now, 60_000));
  }

  /** Stops sending; what is under way is cut off and comes again after the next start. */
  stop(): void {
    this.#stopped = true;
    clearTimeout(this.#timer);
    for (const controller of this.#underWay.values()) controller.abort();
  }

  #schedule(eventId: string, dueAtMs: number): void {
    this.#state.deliveries.put({ id: newId('req'), eventId, tries: 0, dueAtMs, state: 'waiting' });
  }

  async #send(delivery: Delivery): Promise<void> {
    const controller = new AbortController();
    this.#underWay.set(delivery.id, controller);
    const { delayMs, drop } = this.#faults;
    const lost = this.#chance() < drop;
    if (delayMs > 0) await pause(delayMs, controller.signal);
    const arrived = !lost && !this.#stopped && (await this.#post(delivery.eventId, controller));
    this.#underWay.delete(delivery.id);
    if (this.#stopped) return;
    this.#state.deliveries.put(this.#after(delivery, arrived));
    this.wake();
  }

  #after(delivery: Delivery, arrived: boolean): Delivery {
    const tries = delivery.tries + 1;
    if (arrived) return { ...delivery, tries, state: 'delivered' };
    const wait = (this.#settings.retrySeconds ?? RETRY_SECONDS)[delivery.tries];
    if (wait === undefined) return { ...delivery, tries, state: 'given-up' };
    return { ...delivery, tries, dueAtMs: this.#clock.nowMs() + wait * 1000 };
  }

  async #post(eventId: string, controller: AbortController): Promise<boolean> {
    const event = this.#state.events.get(eventId);
    if (!event) return true;
    const body = JSON.stringify(event, null, 2);
    const late = setTimeout(() => controller.abort(), ANSWER_WITHIN_MS);
    try {
      const response = await fetch(this.#settings.url, {
        method: 'POST',
        headers: { 'content-type': 'application/json; charset=utf-8', 'stripe-signature': this.#signature(body), 'user-agent': 'Fellmark stand-in/1.0' },
        body,
        redirect: 'manual',
        signal: controller.signal,
      });
      await response.body?.cancel();
      return response.status >= 200 && response.status < 300;
    } catch {
      return false;
    } finally {
      clearTimeout(late);
    }
  }

  /** `t=<seconds>,v1=<hex>[,v1=<hex>]`: the time and, for each secret, the HMAC-SHA-256 of time, point and body. */
  #signature(body: string): string {
    // By the true clock: however far the stand-in was moved on, whoever listens was not.
    const time = Math.floor(Date.now() / 1000);
    const proofs = this.#settings.secrets.map((secret) => createHmac('sha256', secret).update(`${time}.${body}`, 'utf8').digest('hex'));
    return [`t=${time}`, ...proofs.map((proof) => `v1=${proof}`)].join(',');
  }
}

function pause(milliseconds: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, milliseconds);
    signal.addEventListener('abort', () => {
      clearTimeout(timer);
      resolve();
    });
  });
}

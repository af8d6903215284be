import { z } from 'astro/zod';

/**
 * Trouble between a shop and the service: `answer` refuses before anything is done · `fail-after` does it, then answers 500 ·
 * `hang-up-before` and `hang-up-after` cut the line before or after it is done · `slow` takes its time.
 */
export const ApiFault = z
  .object({
    kind: z.enum(['answer', 'fail-after', 'hang-up-before', 'hang-up-after', 'slow']),
    method: z.enum(['GET', 'POST']).optional(),
    /** Beginning of the path; any when left out. */
    path: z.string().default('/v1/'),
    times: z.number().int().min(1).max(1000).default(1),
    status: z.number().int().min(400).max(599).default(500),
    type: z.enum(['api_error', 'card_error', 'idempotency_error', 'invalid_request_error']).default('api_error'),
    code: z.string().optional(),
    delayMs: z.number().int().min(0).max(120_000).default(1000),
  })
  .strict();
export type ApiFault = z.infer<typeof ApiFault>;

export class ApiFaults {
  #waiting: ApiFault[] = [];

  get waiting(): readonly ApiFault[] {
    return this.#waiting;
  }

  set(faults: readonly ApiFault[]): void {
    this.#waiting = [...faults];
  }

  /** The fault for this request, if one waits for it; each is used up after its times. */
  take(method: string, path: string): ApiFault | undefined {
    const fault = this.#waiting.find((one) => (one.method === undefined || one.method === method) && path.startsWith(one.path));
    if (!fault) return undefined;
    this.#waiting = this.#waiting.flatMap((one) => (one !== fault ? [one] : one.times > 1 ? [{ ...one, times: one.times - 1 }] : []));
    return fault;
  }
}

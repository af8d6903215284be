/** Whether a process lives, and whether it can serve. Asked by whoever starts it or balances load, under any host name. */
import type { ServerResponse } from 'node:http';
import type { Handler } from '#server/web/front/handler.ts';
import { pathOf } from '#server/web/front/handler.ts';

/** Something the process cannot serve without. */
export interface ReadinessCheck {
  readonly name: string;
  /** What is wrong, in words without secrets, or undefined when all is well. */
  readonly fault: () => Promise<string | undefined>;
}

const SLOWEST_CHECK_MS = 500;

/** Names and faults of the checks that fail now; empty when the process can serve. */
export async function readinessFaults(checks: readonly ReadinessCheck[]): Promise<string[]> {
  const faults = await Promise.all(checks.map(async ({ name, fault }) => {
    const said = await Promise.race([fault().catch(() => 'does not answer'), afterMs(SLOWEST_CHECK_MS, 'answers too slowly')]);
    return said === undefined ? undefined : `${name} ${said}`;
  }));
  return faults.filter((fault) => fault !== undefined);
}

/**
 * `GET /healthz`: 200 while the process lives. `GET /readyz`: 200 when it can serve, else 503 with the reasons.
 * @param isStopping true from the moment the process has been asked to stop
 */
export function health(checks: readonly ReadinessCheck[], isStopping: () => boolean): Handler {
  return (request, response, next) => {
    const path = pathOf(request);
    if (path === '/healthz') {
      answer(response, 200, ['alive']);
    } else if (path === '/readyz') {
      if (isStopping()) answer(response, 503, ['stopping']);
      else void readinessFaults(checks).then((faults) => { answer(response, faults.length === 0 ? 200 : 503, faults.length === 0 ? ['ready'] : faults); });
    } else {
      next();
    }
  };
}

function answer(response: ServerResponse, status: number, lines: readonly string[]): void {
  response.writeHead(status, { 'Content-Type': 'text/plain; charset=utf-8', 'Cache-Control': 'no-store', ...(status === 503 ? { 'Retry-After': 5 } : {}) });
  response.end(`${lines.join('\n')}\n`);
}

function afterMs(ms: number, value: string): Promise<string> {
  return new Promise((resolve) => { setTimeout(resolve, ms, value).unref(); });
}

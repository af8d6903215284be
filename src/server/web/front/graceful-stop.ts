/**
 * Stopping without cutting anybody off: first say that no new work is wanted, wait until those who send work have
 * heard it, then finish what has begun.
 */
import type { Server } from 'node:http';

export interface StopTimes {
  /** How long to go on serving after readiness says no, so that a balancer sees it. */
  readonly drainMs: number;
  /** How long requests that have begun may take to finish. */
  readonly finishMs: number;
}

export interface GracefulStop {
  /** True from the first call of `stop`. */
  readonly isStopping: () => boolean;
  /** Resolves when every connection is closed; those that outlast the time are cut. Safe to call again. */
  readonly stop: () => Promise<void>;
}

/** Stops `servers` together. */
export function gracefulStop(servers: readonly Server[], times: StopTimes): GracefulStop {
  let stopping: Promise<void> | undefined;
  return {
    isStopping: () => stopping !== undefined,
    stop: () => (stopping ??= stopAll(servers, times)),
  };
}

async function stopAll(servers: readonly Server[], { drainMs, finishMs }: StopTimes): Promise<void> {
  await new Promise((resolve) => { setTimeout(resolve, drainMs); });
  await Promise.all(servers.map((server) => close(server, finishMs)));
}

async function close(server: Server, finishMs: number): Promise<void> {
  const cut = setTimeout(() => { server.closeAllConnections(); }, finishMs);
  await new Promise<void>((resolve) => {
    server.close(() => { resolve(); });
    // Connections kept alive without a request would hold the door open until they time out.
    server.closeIdleConnections();
  });
  clearTimeout(cut);
}

/**
 * What the web process cannot serve without. Asked over a connection of its own, so that the answer comes even when all
 * others are in use. Payment service and post are not among these: pages go on without them.
 */
import { statfs } from 'node:fs/promises';
import * as mariadb from 'mariadb';
import type { Config } from '#server/config.ts';
import { migrations } from '#server/db/migrations/index.ts';
import { processVideo } from '#server/jobs/definitions/videos.ts';
import type { ReadinessCheck } from '#server/web/front/readiness.ts';

const LEAST_FREE_BYTES = 200_000_000;
const LONGEST_QUEUE_SECONDS = 300;

/** The checks, with the function that closes their connection. */
export function readinessChecks({ database, uploadsFolder }: Pick<Config, 'database' | 'uploadsFolder'>): { checks: ReadinessCheck[]; close: () => Promise<void> } {
  const pool = mariadb.createPool({
    host: database.host,
    port: database.port,
    user: database.user,
    password: database.password,
    database: database.name,
    ...(database.socket === undefined ? {} : { socketPath: database.socket }),
    connectionLimit: 1,
    acquireTimeout: 450,
    connectTimeout: 450,
  });
  const ask = async (sql: string): Promise<readonly Record<string, unknown>[]> => pool.query<Record<string, unknown>[]>(sql);
  return {
    checks: [
      { name: 'database', fault: () => schemaFault(ask) },
      { name: 'queue', fault: () => queueFault(ask) },
      { name: 'disk', fault: () => diskFault(uploadsFolder) },
    ],
    close: () => pool.end(),
  };
}

type Ask = (sql: string) => Promise<readonly Record<string, unknown>[]>;

async function schemaFault(ask: Ask): Promise<string | undefined> {
  const done = new Set((await ask('SELECT name FROM schema_steps')).map((row) => row['name']));
  return migrations.every(({ name }) => done.has(name)) ? undefined : 'waits for its tables';
}

async function queueFault(ask: Ask): Promise<string | undefined> {
  // Films wait for each other as long as they last; that is no sign of a worker gone.
  const [row] = await ask(`SELECT TIMESTAMPDIFF(SECOND, MIN(run_at), UTC_TIMESTAMP(3)) AS late FROM jobs WHERE state = 'ready' AND lease_until IS NULL AND type <> '${processVideo.type}'`);
  return Number(row?.['late'] ?? 0) > LONGEST_QUEUE_SECONDS ? 'is not being worked on' : undefined;
}

async function diskFault(folder: string): Promise<string | undefined> {
  const { bavail, bsize } = await statfs(folder);
  return bavail * bsize < LEAST_FREE_BYTES ? 'is full' : undefined;
}

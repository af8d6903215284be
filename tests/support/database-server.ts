/**
 * A MariaDB server for the tests, in a folder that goes away with it. One that already runs is used instead when
 * FELLMARK_TEST_DATABASE_URL names it; its user may make databases named `fellmark_…`.
 */
import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { startDatabaseServer } from '../../scripts/setup/database-server.mjs';

/** Runs once, before any worker is started: they inherit the address. */
export async function setup(): Promise<() => Promise<void>> {
  if (process.env['FELLMARK_TEST_DATABASE_URL'] !== undefined) return () => Promise.resolve();
  const folder = await mkdtemp(path.join(os.tmpdir(), 'fellmark-test-'));
  const server = await startDatabaseServer({ folder, log: path.join(folder, 'database.log'), password: 'only-for-tests', durable: false });
  process.env['FELLMARK_TEST_DATABASE_URL'] = server.url;
  return async () => {
    await server.stop();
    await rm(folder, { recursive: true, force: true });
  };
}

/**
 * Before the tests of a worker: its own database on the running MariaDB, at the newest schema, and settings that point at it.
 * Between tests every row goes; tests open their own transactions, so none can be wrapped around them.
 */
import { createHash } from 'node:crypto';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import * as mariadb from 'mariadb';
import { afterAll, beforeAll, beforeEach } from 'vitest';
import { migrations } from '#server/db/migrations/index.ts';

const server = process.env.FELLMARK_TEST_DATABASE_URL;
if (server === undefined) throw new Error('FELLMARK_TEST_DATABASE_URL must name a MariaDB server on which databases may be made');
// A schema that was edited gets a database of its own; an old one is never half right.
const schema = createHash('sha256').update(JSON.stringify(migrations)).digest('hex').slice(0, 8);
const name = `fellmark_test_${process.env.FELLMARK_TEST_RUN ?? 'local'}_${process.env.VITEST_POOL_ID ?? '1'}_${schema}`;

Object.assign(process.env, {
  TZ: 'America/New_York',
  FELLMARK_MODE: 'test',
  FELLMARK_DEMO: 'on',
  FELLMARK_DATABASE_URL: new URL(`/${name}`, server).href,
  FELLMARK_SECRET: 'a secret of tests, forty characters long',
  FELLMARK_UPLOADS: mkdtempSync(join(tmpdir(), 'fellmark-uploads-')),
  FELLMARK_PAYMENTS_URL: 'http://127.0.0.1:9',
  FELLMARK_PAYMENTS_KEY: 'sk_test_of_tests',
  FELLMARK_PAYMENTS_WEBHOOK_SECRETS: 'whsec_of_tests',
});

beforeAll(async () => {
  const { hostname, port, username, password } = new URL(server);
  const connection = await mariadb.createConnection({ host: hostname, port: Number(port || 3306), user: decodeURIComponent(username), password: decodeURIComponent(password) });
  await connection.query(`CREATE DATABASE IF NOT EXISTS ${name}`);
  await connection.end();
  const { migrate } = await import('#server/db/migrator.ts');
  await migrate();
});

beforeEach(async () => {
  const { emptyAllTables } = await import('#server/db/empty-tables.ts');
  await emptyAllTables();
});

afterAll(async () => {
  const { sequelize } = await import('#server/db/sequelize.ts');
  await sequelize.close();
});

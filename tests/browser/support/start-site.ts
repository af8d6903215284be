/**
 * Starts the whole house by the same command a person uses, on ports and in folders of its own, and tells the tests
 * where it is: FELLMARK_TEST_URL, FELLMARK_TEST_STAND_INS, FELLMARK_TEST_PASSWORD.
 */
import { spawn } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import net from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { signEverybodyIn } from './demo-people.ts';

const root = fileURLToPath(new URL('../../..', import.meta.url));
const READY_MS = 300_000;
const PASSWORD = 'a-password-of-the-tests';

export default async function startSite(): Promise<(() => Promise<void>) | undefined> {
  if (process.env['FELLMARK_TEST_URL'] !== undefined) {
    await signEverybodyIn();
    return undefined;
  }
  const folder = await mkdtemp(path.join(os.tmpdir(), 'fellmark-site-'));
  const port = await freeBlock();
  const site = spawn(process.execPath, ['scripts/start.mjs'], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'inherit'],
    env: {
      ...process.env,
      FELLMARK_PORT: String(port),
      FELLMARK_DATA: path.join(folder, 'data'),
      FELLMARK_UPLOADS: path.join(folder, 'uploads'),
      FELLMARK_DEMO: 'on',
      FELLMARK_DEMO_PASSWORD: PASSWORD,
    },
  });
  const ended = new Promise<number | null>((resolve) => { site.once('exit', resolve); });
  let said = '';
  const address = await new Promise<string>((resolve, reject) => {
    const timer = setTimeout(() => { reject(new Error(`The site was not ready in time:\n${said}`)); }, READY_MS);
    site.stdout.on('data', (words: Buffer) => {
      said += words.toString();
      const ready = /^ready (\S+)$/m.exec(said)?.[1];
      if (ready === undefined) return;
      clearTimeout(timer);
      resolve(ready);
    });
    void ended.then(() => { reject(new Error(`The site did not start:\n${said}`)); });
  });
  Object.assign(process.env, {
    FELLMARK_TEST_URL: address,
    FELLMARK_TEST_STAND_INS: `http://127.0.0.1:${port + 1}`,
    FELLMARK_TEST_PASSWORD: PASSWORD,
  });
  await signEverybodyIn();
  return async () => {
    site.kill('SIGTERM');
    await ended;
    await rm(folder, { recursive: true, force: true });
  };
}

/** A port that is free with the three after it. */
async function freeBlock(): Promise<number> {
  for (;;) {
    const port = 20_000 + Math.floor(Math.random() * 10_000);
    const free = await Promise.all([0, 1, 2, 3].map((step) => isFree(port + step)));
    if (free.every(Boolean)) return port;
  }
}

function isFree(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => { resolve(false); });
    server.listen(port, '127.0.0.1', () => { server.close(() => { resolve(true); }); });
  });
}

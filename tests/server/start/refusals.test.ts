/** `npm start` on a machine or with settings that cannot work: one sentence that says what to do, and exit code 1. */
import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { claimFolder, secretsOf } from '../../../scripts/setup/data-folder.mjs';

const root = new URL('../../..', import.meta.url).pathname;
let folder = '';
beforeEach(() => { folder = mkdtempSync(path.join(os.tmpdir(), 'fellmark-start-')); });
afterEach(() => { rmSync(folder, { recursive: true, force: true }); });

function start(settings: Readonly<Record<string, string>>): Promise<{ code: number | null; said: string }> {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, ['scripts/start.mjs'], {
      cwd: root,
      env: { PATH: process.env['PATH'], FELLMARK_DATA: path.join(folder, 'data'), FELLMARK_UPLOADS: path.join(folder, 'uploads'), ...settings },
    });
    let said = '';
    for (const stream of [child.stdout, child.stderr]) stream.on('data', (words: Buffer) => { said += words.toString(); });
    child.once('close', (code) => { resolve({ code, said }); });
  });
}

describe('a start that cannot work', () => {
  test.each([
    [{ FELLMARK_PORT: 'four' }, 'FELLMARK_PORT must be a whole number from 1 to 65000, not "four".'],
    [{ FELLMARK_PORT: '65001' }, 'FELLMARK_PORT must be a whole number'],
    [{ FELLMARK_DEMO: 'yes' }, 'FELLMARK_DEMO must be on or off, not "yes".'],
    [{ FELLMARK_DEMO_PASSWORD: 'short' }, 'FELLMARK_DEMO_PASSWORD must be at least 12 characters long.'],
    [{ FELLMARK_SECOND_FACTOR: 'never' }, 'FELLMARK_SECOND_FACTOR must be offered or required'],
    [{ FELLMARK_PUBLIC_URL: 'loom.example' }, 'FELLMARK_PUBLIC_URL must be an address'],
    [{ FELLMARK_PUBLIC_URL: 'http://loom.example' }, 'must begin with https'],
    [{ FELLMARK_DEMO: 'off' }, 'these settings must be given: FELLMARK_PAYMENTS_KEY, FELLMARK_PAYMENTS_WEBHOOK_SECRETS, FELLMARK_SMTP_URL'],
    [{ FELLMARK_DATA: '/proc/fellmark' }, 'FELLMARK_DATA: the folder /proc/fellmark cannot be made or written to'],
  ])('with %o says so', async (settings, sentence) => {
    const { code, said } = await start(settings);
    expect(said).toContain(sentence);
    expect(said).not.toMatch(/^\s+at /m);
    expect(code).toBe(1);
  });

  test('because its port is taken names the port, and leaves the data folder free', async () => {
    const taken = createServer();
    await new Promise<void>((resolve) => { taken.listen(0, '127.0.0.1', resolve); });
    const address = taken.address();
    const port = typeof address === 'object' && address !== null ? address.port : 0;
    const { code, said } = await start({ FELLMARK_PORT: String(port) });
    taken.close();
    expect(said).toContain(`Port ${port}, wanted for the web, is taken by another program.`);
    expect(code).toBe(1);
    expect(() => { claimFolder(path.join(folder, 'data'))(); }).not.toThrow();
  });
});

describe('a data folder', () => {
  test('serves one start at a time, and is free again afterwards', () => {
    const giveBack = claimFolder(folder);
    expect(() => claimFolder(folder)).toThrow(`in use by another start (process ${process.pid})`);
    giveBack();
    claimFolder(folder)();
  });

  test('left behind by a start that was killed is taken over', () => {
    writeFileSync(path.join(folder, 'in-use-by'), `${process.pid} of another birth`);
    expect(() => { claimFolder(folder)(); }).not.toThrow();
  });

  test('keeps its secrets from one start to the next', () => {
    const first = secretsOf(folder);
    first.save({ demoPassword: 'willow-shuttle-42' });
    const { save: _saveFirst, ...known } = first;
    const { save: _saveAgain, ...again } = secretsOf(folder);
    expect(again).toEqual(known);
  });
});

import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdtemp, readFile, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { runTool } from '#server/media/video/run-tool.ts';

const ENDLESS = ['-v', 'error', '-y', '-f', 'lavfi', '-i', 'testsrc=s=640x360:r=30', '-f', 'rawvideo', 'endless.raw'];
let folder = '';
beforeEach(async () => { folder = await mkdtemp(join(tmpdir(), 'fellmark-tool-')); });
afterEach(() => rm(folder, { recursive: true }));

test('a tool ends by the clock', async () => {
  expect(await runTool('ffmpeg', ENDLESS, { folder, seconds: 1, maxFileBytes: 1e10 })).toEqual({ ended: 'late' });
});

test('a tool writes no file larger than it may', async () => {
  expect(await runTool('ffmpeg', ENDLESS, { folder, seconds: 60, maxFileBytes: 5_000_000 })).toMatchObject({ ended: 'badly' });
  expect((await stat(join(folder, 'endless.raw'))).size).toBeLessThanOrEqual(5_000_000);
});

test('a tool dies with the worker that started it, even when that is killed', async () => {
  const tool = join(process.cwd(), 'src/server/media/video/run-tool.ts');
  const script = `import { runTool } from ${JSON.stringify(tool)}; await runTool('ffmpeg', ${JSON.stringify([...ENDLESS.slice(0, -3), '-f', 'null', '-progress', join(folder, 'lives'), '-stats_period', '0.2', '-'])}, { folder: ${JSON.stringify(folder)}, seconds: 100, maxFileBytes: 1e6 });`;
  const worker = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', script], { stdio: 'ignore' });
  await expect.poll(() => existsSync(join(folder, 'lives')), { timeout: 30_000 }).toBe(true);
  const children = async (): Promise<string> => readFile(`/proc/${String(worker.pid)}/task/${String(worker.pid)}/children`, 'utf8').catch(() => '');
  const pids = (await children()).trim().split(' ');
  const tools = pids.filter((pid) => existsSync(`/proc/${pid}/comm`));
  expect(tools.length).toBeGreaterThan(0);
  worker.kill('SIGKILL');
  await expect.poll(async () => {
    const names = await Promise.all(tools.map((pid) => readFile(`/proc/${pid}/comm`, 'utf8').catch(() => '')));
    return names.some((name) => name.startsWith('ffmpeg'));
  }, { timeout: 10_000 }).toBe(false);
});

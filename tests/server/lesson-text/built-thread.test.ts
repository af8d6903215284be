// The threads in a built program: bundled as processes are, into a folder laid out like dist.
import { execFile } from 'node:child_process';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { build } from 'esbuild';
import { afterAll, beforeAll, expect, test } from 'vitest';

const root = fileURLToPath(new URL('../../..', import.meta.url));
let folder = '';

beforeAll(async () => {
  // Inside node_modules, so that packages are found from there as they are from dist.
  folder = await mkdtemp(join(root, 'node_modules', '.trial-'));
  await mkdir(join(folder, 'dist/server/chunks'), { recursive: true });
  const program = join(folder, 'program.ts');
  await writeFile(program, `import { readLessonText } from '${root}/src/server/lesson-text/parse-pool.ts';\nconsole.log(JSON.stringify(await readLessonText('## Wind')));\n`);
  const options = { bundle: true, packages: 'external', platform: 'node', format: 'esm', target: 'node20', logLevel: 'error' } as const;
  await build({ ...options, entryPoints: [join(root, 'src/processes/lesson-text-worker.ts')], outfile: join(folder, 'dist/processes/lesson-text-worker.mjs') });
  await build({ ...options, entryPoints: [program], outfile: join(folder, 'dist/processes/program.mjs') });
  await build({ ...options, entryPoints: [program], outfile: join(folder, 'dist/server/chunks/program.mjs') });
});

afterAll(() => rm(folder, { recursive: true, force: true }));

test.each(['dist/processes/program.mjs', 'dist/server/chunks/program.mjs'])('%s reads a lesson in a thread, and ends by itself', async (file) => {
  const { stdout } = await promisify(execFile)(process.execPath, [join(folder, file)], { timeout: 20_000 });
  expect(JSON.parse(stdout)).toMatchObject({ ok: true, outline: [{ words: 'Wind' }] });
}, 30_000);

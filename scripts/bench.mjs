// @ts-check
/**
 * `npm run bench`: how long drawing and reckoning take. A bench whose name ends in `, under 5 ms` fails over that. What
 * counts is the quickest of its runs, as whatever else the machine does can only make one slower; the middle one is shown.
 * `npm run bench -- tests/bench/plan.bench.ts` runs one file.
 */
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { runToEnd } from './setup/children.mjs';
import { say, tail } from './setup/say.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const report = path.join(root, 'test-results', 'bench.json');

/** @typedef {{ name: string, min: number, median: number }} Bench times in milliseconds */
/** @typedef {{ files: { groups: { fullName: string, benchmarks: Bench[] }[] }[] }} Report */

/** The limit a bench sets itself, in milliseconds. @param {string} name */
function limitOf(name) {
  const found = /, under ([\d.]+) ms$/u.exec(name)?.[1];
  return found === undefined ? Number.POSITIVE_INFINITY : Number(found);
}

const ms = (/** @type {number} */ time) => `${time.toFixed(time < 10 ? 3 : 1).padStart(9)} ms`;

mkdirSync(path.dirname(report), { recursive: true });
rmSync(report, { force: true });
const { ok, output } = await runToEnd([
  process.execPath, 'node_modules/vitest/vitest.mjs', 'bench', '--run', '--config', 'tests/vitest.config.ts', '--project', 'unit', `--outputJson=${report}`,
  ...process.argv.slice(2),
], { cwd: root });
if (!ok) say(tail(output, 40));

/** @type {Report} */
const { files } = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : { files: [] };
let missed = ok ? 0 : 1;
for (const { fullName, benchmarks } of files.flatMap(({ groups }) => groups)) {
  say(fullName);
  for (const { name, min, median } of benchmarks) {
    const over = min >= limitOf(name);
    if (over) missed += 1;
    say(`${over ? '  MISSED' : '        '}${ms(min)}${ms(median)}  ${name}`);
  }
}
say(missed === 0 ? 'Every limit is kept.' : 'A limit is missed, or a bench could not run.');
process.exitCode = missed === 0 ? 0 : 1;

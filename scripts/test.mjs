// @ts-check
/**
 * Everything a change must pass: `npm test`. Brings what it needs, as `npm start` does, and Chromium besides.
 * `npm test -- lint unit` runs only the stages named. The last line is the sum of all stages.
 */
import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { installPackages, missingPackages, NEEDED_TO_TEST } from './setup/debian-packages.mjs';
import { installNodePackages, packagesAreStale, requireNodeVersion } from './setup/node-packages.mjs';
import { Refusal, say, step } from './setup/say.mjs';
import { buildIsStale, buildSite } from './setup/site-build.mjs';
import { checkStage, playwrightStage, vitestStage } from './setup/test-stage.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const results = path.join(root, 'test-results');

const stages = {
  imports: checkStage(['scripts/check-imports.mjs']),
  types: checkStage(['node_modules/astro/astro.js', 'check', '--minimumSeverity', 'error']),
  lint: checkStage(['node_modules/eslint/bin/eslint.js', '.']),
  unit: vitestStage('tests/vitest.config.ts', 'unit'),
  islands: vitestStage('tests/vitest.config.ts', 'islands'),
  edge: vitestStage('tests/vitest.config.ts', 'edge'),
  astro: vitestStage('tests/astro/vitest.config.ts'),
  server: vitestStage('tests/vitest.config.ts', 'server'),
  build: async () => {
    if (buildIsStale(root)) await buildSite(root);
    return { passed: 1, failed: 0, output: '' };
  },
  browser: playwrightStage('tests/browser/playwright.config.ts'),
};

/** Two cores: what is in different lanes runs side by side, and lanes of one row wait for the row before. */
const ROWS = /** @type {const} */ ([
  [['imports', 'types', 'lint', 'edge', 'astro'], ['build', 'unit', 'islands', 'server']],
  [['browser']],
]);

const sum = { passed: 0, failed: 0 };

/** @param {keyof typeof stages} name */
async function run(name) {
  const start = performance.now();
  const result = await stages[name]({ root, results, name }).catch((/** @type {unknown} */ error) => ({
    passed: 0, failed: 1, output: error instanceof Error ? error.message : String(error),
  }));
  sum.passed += result.passed;
  sum.failed += result.failed;
  const took = `${((performance.now() - start) / 1_000).toFixed(1).padStart(6)} s`;
  say(`  ${name.padEnd(10)} ${String(result.passed).padStart(5)} passed ${String(result.failed).padStart(4)} failed ${took}`);
  if (result.failed > 0) say(result.output);
}

async function main() {
  const asked = process.argv.slice(2);
  const unknown = asked.filter((name) => !Object.hasOwn(stages, name));
  if (unknown.length > 0) throw new Refusal(`There is no stage ${unknown.join(', ')}; there are ${Object.keys(stages).join(', ')}.`);
  requireNodeVersion(root);
  const missing = missingPackages(NEEDED_TO_TEST);
  if (missing.length > 0) await step(`Debian packages: ${missing.join(', ')}`, () => installPackages(missing));
  if (packagesAreStale(root)) await step('Node packages', () => installNodePackages(root));
  rmSync(results, { recursive: true, force: true });
  mkdirSync(results, { recursive: true });
  for (const row of ROWS) {
    await Promise.all(row.map(async (lane) => {
      for (const name of lane) if (asked.length === 0 || asked.includes(name)) await run(name);
    }));
  }
}

try {
  await main();
} catch (error) {
  sum.failed += 1;
  say(error instanceof Refusal ? error.message : error instanceof Error ? error.stack ?? error.message : String(error));
}
say(`${sum.passed} passed, ${sum.failed} failed`);
process.exitCode = sum.failed === 0 ? 0 : 1;

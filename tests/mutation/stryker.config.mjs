// @ts-check
/**
 * Changes every line of the craft's arithmetic in turn and runs the tests that touch it: a change no test notices survives.
 * `npm run mutate` tries all, `npm run mutate -- -m 'src/core/craft/*.ts'` some. What was found before is kept in
 * `.cache/mutation`, and only what changed since is tried again (`--force` tries all).
 *
 * Not tried: other words in a text (StringLiteral), most of which are for people; and what runs once at import (static
 * mutants, such as tables of constants). Neither is a branch or a formula.
 *
 * @type {import('@stryker-mutator/api/core').PartialStrykerOptions}
 */
export default {
  testRunner: 'in-process',
  plugins: ['./tests/mutation/runner.mjs'],
  buildCommand: 'node tests/mutation/bundle.mjs',
  mutate: ['src/core/craft/**/*.ts'],
  mutator: { excludedMutations: ['StringLiteral'] },
  coverageAnalysis: 'perTest',
  ignoreStatic: true,
  concurrency: 1,
  timeoutMS: 20_000,
  incremental: true,
  incrementalFile: '.cache/mutation/known.json',
  tempDirName: '.cache/mutation/sandbox',
  ignorePatterns: ['.*', 'dist', 'uploads', 'public', 'docker', 'scripts', 'test-results', 'coverage', 'tests/{browser,server,islands,astro,bench}'],
  reporters: ['progress-append-only', 'clear-text', 'json'],
  clearTextReporter: { reportTests: false, allowColor: false, logTests: false },
  jsonReporter: { fileName: '.cache/mutation/report.json' },
  thresholds: { high: 90, low: 85, break: 85 },
};

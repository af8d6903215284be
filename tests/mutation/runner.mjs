// @ts-check
/**
 * Runs the bundled tests of the craft in one process, over and over, one change of the source switched on at a time.
 * Starting Vitest anew for each of ten thousand changes takes hours; this takes minutes, and the core, being pure, keeps
 * nothing from one test to the next.
 */
import { readdirSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { INSTRUMENTER_CONSTANTS } from '@stryker-mutator/api/core';
import { declareClassPlugin, PluginKind } from '@stryker-mutator/api/plugin';
import { determineHitLimitReached, DryRunStatus, TestStatus, toMutantRunResult } from '@stryker-mutator/api/test-runner';

/** @typedef {import('@stryker-mutator/api/test-runner').TestResult} TestResult */
/** @typedef {{ readonly id: string, readonly run: () => unknown }} CollectedTest */

/**
 * What the changed sources read and write: which change is on, which test ran through which.
 * @type {{ activeMutant?: string | undefined, currentTestId?: string | undefined, hitCount?: number | undefined, hitLimit?: number | undefined, mutantCoverage?: import('@stryker-mutator/api/core').MutantCoverage }}
 */
const switches = (/** @type {any} */ (globalThis))[INSTRUMENTER_CONSTANTS.NAMESPACE] ??= {};

const imported = (/** @type {string} */ file) => import(pathToFileURL(path.resolve(file)).href);

class InProcessRunner {
  /** @type {[]} */
  static inject = [];
  /** @type {readonly CollectedTest[]} */
  #tests = [];

  /** Nothing has to be read anew: what runs at import is not tried (`ignoreStatic`), and the rest keeps nothing. */
  capabilities() {
    return { reloadEnvironment: true };
  }

  async init() {
    process.env.TZ = 'America/New_York';
    process.env.FELLMARK_TEST_CASES = '0.05';
    const { beginFile, collected } = await imported('tests/mutation/collect.mjs');
    const files = readdirSync('tests', { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.test.mjs')).sort();
    for (const file of files) {
      beginFile(`tests/${file.replace(/mjs$/u, 'ts')}`);
      await imported(`tests/${file}`);
    }
    this.#tests = collected;
  }

  /** @returns {Promise<import('@stryker-mutator/api/test-runner').CompleteDryRunResult>} */
  async dryRun() {
    const tests = await this.#run(this.#tests, false);
    const took = new Map(tests.map(({ id, timeSpentMs }) => [id, timeSpentMs]));
    // The quickest first: most changes are noticed by a short example.
    this.#tests = this.#tests.toSorted((a, b) => (took.get(a.id) ?? 0) - (took.get(b.id) ?? 0));
    const { mutantCoverage = { static: {}, perTest: {} } } = switches;
    return { status: DryRunStatus.Complete, tests, mutantCoverage };
  }

  /** @param {import('@stryker-mutator/api/test-runner').MutantRunOptions} options */
  async mutantRun({ activeMutant, testFilter, hitLimit, disableBail }) {
    const wanted = testFilter && new Set(testFilter);
    switches.activeMutant = activeMutant.id;
    switches.hitCount = hitLimit === undefined ? undefined : 0;
    switches.hitLimit = hitLimit;
    const tests = await this.#run(wanted ? this.#tests.filter(({ id }) => wanted.has(id)) : this.#tests, !disableBail);
    switches.activeMutant = undefined;
    this.#firstNext(tests.find(({ status }) => status === TestStatus.Failed));
    return toMutantRunResult(determineHitLimitReached(switches.hitCount, hitLimit) ?? { status: DryRunStatus.Complete, tests });
  }

  /** What noticed one change most likely notices the next one, which is made close by. @param {TestResult | undefined} killer */
  #firstNext(killer) {
    const test = this.#tests.find(({ id }) => id === killer?.id);
    if (test !== undefined) this.#tests = [test, ...this.#tests.filter((other) => other !== test)];
  }

  /** @param {readonly CollectedTest[]} tests @param {boolean} bail ends at the first that fails @returns {Promise<TestResult[]>} */
  async #run(tests, bail) {
    /** @type {TestResult[]} */
    const results = [];
    for (const { id, run } of tests) {
      const began = performance.now();
      const told = () => ({ id, name: id, timeSpentMs: performance.now() - began });
      switches.currentTestId = id;
      try {
        await run();
        results.push({ ...told(), status: TestStatus.Success });
      } catch (error) {
        results.push({ ...told(), status: TestStatus.Failed, failureMessage: error instanceof Error ? error.message : String(error) });
        if (bail) break;
      }
      switches.currentTestId = undefined;
    }
    return results;
  }
}

export const strykerPlugins = [declareClassPlugin(PluginKind.TestRunner, 'in-process', InProcessRunner)];

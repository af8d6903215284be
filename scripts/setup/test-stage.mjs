// @ts-check
/** The kinds of stages of `npm test`: each runs a command and says how many checks passed and failed. */
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { runToEnd } from './children.mjs';
import { tail } from './say.mjs';

const SHOWN_LINES = 120;

/**
 * @typedef {object} Result
 * @property {number} passed
 * @property {number} failed
 * @property {string} output what to show when something failed
 *
 * @typedef {(where: { root: string, results: string, name: string }) => Promise<Result>} Stage
 */

/** A command that is one check, told by its exit code. @param {readonly string[]} args @returns {Stage} */
export function checkStage(args) {
  return async (where) => {
    const { ok, output } = await node(where, args);
    return { passed: ok ? 1 : 0, failed: ok ? 0 : 1, output };
  };
}

/** Vitest with one config, or one project of it. @param {string} config @param {string} [project] @returns {Stage} */
export function vitestStage(config, project) {
  return async (where) => {
    const report = path.join(where.results, `${where.name}.json`);
    const { ok, output } = await node(where, [
      'node_modules/vitest/vitest.mjs', 'run', '--config', config, ...project === undefined ? [] : ['--project', project],
      '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, '--passWithNoTests', '--silent=passed-only',
    ]);
    if (!existsSync(report)) return { passed: 0, failed: ok ? 0 : 1, output };
    const { numPassedTests, numFailedTests, testResults } = JSON.parse(readFileSync(report, 'utf8'));
    // A file that could not even be read holds no failed test of its own.
    const unread = testResults.filter((/** @type {{ status: string, assertionResults: unknown[] }} */ file) => file.status === 'failed' && file.assertionResults.length === 0).length;
    return counted(ok, numPassedTests, numFailedTests + unread, output);
  };
}

/** Playwright's own runner. @param {string} config @returns {Stage} */
export function playwrightStage(config) {
  return async (where) => {
    const report = path.join(where.results, `${where.name}.json`);
    const { ok, output } = await node(where, ['node_modules/playwright/cli.js', 'test', '--config', config, '--pass-with-no-tests'], { FELLMARK_TEST_REPORT: report });
    if (!existsSync(report)) return { passed: 0, failed: ok ? 0 : 1, output };
    const { stats, errors } = JSON.parse(readFileSync(report, 'utf8'));
    return counted(ok, stats.expected, stats.unexpected + stats.flaky + errors.length, output);
  };
}

/** A runner that ended badly without a failed test has failed all the same. @param {boolean} ok @param {number} passed @param {number} failed @param {string} output @returns {Result} */
function counted(ok, passed, failed, output) {
  return { passed, failed: ok ? failed : Math.max(failed, 1), output };
}

/** @param {{ root: string, results: string, name: string }} where @param {readonly string[]} args @param {NodeJS.ProcessEnv} [env] */
async function node({ root, results, name }, args, env = {}) {
  const done = await runToEnd([process.execPath, ...args], { cwd: root, env: { ...process.env, NO_COLOR: '1', ASTRO_TELEMETRY_DISABLED: '1', ...env } });
  const log = path.join(results, `${name}.log`);
  writeFileSync(log, done.output);
  return { ok: done.ok, output: `${tail(done.output, SHOWN_LINES)}\n    All of it: ${log}` };
}

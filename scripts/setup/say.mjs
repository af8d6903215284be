// @ts-check
/** What the scripts tell the person at the terminal: a line a step, with seconds. */
import { existsSync, readFileSync } from 'node:fs';

const LONGEST_LINE = 300;

/** Something the person can put right; its message is all she needs to see. */
export class Refusal extends Error {}

/** @param {string} text */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/**
 * Does a step and says how long it took.
 * @template T
 * @param {string} name
 * @param {() => T | Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(name, work) {
  const start = performance.now();
  const onScreen = process.stdout.isTTY;
  if (onScreen) process.stdout.write(`  ${name} …`);
  try {
    const result = await work();
    process.stdout.write(`${onScreen ? '\r' : ''}  ${name.padEnd(44)} ${seconds(start)}\n`);
    return result;
  } catch (error) {
    if (onScreen) process.stdout.write('\n');
    throw error;
  }
}

/** @param {number} start of performance.now() */
export function seconds(start) {
  return `${((performance.now() - start) / 1_000).toFixed(1).padStart(6)} s`;
}

/** The end of a log. @param {string} file @param {number} [count] */
export function lastLines(file, count = 20) {
  return existsSync(file) ? tail(readFileSync(file, 'utf8'), count) : '';
}

/** The last lines of a text, set in. @param {string} text @param {number} [count] */
export function tail(text, count = 20) {
  return text.trimEnd().split('\n').slice(-count).map((line) => `    ${line.slice(0, LONGEST_LINE)}`).join('\n');
}

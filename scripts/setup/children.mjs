// @ts-check
/** Processes of ours: started, watched, ended in order. */
import { spawn } from 'node:child_process';
import { closeSync, existsSync, openSync, renameSync } from 'node:fs';
import { lastLines } from './say.mjs';

const STOP_SECONDS = 40;
const KEPT_OUTPUT = 200_000;
const SETPRIV = '/usr/bin/setpriv';

/**
 * A command line that is sent SIGTERM when this process dies, however it dies. Without `setpriv` (not Linux) it is
 * started as it is.
 * @param {readonly string[]} command
 * @returns {[string, ...string[]]}
 */
export function withParent(command) {
  const [program = '', ...args] = command;
  return existsSync(SETPRIV) ? [SETPRIV, '--pdeathsig', 'TERM', program, ...args] : [program, ...args];
}

/**
 * Runs a command to its end.
 * @param {readonly string[]} command
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv }} [options]
 * @returns {Promise<{ ok: boolean, output: string }>} whether it ended well, and the last of what it said
 */
export function runToEnd(command, { cwd, env } = {}) {
  return new Promise((resolve) => {
    const [program, ...args] = withParent(command);
    const child = spawn(program, args, { stdio: ['ignore', 'pipe', 'pipe'], env: env ?? process.env, ...cwd === undefined ? {} : { cwd } });
    let output = '';
    const keep = (/** @type {Buffer} */ words) => { output = (output + words.toString()).slice(-KEPT_OUTPUT); };
    child.stdout.on('data', keep);
    child.stderr.on('data', keep);
    child.once('error', (error) => { resolve({ ok: false, output: error.message }); });
    child.once('close', (code) => { resolve({ ok: code === 0, output }); });
  });
}

/**
 * @typedef {object} Child
 * @property {string} name for the person: "The web server"
 * @property {string} log
 * @property {import('node:child_process').ChildProcess} process
 */

/** The children of this start, and what is done when one of them ends by itself. */
export class Children {
  /** @type {Child[]} */
  #children = [];
  #ending = false;
  /** @param {(sentence: string) => void} onLoss told once, when the first child ends by itself */
  constructor(onLoss) {
    this.onLoss = onLoss;
  }

  /**
   * Starts a process; its words go to `log`.
   * @param {{ name: string, log: string, command: readonly string[], env: NodeJS.ProcessEnv, cwd?: string }} options
   * @returns {Child}
   */
  start({ name, log, command, env, cwd }) {
    if (existsSync(log)) renameSync(log, `${log}.1`);
    const output = openSync(log, 'a', 0o600);
    const [program, ...args] = withParent(command);
    // A group of its own: Ctrl-C reaches this process only, which then ends the others in order.
    const child = spawn(program, args, { stdio: ['ignore', output, output], detached: true, env, ...cwd === undefined ? {} : { cwd } });
    closeSync(output);
    return this.watch({ name, log, process: child });
  }

  /** Watches a process that somebody else started. @param {Child} child @returns {Child} */
  watch(child) {
    this.#children.push(child);
    child.process.once('error', (error) => { this.#lost(child, error.message); });
    child.process.once('exit', (code, signal) => { this.#lost(child, signal === null ? `exit code ${code}` : signal); });
    return child;
  }

  /** @param {Child} child @param {string} how */
  #lost(child, how) {
    if (this.#ending) return;
    this.#ending = true;
    const lines = lastLines(child.log);
    this.onLoss(`${child.name} ended by itself (${how}).${lines === '' ? '' : ` Its last lines:\n${lines}`}\n  All of them: ${child.log}`);
  }

  /** Ends all children, the one started last first. @returns {Promise<void>} */
  async stopAll() {
    this.#ending = true;
    for (const child of this.#children.toReversed()) await stopProcess(child.process, STOP_SECONDS);
  }

  /** Ends them at once. */
  killAll() {
    this.#ending = true;
    for (const child of this.#children) child.process.kill('SIGKILL');
  }
}

/** @param {import('node:child_process').ChildProcess} child @param {number} withinSeconds @returns {Promise<void>} */
export async function stopProcess(child, withinSeconds) {
  if (child.exitCode !== null || child.signalCode !== null || child.pid === undefined) return;
  const ended = new Promise((resolve) => { child.once('exit', resolve); });
  child.kill('SIGTERM');
  const timer = setTimeout(() => { child.kill('SIGKILL'); }, withinSeconds * 1_000);
  await ended;
  clearTimeout(timer);
}

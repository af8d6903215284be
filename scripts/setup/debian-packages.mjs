// @ts-check
/** Programs that come from Debian: installed when missing, where that may be done. */
import { spawnSync } from 'node:child_process';
import { accessSync, constants } from 'node:fs';
import { runToEnd } from './children.mjs';
import { Refusal, tail } from './say.mjs';

const FOLDERS = [...(process.env.PATH ?? '').split(':'), '/usr/local/sbin', '/usr/sbin', '/sbin'];

/** Debian package by the program that shows its presence. The database's core packages bring no service of their own. */
export const NEEDED_TO_RUN = { 'mariadbd': 'mariadb-server-core', 'my_print_defaults': 'mariadb-client-core', 'ffmpeg': 'ffmpeg' };
export const NEEDED_TO_TEST = { ...NEEDED_TO_RUN, chromium: 'chromium' };

/** @param {Readonly<Record<string, string>>} needed @returns {string[]} packages whose program is missing */
export function missingPackages(needed) {
  return Object.entries(needed).filter(([program]) => !FOLDERS.some((folder) => isProgram(`${folder}/${program}`))).map(([, name]) => name);
}

/** @param {string} file */
function isProgram(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/**
 * Installs `packages` as root or by sudo without a password.
 * @param {readonly string[]} packages
 */
export async function installPackages(packages) {
  const line = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(' ')}`;
  const asRoot = process.getuid?.() === 0;
  const byHand = `These Debian packages are missing: ${packages.join(', ')}. Run this line as root, then start again:\n  ${line}`;
  if (spawnSync('apt-get', ['--version']).status !== 0) throw new Refusal(`${byHand}\n(There is no apt-get here; another system has them under its own names.)`);
  if (!asRoot && spawnSync('sudo', ['-n', 'true']).status !== 0) throw new Refusal(byHand.replace(line, `sudo sh -c '${line}'`));
  const shell = ['sh', '-c', `export DEBIAN_FRONTEND=noninteractive; ${line}`];
  const done = await runToEnd(asRoot ? shell : ['sudo', '-n', ...shell]);
  if (!done.ok) throw new Refusal(`Installing ${packages.join(', ')} did not work. Its last lines:\n${tail(done.output, 8)}\nWhat was run:\n  ${line}`);
}

// @ts-check
/** The packages of package-lock.json, installed when what lies in node_modules is not what the lock says. */
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { runToEnd } from './children.mjs';
import { Refusal, tail } from './say.mjs';

/** Node refuses syntax and the site refuses to build below this. @param {string} root */
export function requireNodeVersion(root) {
  const { engines } = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8'));
  const wanted = /(\d+)\.(\d+)/.exec(engines.node);
  const here = /^(\d+)\.(\d+)/.exec(process.versions.node);
  const [major, minor] = [Number(wanted?.[1]), Number(wanted?.[2])];
  const [hereMajor, hereMinor] = [Number(here?.[1]), Number(here?.[2])];
  if (hereMajor > major || (hereMajor === major && hereMinor >= minor)) return;
  throw new Refusal(`Fellmark needs Node.js ${engines.node}; this is ${process.versions.node}.`);
}

/** @param {string} root @returns {boolean} whether node_modules differs from the lock */
export function packagesAreStale(root) {
  const laid = path.join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(laid)) return true;
  const wanted = JSON.parse(readFileSync(path.join(root, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(readFileSync(laid, 'utf8')).packages;
  return Object.entries(wanted).some(([place, { version, optional }]) => {
    // Optional ones are for other systems; the root is the project itself.
    if (place === '' || optional === true) return false;
    return present[place]?.version !== version;
  });
}

/** @param {string} root */
export async function installNodePackages(root) {
  const done = await runToEnd(['npm', 'ci', '--no-audit', '--no-fund', '--loglevel=error'], { cwd: root, env: { ...process.env, NODE_ENV: 'development' } });
  if (!done.ok) throw new Refusal(`npm ci did not work. Its last lines:\n${tail(done.output, 8)}`);
}

// @ts-check
/** The build, made again only when something it is made of has changed. */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { runToEnd } from './children.mjs';
import { Refusal, tail } from './say.mjs';

const MADE_OF = [
  'src', 'content', 'public', 'scripts/build-processes.mjs', 'scripts/precompress.mjs',
  'astro.config.mjs', 'tailwind.config.mjs', 'tsconfig.json', 'package.json', 'package-lock.json',
];
const MARK = 'dist/made-of';

/** @param {string} root @returns {boolean} */
export function buildIsStale(root) {
  const mark = path.join(root, MARK);
  return !existsSync(mark) || readFileSync(mark, 'utf8') !== fingerprint(root);
}

/**
 * Builds the site and the processes. A build that fails leaves no mark, so the next start builds again.
 * @param {string} root
 */
export async function buildSite(root) {
  const print = fingerprint(root);
  rmSync(path.join(root, 'dist'), { recursive: true, force: true });
  await run(root, 'The build of the site', ['node_modules/astro/astro.js', 'build']);
  await run(root, 'The build of the processes', ['scripts/build-processes.mjs']);
  await run(root, 'Compressing the build', ['scripts/precompress.mjs']);
  mkdirSync(path.join(root, 'dist'), { recursive: true });
  writeFileSync(path.join(root, MARK), print);
}

/** @param {string} root @param {string} name @param {readonly string[]} args */
async function run(root, name, args) {
  const env = { ...process.env, ASTRO_TELEMETRY_DISABLED: '1', NODE_ENV: 'production' };
  const done = await runToEnd([process.execPath, ...args], { cwd: root, env });
  if (!done.ok) throw new Refusal(`${name} did not work. Its last lines:\n${tail(done.output, 25)}`);
}

/** A digest of every file the build is made of, by name and content. @param {string} root */
function fingerprint(root) {
  const hash = createHash('sha256').update(process.versions.node);
  for (const name of MADE_OF.flatMap((place) => filesOf(root, place)).sort()) {
    hash.update(`\0${name}\0`).update(readFileSync(path.join(root, name)));
  }
  return hash.digest('hex');
}

/** @param {string} root @param {string} place @returns {string[]} */
function filesOf(root, place) {
  const full = path.join(root, place);
  if (!existsSync(full)) return [];
  if (statSync(full).isFile()) return [place];
  return readdirSync(full, { recursive: true, encoding: 'utf8' })
    .map((name) => path.join(place, name))
    .filter((name) => statSync(path.join(root, name)).isFile());
}

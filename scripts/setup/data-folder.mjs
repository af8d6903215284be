// @ts-check
/** The folder where a start keeps what is not a person's file: one start at a time, with room to work, with its secrets. */
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, statfsSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Refusal } from './say.mjs';

const LEAST_FREE_BYTES = 1_000_000_000;

/**
 * Makes the folder, checks that it can be written to and has room.
 * @param {string} folder @param {string} setting the setting that names it
 */
export function prepareFolder(folder, setting) {
  try {
    makeFolder(folder);
    const probe = path.join(folder, `.probe-${process.pid}`);
    writeFileSync(probe, 'x');
    rmSync(probe);
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? error.code : '';
    if (code === 'ENOSPC') throw new Refusal(`The disk that holds ${folder} is full. Make room and start again.`);
    throw new Refusal(`${setting}: the folder ${folder} cannot be made or written to (${String(code)}).`);
  }
  const { bavail, bsize } = statfsSync(folder);
  if (bavail * bsize < LEAST_FREE_BYTES) {
    throw new Refusal(`The disk that holds ${folder} is nearly full: ${Math.floor(bavail * bsize / 1e6)} MB are left, ${LEAST_FREE_BYTES / 1e6} MB are needed. Make room and start again.`);
  }
}

/** One folder after the other: Node's own `recursive` never comes back where the system lets nothing be made. @param {string} folder */
function makeFolder(folder) {
  if (existsSync(folder)) return;
  makeFolder(path.dirname(folder));
  mkdirSync(folder);
}

/**
 * Claims the folder for this process until it ends.
 * @param {string} folder
 * @returns {() => void} gives it back
 */
export function claimFolder(folder) {
  const file = path.join(folder, 'in-use-by');
  const mine = identityOf(process.pid);
  for (let attempt = 0; attempt < 2; attempt += 1) {
    try {
      writeFileSync(file, mine, { flag: 'wx', mode: 0o600 });
      return () => { rmSync(file, { force: true }); };
    } catch {
      const holder = existsSync(file) ? readFileSync(file, 'utf8') : '';
      const pid = Number(holder.split(' ')[0]);
      if (pid > 0 && identityOf(pid) === holder) {
        throw new Refusal(`The data folder ${folder} is in use by another start (process ${pid}). End that one first, or set FELLMARK_DATA to another folder.`);
      }
      // Left by a start that was killed.
      rmSync(file, { force: true });
    }
  }
  throw new Refusal(`The data folder ${folder} is in use by another start.`);
}

/** A process's number with its time of birth, since numbers are used again. @param {number} pid */
function identityOf(pid) {
  try {
    // proc(5): the 22nd field of stat; the second, in brackets, may hold blanks.
    return `${pid} ${readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1]?.split(' ')[19] ?? ''}`;
  } catch {
    return `${pid} gone`;
  }
}

/**
 * @typedef {object} Secrets
 * @property {string} databasePassword
 * @property {string} secret key of signatures
 * @property {string} paymentsKey of the stand-in
 * @property {string} webhookSecret of the stand-in
 * @property {string} demoPassword
 */

/**
 * The secrets of this data folder, made at the first start and known to its owner alone.
 * @param {string} folder
 * @returns {Secrets & { save: (changed: Partial<Secrets>) => void }}
 */
export function secretsOf(folder) {
  const file = path.join(folder, 'secrets.json');
  const kept = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : {};
  const secrets = {
    databasePassword: randomBytes(24).toString('hex'),
    secret: randomBytes(32).toString('hex'),
    paymentsKey: `sk_test_${randomBytes(24).toString('hex')}`,
    webhookSecret: `whsec_${randomBytes(24).toString('hex')}`,
    demoPassword: readablePassword(),
    ...kept,
  };
  const save = (/** @type {Partial<Secrets>} */ changed) => {
    Object.assign(secrets, changed);
    writeFileSync(`${file}.new`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
    renameSync(`${file}.new`, file);
  };
  save({});
  return Object.assign(secrets, { save });
}

/** Four groups of letters and digits that cannot be mistaken for each other; about 75 bits. */
function readablePassword() {
  const signs = 'abcdefghjkmnpqrstuvwxyz23456789';
  const group = () => Array.from(randomBytes(4), (byte) => signs[byte % signs.length]).join('');
  return [group(), group(), group(), group()].join('-');
}

// @ts-check
/** The settings a person may give to a start, checked before anything is begun. */
import path from 'node:path';
import { Refusal } from './say.mjs';

/**
 * @typedef {object} StartSettings
 * @property {number} port of the web; stand-ins, metrics and the stand-in's post take the three after it
 * @property {string} data
 * @property {string} uploads
 * @property {boolean} demo
 * @property {string | undefined} demoPassword
 * @property {string} publicUrl
 * @property {string | undefined} databaseUrl of a database that already runs
 */

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {string} root relative folders begin here
 * @returns {StartSettings}
 */
export function readSettings(env, root) {
  const port = portOf(env.FELLMARK_PORT || '4321');
  const demo = oneOf('FELLMARK_DEMO', env.FELLMARK_DEMO || 'on', ['on', 'off']) === 'on';
  if (env.FELLMARK_SECOND_FACTOR) oneOf('FELLMARK_SECOND_FACTOR', env.FELLMARK_SECOND_FACTOR, ['offered', 'required']);
  const demoPassword = env.FELLMARK_DEMO_PASSWORD || undefined;
  if (demoPassword !== undefined && demoPassword.length < 12) throw new Refusal('FELLMARK_DEMO_PASSWORD must be at least 12 characters long.');
  const publicUrl = addressOf('FELLMARK_PUBLIC_URL', env.FELLMARK_PUBLIC_URL || `http://127.0.0.1:${port}`);
  if (!demo) requireOutsideServices(env);
  return {
    port,
    demo,
    demoPassword,
    publicUrl,
    data: path.resolve(root, env.FELLMARK_DATA || '.data'),
    uploads: path.resolve(root, env.FELLMARK_UPLOADS || 'uploads'),
    databaseUrl: env.FELLMARK_DATABASE_URL || undefined,
  };
}

/** @param {string} text */
function portOf(text) {
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1 || port > 65_000) throw new Refusal(`FELLMARK_PORT must be a whole number from 1 to 65000, not "${text}".`);
  return port;
}

/** @param {string} name @param {string} value @param {readonly string[]} words */
function oneOf(name, value, words) {
  if (!words.includes(value)) throw new Refusal(`${name} must be ${words.join(' or ')}, not "${value}".`);
  return value;
}

/** @param {string} name @param {string} text */
function addressOf(name, text) {
  const url = URL.canParse(text) ? new URL(text) : undefined;
  if (url === undefined || !/^https?:$/.test(url.protocol) || url.pathname !== '/') {
    throw new Refusal(`${name} must be an address without a path, such as https://loom.example, not "${text}".`);
  }
  if (url.protocol === 'http:' && !['127.0.0.1', 'localhost', '[::1]'].includes(url.hostname)) {
    throw new Refusal(`${name}: an address that others reach must begin with https, or passwords travel in the open.`);
  }
  return url.origin;
}

/** The stand-ins take no real money and send no real letters, so they serve the demo only. @param {NodeJS.ProcessEnv} env */
function requireOutsideServices(env) {
  const missing = ['FELLMARK_PAYMENTS_KEY', 'FELLMARK_PAYMENTS_WEBHOOK_SECRETS', 'FELLMARK_SMTP_URL'].filter((name) => !env[name]);
  if (missing.length > 0) throw new Refusal(`Without the demo (FELLMARK_DEMO=off) these settings must be given: ${missing.join(', ')}.`);
}

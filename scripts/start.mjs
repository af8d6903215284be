// @ts-check
/**
 * Starts all of Fellmark on this machine: `npm start`, or `npm run dev` with everything reloading as it is edited.
 * Begins with nothing but Node.js, so it imports no package.
 */
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { Children, runToEnd } from './setup/children.mjs';
import { claimFolder, prepareFolder, secretsOf } from './setup/data-folder.mjs';
import { startDatabaseServer } from './setup/database-server.mjs';
import { installPackages, missingPackages, NEEDED_TO_RUN } from './setup/debian-packages.mjs';
import { installNodePackages, packagesAreStale, requireNodeVersion } from './setup/node-packages.mjs';
import { isPortFree } from './setup/ports.mjs';
import { Refusal, lastLines, say, step, tail } from './setup/say.mjs';
import { readSettings } from './setup/settings.mjs';
import { buildIsStale, buildSite } from './setup/site-build.mjs';
import { welcome } from './setup/welcome.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const development = process.argv.includes('--dev');
const READY_SECONDS = 90;

/** @type {(() => void) | undefined} */
let giveBackFolder;
/** @type {Promise<never> | undefined} */
let ending;
const children = new Children((sentence) => { void end(1, sentence); });

/** Ends everything in order, once. @param {number} code @param {string} [sentence] @returns {Promise<never>} */
function end(code, sentence) {
  ending ??= (async () => {
    say(sentence === undefined ? '\nStopping.' : `\n${sentence}\n`);
    await children.stopAll();
    giveBackFolder?.();
    if (sentence === undefined) say('Stopped. Everything is kept for the next start.');
    process.exit(code);
  })();
  return ending;
}

let firstSignal = 0;
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => {
    // Ctrl-C may arrive twice at once, from the terminal and through npm; only a later one means impatience.
    if (firstSignal !== 0 && Date.now() - firstSignal > 2_000) {
      children.killAll();
      giveBackFolder?.();
      process.exit(1);
    }
    firstSignal ||= Date.now();
    void end(0);
  });
}

/** One process of ours by its name, built or as source. @param {string} name @param {boolean} [reloading] */
function commandOf(name, reloading = false) {
  if (!development) return [process.execPath, '--enable-source-maps', path.join(root, 'dist/processes', `${name}.mjs`)];
  const tsx = path.join(root, 'node_modules/tsx/dist/cli.mjs');
  return [process.execPath, tsx, ...reloading ? ['watch', '--clear-screen=false'] : [], path.join(root, 'src/processes', `${name}.ts`)];
}

/** Runs a process that ends by itself. @param {string} name @param {string} what @param {NodeJS.ProcessEnv} env */
async function runOnce(name, what, env) {
  const done = await runToEnd(commandOf(name), { cwd: root, env });
  if (done.ok) return;
  const setting = /^SettingsError: (.+)$/m.exec(done.output)?.[1];
  throw new Refusal(setting ?? `${what} did not work. Its last lines:\n${tail(done.output)}`);
}

async function start() {
  requireNodeVersion(root);
  const settings = readSettings(process.env, root);
  say(`Starting Fellmark${development ? ' for development' : ''}.`);
  prepareFolder(settings.data, 'FELLMARK_DATA');
  prepareFolder(settings.uploads, 'FELLMARK_UPLOADS');
  giveBackFolder = claimFolder(settings.data);
  await requireFreePorts(settings);
  const logs = path.join(settings.data, 'logs');
  mkdirSync(logs, { recursive: true });
  const log = (/** @type {string} */ name) => path.join(logs, `${name}.log`);

  const missing = missingPackages(NEEDED_TO_RUN);
  if (missing.length > 0) await step(`Debian packages: ${missing.join(', ')}`, () => installPackages(missing));
  if (packagesAreStale(root)) await step('Node packages', () => installNodePackages(root));
  if (!development && buildIsStale(root)) await step('Build', () => buildSite(root));

  const secrets = secretsOf(settings.data);
  const databaseUrl = settings.databaseUrl ?? await step('Database', async () => {
    const server = await startDatabaseServer({ folder: path.join(settings.data, 'database'), log: log('database'), password: secrets.databasePassword, durable: true });
    children.watch({ name: 'The database', log: server.log, process: server.child });
    return server.url;
  });
  // A world that is made already keeps the password it was made with.
  const worldMade = path.join(settings.data, 'demo-world-made');
  if (!existsSync(worldMade) && settings.demoPassword !== undefined) secrets.save({ demoPassword: settings.demoPassword });
  const env = environmentOf(settings, secrets, databaseUrl);
  await step('Tables', () => runOnce('migrate', 'Bringing the tables up to date', env));
  if (settings.demo) {
    await step('Demo world', () => runOnce('seed', 'Making the demo world', env));
    writeFileSync(worldMade, '');
    await step('Stand-ins for payment and post', async () => {
      children.start({ name: 'The stand-ins', log: log('stand-ins'), command: commandOf('stand-ins', true), env, cwd: root });
      await until('The stand-ins', log('stand-ins'), () => listens(settings.port + 1));
    });
  }
  await step('Worker', async () => {
    children.start({ name: 'The worker', log: log('worker'), command: commandOf('worker', true), env, cwd: root });
    await until('The worker', log('worker'), () => Promise.resolve(existsSync(log('worker')) && readFileSync(log('worker'), 'utf8').includes('worker ready')));
  });
  await step('Web', async () => {
    const command = development
      ? [process.execPath, path.join(root, 'node_modules/astro/astro.js'), 'dev', '--host', '127.0.0.1', '--port', String(settings.port)]
      : commandOf('web');
    children.start({ name: 'The web server', log: log('web'), command, env, cwd: root });
    await until('The web server', log('web'), () => answers(`http://127.0.0.1:${settings.port}/readyz`));
  });
  say(welcome({ settings, password: settings.demo ? secrets.demoPassword : undefined }));
}

/** @param {import('./setup/settings.mjs').StartSettings} settings */
async function requireFreePorts({ port, demo }) {
  const uses = [[port, 'the web'], ...demo ? [[port + 1, 'the stand-ins'], [port + 3, 'the mail stand-in']] : [], [port + 2, 'the metrics']];
  for (const [number, use] of uses) {
    if (!await isPortFree(Number(number))) {
      throw new Refusal(`Port ${number}, wanted for ${use}, is taken by another program. End it, or choose another with FELLMARK_PORT (now ${port}; the three ports after it are used too).`);
    }
  }
}

/**
 * @param {import('./setup/settings.mjs').StartSettings} settings
 * @param {import('./setup/data-folder.mjs').Secrets} secrets
 * @param {string} databaseUrl
 * @returns {NodeJS.ProcessEnv}
 */
function environmentOf(settings, secrets, databaseUrl) {
  const standIns = {
    FELLMARK_PAYMENTS_URL: `http://127.0.0.1:${settings.port + 1}`,
    FELLMARK_PAYMENTS_KEY: secrets.paymentsKey,
    FELLMARK_PAYMENTS_WEBHOOK_SECRETS: secrets.webhookSecret,
    FELLMARK_SMTP_URL: `smtp://127.0.0.1:${settings.port + 3}`,
    FELLMARK_DEMO_PASSWORD: secrets.demoPassword,
  };
  return {
    FELLMARK_SECRET: secrets.secret,
    // Nobody balances load between the processes of one terminal.
    FELLMARK_DRAIN_SECONDS: '0',
    ...process.env,
    TZ: 'UTC',
    NODE_ENV: development ? 'development' : 'production',
    ASTRO_TELEMETRY_DISABLED: '1',
    FELLMARK_MODE: development ? 'development' : 'production',
    FELLMARK_PORT: String(settings.port),
    FELLMARK_DATA: settings.data,
    FELLMARK_UPLOADS: settings.uploads,
    FELLMARK_DEMO: settings.demo ? 'on' : 'off',
    FELLMARK_PUBLIC_URL: settings.publicUrl,
    FELLMARK_DATABASE_URL: databaseUrl,
    ...settings.demo ? standIns : {},
  };
}

/** @param {string} name @param {string} log @param {() => Promise<boolean>} isSo */
async function until(name, log, isSo) {
  const last = Date.now() + READY_SECONDS * 1_000;
  while (!await isSo()) {
    if (ending !== undefined) await ending;
    if (Date.now() > last) throw new Refusal(`${name} did not become ready within ${READY_SECONDS} seconds. Its last lines:\n${lastLines(log)}`);
    await new Promise((resolve) => { setTimeout(resolve, 100); });
  }
}

/** @param {number} port @returns {Promise<boolean>} */
function listens(port) {
  return new Promise((resolve) => {
    const socket = net.connect({ host: '127.0.0.1', port });
    socket.once('connect', () => { socket.destroy(); resolve(true); });
    socket.once('error', () => { resolve(false); });
  });
}

/** @param {string} url */
async function answers(url) {
  try {
    return (await fetch(url, { signal: AbortSignal.timeout(20_000) })).status === 200;
  } catch {
    return false;
  }
}

try {
  await start();
} catch (error) {
  await end(1, error instanceof Refusal ? error.message : error instanceof Error ? error.stack ?? error.message : String(error));
}

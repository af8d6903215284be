/**
 * The settings of the house: the only file that reads the environment.
 * Read once, on first use, so that a build needs no database; nonsense stops the process with every wrong name told.
 */
import { z } from 'astro/zod';
import { LIVE_HOST, problemsOfPaymentSettings } from '#server/payments/payment-settings.ts';

const flag = z.enum(['on', 'off']).transform((word) => word === 'on');
const port = z.coerce.number().int().min(1).max(65_000);
const url = z.string().url();

const Settings = z.object({
  FELLMARK_MODE: z.enum(['production', 'development', 'test']).default('production'),
  FELLMARK_PORT: port.default(4321),
  FELLMARK_HOST: z.string().ip().default('127.0.0.1'),
  FELLMARK_DATA: z.string().min(1).default('.data'),
  FELLMARK_UPLOADS: z.string().min(1).default('uploads'),
  FELLMARK_DEMO: flag.default('off'),
  FELLMARK_DEMO_PASSWORD: z.string().min(12).optional(),
  FELLMARK_PUBLIC_URL: url.optional(),
  FELLMARK_SECOND_FACTOR: z.enum(['offered', 'required']).optional(),
  FELLMARK_DATABASE_URL: url,
  FELLMARK_DATABASE_SOCKET: z.string().min(1).optional(),
  FELLMARK_SMTP_URL: url.optional(),
  FELLMARK_MAIL_FROM: z.string().email().default('hello@fellmark.example'),
  FELLMARK_PAYMENTS_URL: url.optional(),
  FELLMARK_PAYMENTS_KEY: z.string(),
  FELLMARK_PAYMENTS_WEBHOOK_SECRETS: z.string().default(''),
  FELLMARK_SECRET: z.string().min(32),
  FELLMARK_TRUSTED_PROXIES: z.string().default(''),
  FELLMARK_DRAIN_SECONDS: z.coerce.number().int().min(0).max(60).default(5),
});

export interface Config {
  readonly mode: 'production' | 'development' | 'test';
  readonly port: number;
  /** The address of this machine to listen on. */
  readonly host: string;
  readonly dataFolder: string;
  readonly uploadsFolder: string;
  readonly demo: boolean;
  readonly demoPassword: string | undefined;
  /** The address people use, without a slash at its end. */
  readonly publicUrl: string;
  readonly secureCookies: boolean;
  readonly secondFactor: 'offered' | 'required';
  readonly database: { host: string; port: number; user: string; password: string; name: string; socket: string | undefined };
  readonly smtpUrl: string;
  readonly mailFrom: string;
  readonly payments: { url: string | undefined; key: string; webhookSecrets: readonly string[] };
  /** Key of signatures and of the pepper: never stored in the database. */
  readonly secret: string;
  /** Addresses and networks of our own proxies. */
  readonly trustedProxies: readonly string[];
  /** How long a stopping web process goes on serving after it says that it is no longer ready. */
  readonly drainSeconds: number;
}

/** Thrown at start when a setting is missing or nonsense; the message names each of them. */
export class SettingsError extends Error {
  override readonly name = 'SettingsError';
}

const LOOPBACK = new Set(['127.0.0.1', 'localhost', '[::1]']);

/**
 * Reads settings from `env`.
 * @throws {SettingsError} naming every variable that is missing or wrong.
 */
export function readConfig(env: Readonly<Record<string, string | undefined>>): Config {
  const filled = Object.fromEntries(Object.entries(env).filter(([name, value]) => name.startsWith('FELLMARK_') && value !== ''));
  const parsed = Settings.safeParse(filled);
  if (!parsed.success) {
    const wrong = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new SettingsError(`These settings do not work. ${wrong.join('; ')}`);
  }
  const s = parsed.data;
  const database = new URL(s.FELLMARK_DATABASE_URL);
  const publicUrl = (s.FELLMARK_PUBLIC_URL ?? `http://127.0.0.1:${s.FELLMARK_PORT}`).replace(/\/+$/, '');
  const address = new URL(publicUrl);
  if (address.protocol !== 'https:' && !LOOPBACK.has(address.hostname)) {
    throw new SettingsError('FELLMARK_PUBLIC_URL: an address that others reach must begin with https, or passwords travel in the open');
  }
  const webhookSecrets = listOf(s.FELLMARK_PAYMENTS_WEBHOOK_SECRETS);
  const payments = problemsOfPaymentSettings({
    secretKey: s.FELLMARK_PAYMENTS_KEY,
    host: s.FELLMARK_PAYMENTS_URL === undefined ? LIVE_HOST : new URL(s.FELLMARK_PAYMENTS_URL).hostname,
    production: s.FELLMARK_MODE === 'production' && !s.FELLMARK_DEMO,
    webhookSecrets,
  });
  if (payments.length > 0) throw new SettingsError(`FELLMARK_PAYMENTS_…: ${payments.join('. ')}.`);
  return Object.freeze({
    mode: s.FELLMARK_MODE,
    port: s.FELLMARK_PORT,
    host: s.FELLMARK_HOST,
    dataFolder: s.FELLMARK_DATA,
    uploadsFolder: s.FELLMARK_UPLOADS,
    demo: s.FELLMARK_DEMO,
    demoPassword: s.FELLMARK_DEMO_PASSWORD,
    publicUrl,
    secureCookies: address.protocol === 'https:',
    secondFactor: s.FELLMARK_SECOND_FACTOR ?? (s.FELLMARK_DEMO ? 'offered' : 'required'),
    database: {
      host: database.hostname,
      port: database.port === '' ? 3306 : Number(database.port),
      user: decodeURIComponent(database.username),
      password: decodeURIComponent(database.password),
      name: database.pathname.slice(1),
      socket: s.FELLMARK_DATABASE_SOCKET,
    },
    smtpUrl: s.FELLMARK_SMTP_URL ?? `smtp://127.0.0.1:${s.FELLMARK_PORT + 3}`,
    mailFrom: s.FELLMARK_MAIL_FROM,
    payments: {
      url: s.FELLMARK_PAYMENTS_URL,
      key: s.FELLMARK_PAYMENTS_KEY,
      webhookSecrets,
    },
    secret: s.FELLMARK_SECRET,
    trustedProxies: listOf(s.FELLMARK_TRUSTED_PROXIES),
    drainSeconds: s.FELLMARK_DRAIN_SECONDS,
  });
}

function listOf(words: string): string[] {
  return words.split(',').map((word) => word.trim()).filter((word) => word !== '');
}

let kept: Config | undefined;

/** The settings of this process. */
export function config(): Config {
  kept ??= readConfig(process.env);
  return kept;
}

import { setTimeout as wait } from 'node:timers/promises';
import type { Answer, Answerer, Asked } from '#stand-ins/http.ts';
import { ApiError } from './api-error.ts';
import type { ApiFault, ApiFaults } from './api-faults.ts';
import type { ApiRoute } from './api-routes.ts';
import { SERVICE_VERSION } from './event-log.ts';
import { canonicalForm, decodeForm, type FormGroup } from './form-body.ts';
import type { IdempotentRequests, Outcome, Performed } from './idempotency.ts';
import { newId } from './ids.ts';

export interface Api {
  readonly routes: readonly ApiRoute[];
  readonly idempotency: IdempotentRequests;
  readonly faults: ApiFaults;
  /** Brings everything up to the present moment before it is read. */
  readonly upkeep: () => void;
}

/** Answers everything below `/v1/`. */
export function apiAnswerer(api: Api): Answerer {
  return async (asked) => {
    if (!asked.path.startsWith('/v1/')) return undefined;
    const requestId = newId('req');
    const fault = api.faults.take(asked.method, asked.path);
    if (fault?.kind === 'hang-up-before') return 'hang-up';
    try {
      mustHaveKey(asked);
      if (fault?.kind === 'answer') throw faultAnswer(fault);
      const outcome = await carriedOut(api, asked, requestId, fault);
      if (fault?.kind === 'hang-up-after') return 'hang-up';
      return answerWith(asked, outcome);
    } catch (error) {
      const { status, body, headers } = refusalOf(error);
      return answerWith(asked, { status, body, requestId, save: false, replayed: false, originalRequest: undefined }, headers);
    }
  };
}

/** Carries a request out, once for its idempotency key where it has one. */
async function carriedOut(api: Api, asked: Asked, requestId: string, fault: ApiFault | undefined): Promise<Outcome> {
  const key = headerOf(asked, 'idempotency-key');
  const form = decodeForm(asked.method === 'POST' ? asked.body : asked.query);
  const work = async (): Promise<Performed> => {
    if (fault?.kind === 'slow') await wait(fault.delayMs);
    api.upkeep();
    const performed = perform(api.routes, asked, form, { requestId, idempotencyKey: key ?? null });
    return fault?.kind === 'fail-after' ? { ...performed, status: 500, body: write(new ApiError(500, 'An unknown error occurred', { type: 'api_error' }).body()), save: true } : performed;
  };
  if (key === undefined || asked.method !== 'POST') return { ...(await work()), replayed: false, originalRequest: undefined };
  return api.idempotency.once(key, `${asked.method} ${asked.path} ${canonicalForm(form)}`, work);
}

function perform(routes: readonly ApiRoute[], asked: Asked, form: FormGroup, cause: { requestId: string; idempotencyKey: string | null }): Performed {
  const { requestId } = cause;
  try {
    for (const route of routes) {
      const match = route.method === asked.method ? route.path.exec(asked.path) : null;
      if (match) return { status: 200, body: write(route.answer({ form, ids: match.slice(1).map(decodedPart), cause })), requestId, save: true };
    }
    throw new ApiError(404, `Unrecognized request URL (${asked.method}: ${asked.path}).`, { beforeTrying: true });
  } catch (error) {
    const { status, body } = refusalOf(error);
    return { status, body, requestId, save: !(error instanceof ApiError && error.detail.beforeTrying === true) };
  }
}

function decodedPart(part: string): string {
  try {
    return decodeURIComponent(part);
  } catch {
    return part;
  }
}

function refusalOf(error: unknown): { status: number; body: string; headers: Readonly<Record<string, string>> } {
  if (error instanceof ApiError) return { status: error.status, body: write(error.body()), headers: error.detail.headers ?? {} };
  console.error('stand-ins: the payment interface failed', error);
  return { status: 500, body: write(new ApiError(500, 'The stand-in failed', { type: 'api_error' }).body()), headers: {} };
}

function faultAnswer({ status, type, code }: ApiFault): ApiError {
  return new ApiError(status, 'The stand-in was told to refuse this', { type, ...(code === undefined ? {} : { code }), beforeTrying: true });
}

/** Test keys only, by Bearer or as the user name of Basic. */
function mustHaveKey(asked: Asked): void {
  const [scheme = '', credentials = ''] = (headerOf(asked, 'authorization') ?? '').split(' ');
  const key = scheme === 'Basic' ? (Buffer.from(credentials, 'base64').toString('utf8').split(':')[0] ?? '') : scheme === 'Bearer' ? credentials : '';
  if (key === '') throw new ApiError(401, "You did not provide an API key. Give it as Bearer or as the user name of Basic in 'Authorization'.");
  if (!/^[sr]k_test_\w+$/.test(key)) throw new ApiError(401, `Invalid API Key provided: ${key.slice(0, 8)}${'*'.repeat(8)}${key.slice(-4)}`);
  const account = headerOf(asked, 'stripe-account');
  if (account !== undefined) {
    throw new ApiError(403, `The provided key does not have access to account '${account}' (or that account does not exist).`, { code: 'account_invalid' });
  }
}

function answerWith(asked: Asked, outcome: Outcome, extra: Readonly<Record<string, string>> = {}): Answer {
  const key = headerOf(asked, 'idempotency-key');
  const account = headerOf(asked, 'stripe-account');
  return {
    status: outcome.status,
    body: outcome.body,
    headers: {
      'content-type': 'application/json',
      'cache-control': 'no-cache, no-store',
      'request-id': outcome.requestId,
      'stripe-version': headerOf(asked, 'stripe-version') ?? SERVICE_VERSION,
      ...(key === undefined ? {} : { 'idempotency-key': key }),
      ...(account === undefined ? {} : { 'stripe-account': account }),
      ...(outcome.replayed ? { 'idempotent-replayed': 'true' } : {}),
      ...(outcome.originalRequest === undefined ? {} : { 'original-request': outcome.originalRequest }),
      ...extra,
    },
  };
}

function headerOf(asked: Asked, name: string): string | undefined {
  const value = asked.headers[name];
  return typeof value === 'string' && value !== '' ? value : undefined;
}

function write(value: object): string {
  return `${JSON.stringify(value, null, 2)}\n`;
}

/**
 * What can go wrong, in about a dozen words. Every layer throws AppError; each edge (endpoint, action, page)
 * has one mapping of these words to what its caller sees.
 */

export const ERROR_CODES = {
  VALIDATION: { status: 422, says: 'Something in this form does not work yet.' },
  UNAUTHENTICATED: { status: 401, says: 'Sign in to go on.' },
  PROOF_NEEDED: { status: 403, says: 'Type your password once more to go on.' },
  FORBIDDEN: { status: 403, says: 'This belongs to somebody else.' },
  NOT_FOUND: { status: 404, says: 'There is nothing at this address.' },
  CONFLICT: { status: 409, says: 'This changed in the meantime.' },
  GONE: { status: 410, says: 'This has ended.' },
  TOO_LARGE: { status: 413, says: 'This is too large.' },
  UNSUPPORTED: { status: 415, says: 'This kind of file or text cannot be read here.' },
  PAYMENT_REQUIRED: { status: 402, says: 'This part belongs to a seat.' },
  RATE_LIMITED: { status: 429, says: 'That was often in a short time. Wait a little, then try again.' },
  UPSTREAM: { status: 502, says: 'A service we rely on did not answer. Nothing was lost; try again.' },
  UNAVAILABLE: { status: 503, says: 'We are busy just now. Try again in a moment.' },
  BUG: { status: 500, says: 'We could not do this. Nothing you made is lost.' },
} as const satisfies Record<string, { status: number; says: string }>;

export type ErrorCode = keyof typeof ERROR_CODES;

export interface ErrorDetail {
  /** For the log; never shown. */
  readonly message?: string;
  /** A sentence for the person. */
  readonly says?: string;
  /** A sentence for each field that does not work, by the field's name. */
  readonly fields?: Readonly<Record<string, string>>;
  readonly retryAfterSeconds?: number;
  readonly cause?: unknown;
}

export class AppError extends Error {
  override readonly name = 'AppError';
  readonly code: ErrorCode;
  readonly says: string;
  readonly fields: Readonly<Record<string, string>>;
  readonly retryAfterSeconds: number | undefined;

  constructor(code: ErrorCode, detail: ErrorDetail = {}) {
    super(detail.message ?? detail.says ?? code, detail.cause === undefined ? undefined : { cause: detail.cause });
    this.code = code;
    this.says = detail.says ?? ERROR_CODES[code].says;
    this.fields = detail.fields ?? {};
    this.retryAfterSeconds = detail.retryAfterSeconds;
  }

  get status(): number {
    return ERROR_CODES[this.code].status;
  }
}

/** A refusal at one field of a form. */
export function fieldError(field: string, says: string): AppError {
  return new AppError('VALIDATION', { fields: { [field]: says } });
}

/** The person who asks, or UNAUTHENTICATED. */
export function signedIn<A>(ctx: { readonly actor: A | null }): A {
  if (ctx.actor === null) throw new AppError('UNAUTHENTICATED');
  return ctx.actor;
}

/** Throws unless `allowed`: NOT_FOUND where the thing must stay unseen, FORBIDDEN where it may be seen but not touched. */
export function authorize(allowed: boolean, code: 'NOT_FOUND' | 'FORBIDDEN' | 'UNAUTHENTICATED' | 'PAYMENT_REQUIRED' = 'NOT_FOUND'): asserts allowed {
  if (!allowed) throw new AppError(code);
}

/** `value`, or NOT_FOUND when there is none. */
export function found<T>(value: T | null | undefined): T {
  if (value === null || value === undefined) throw new AppError('NOT_FOUND');
  return value;
}

/** A refusal as the service words it: a status and a body `{ error: { type, code, message, param, … } }`. */
export interface ErrorDetail {
  readonly type?: 'api_error' | 'card_error' | 'idempotency_error' | 'invalid_request_error';
  readonly code?: string;
  readonly param?: string;
  readonly declineCode?: string;
  /** Extra response headers. */
  readonly headers?: Readonly<Record<string, string>>;
  /** Refused before anything was tried, so an idempotency key is not used up. */
  readonly beforeTrying?: boolean;
}

export class ApiError extends Error {
  override readonly name = 'ApiError';
  readonly status: number;
  readonly detail: ErrorDetail;

  constructor(status: number, message: string, detail: ErrorDetail = {}) {
    super(message);
    this.status = status;
    this.detail = detail;
  }

  body(): { error: Record<string, string> } {
    const { type = 'invalid_request_error', code, param, declineCode } = this.detail;
    return {
      error: {
        ...(code === undefined ? {} : { code, doc_url: `https://docs.stripe.com/error-codes/${code.replaceAll('_', '-')}` }),
        ...(declineCode === undefined ? {} : { decline_code: declineCode }),
        message: this.message,
        ...(param === undefined ? {} : { param }),
        type,
      },
    };
  }
}

/** 404 for a thing that is not there. */
export function noSuch(what: string, id: string, param = 'id'): ApiError {
  return new ApiError(404, `No such ${what}: '${id}'`, { code: 'resource_missing', param });
}

/** 400 for a parameter that does not work; refused before anything was tried. */
export function badParameter(param: string, message: string, code = 'parameter_invalid'): ApiError {
  return new ApiError(400, message, { code, param, beforeTrying: true });
}

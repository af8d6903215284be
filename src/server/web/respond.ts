/** Answers of endpoints: JSON that is never cached, and problems by RFC 9457. */
import { databaseIsAway } from '#server/db/trouble.ts';
import { AppError } from '#server/errors.ts';

export function json(body: unknown, status = 200, headers: Record<string, string> = {}): Response {
  return new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/json; charset=utf-8', 'Cache-Control': 'private, no-store', ...headers } });
}

/** The word for an error: its own, UNAVAILABLE when the database is away, else BUG. */
export function knownError(error: unknown): AppError {
  if (error instanceof AppError) return error;
  return databaseIsAway(error) ? new AppError('UNAVAILABLE', { cause: error, retryAfterSeconds: 10 }) : new AppError('BUG', { cause: error });
}

/** The problem document of an error. Unknown errors are logged once and say nothing of themselves. */
export function problem(error: unknown, requestId: string): Response {
  const known = knownError(error);
  if (known.code === 'BUG') console.error(JSON.stringify({ level: 'error', requestId, message: String(error instanceof Error ? error.stack : error) }));
  const body = {
    type: 'about:blank',
    title: known.says,
    status: known.status,
    code: known.code,
    requestId,
    ...(Object.keys(known.fields).length === 0 ? {} : { fields: known.fields }),
  };
  return new Response(JSON.stringify(body), {
    status: known.status,
    headers: {
      'Content-Type': 'application/problem+json; charset=utf-8',
      'Cache-Control': 'private, no-store',
      ...(known.retryAfterSeconds === undefined ? {} : { 'Retry-After': String(known.retryAfterSeconds) }),
    },
  });
}

/** Runs an endpoint's work and maps what it throws. */
export async function answering(requestId: string, work: () => Promise<Response>): Promise<Response> {
  try {
    return await work();
  } catch (error) {
    return problem(error, requestId);
  }
}

/** Whether a browser asks by a link or form of its own, and must be shown a page; programs and islands take JSON. */
export function wantsPage(request: Request): boolean {
  return (request.headers.get('accept') ?? '').includes('text/html');
}

/** Short refusals by the front itself, before any page is asked. */
import type { IncomingMessage, OutgoingHttpHeaders, ServerResponse } from 'node:http';
import { STATUS_CODES } from 'node:http';
import { pathOf } from '#server/web/front/handler.ts';
import { gateOf } from '#server/web/front/response-gate.ts';

const LINGER_MS = 2_000;

/**
 * Answers with `status` and one sentence: problem+json (RFC 9457) for programs, a small page for people.
 * Does nothing when an answer is already on its way. A body that is still arriving is read and dropped for a moment,
 * because a connection cut under the sender's hands would hide the answer from it.
 */
export function refuse(
  request: IncomingMessage,
  response: ServerResponse,
  status: number,
  sentence: string,
  headers: OutgoingHttpHeaders = {},
): void {
  const raw = gateOf(response).seize();
  if (raw === undefined) return;
  for (const name of response.getHeaderNames()) {
    if (name.startsWith('content-') || name === 'etag') response.removeHeader(name);
  }
  const title = STATUS_CODES[status] ?? 'Refused';
  const forPeople = (!pathOf(request).startsWith('/api/') || carriesForm(request)) && (request.headers.accept ?? '').includes('text/html');
  const body = Buffer.from(forPeople ? page(status, title, sentence) : JSON.stringify({ type: 'about:blank', title, status, detail: sentence }));
  response.setHeader('Content-Type', forPeople ? 'text/html; charset=utf-8' : 'application/problem+json; charset=utf-8');
  response.setHeader('Content-Length', body.length);
  response.setHeader('Content-Security-Policy', "default-src 'none'; frame-ancestors 'none'");
  response.setHeader('Cache-Control', 'no-store');
  for (const [name, value] of Object.entries(headers)) {
    if (value !== undefined) response.setHeader(name, value);
  }
  const arriving = bodyIsArriving(request);
  if (arriving) response.setHeader('Connection', 'close');
  raw.writeHead(status);
  if (request.method !== 'HEAD') raw.write(body);
  if (!arriving) {
    raw.end();
    return;
  }
  const finish = (): void => {
    clearTimeout(timer);
    raw.end();
  };
  const timer = setTimeout(finish, LINGER_MS);
  request.once('end', finish);
  request.once('close', finish);
  request.resume();
}

function bodyIsArriving(request: IncomingMessage): boolean {
  if (request.complete) return false;
  return request.headers['transfer-encoding'] !== undefined || (request.headers['content-length'] ?? '0') !== '0';
}

/** A form without script posts to an endpoint too, and its browser shows what comes back. */
function carriesForm(request: IncomingMessage): boolean {
  return /^(?:multipart\/form-data|application\/x-www-form-urlencoded)\b/i.test(request.headers['content-type'] ?? '');
}

function page(status: number, title: string, sentence: string): string {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${title}</title></head><body><main><h1>${title}</h1><p>${sentence}</p>${status === 413 ? '<p>Go back, choose less, and send it again. Nothing you made here is lost.</p>' : ''}<p><a href="/">To the first page</a></p></main></body></html>`;
}

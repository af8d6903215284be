import { createServer, type IncomingHttpHeaders, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Html } from './html.ts';

const LARGEST_BODY = 1024 * 1024;

export interface Asked {
  readonly method: string;
  /** Decoded by nobody: as it came, without the query. */
  readonly path: string;
  readonly query: string;
  readonly headers: IncomingHttpHeaders;
  readonly body: string;
}

export interface Reply {
  readonly status: number;
  readonly headers: Readonly<Record<string, string>>;
  readonly body: string | Buffer;
}

/** `hang-up` closes the connection without an answer. `undefined` leaves the request to the next one asked. */
export type Answer = Reply | 'hang-up' | undefined;
export type Answerer = (asked: Asked) => Answer | Promise<Answer>;

/** Headers of every page and list: nothing is cached, sniffed or framed. */
const PLAIN_HEADERS = { 'cache-control': 'no-store', 'x-content-type-options': 'nosniff', 'referrer-policy': 'no-referrer' };

export function pageReply(page: Html, options: { status?: number; policy: string }): Reply {
  return {
    status: options.status ?? 200,
    headers: { ...PLAIN_HEADERS, 'content-type': 'text/html; charset=utf-8', 'content-security-policy': options.policy },
    body: page.text,
  };
}

export function jsonReply(value: unknown, status = 200): Reply {
  return { status, headers: { ...PLAIN_HEADERS, 'content-type': 'application/json; charset=utf-8' }, body: `${JSON.stringify(value, null, 2)}\n` };
}

export function textReply(text: string, status = 200): Reply {
  return { status, headers: { ...PLAIN_HEADERS, 'content-type': 'text/plain; charset=utf-8' }, body: text };
}

/** After a form: go on by GET. */
export function seeOther(address: string): Reply {
  return { status: 303, headers: { ...PLAIN_HEADERS, location: address }, body: '' };
}

export interface RunningServer {
  readonly port: number;
  close(): Promise<void>;
}

/** Serves on this machine only; each request goes to the answerers in turn until one has an answer. Port 0 takes a free one. */
export async function serve(port: number, answerers: readonly Answerer[]): Promise<RunningServer> {
  const server = createServer((request, response) => {
    void handle(request, response, answerers);
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  return { port: portOf(server), close: () => closeServer(server) };
}

async function handle(request: IncomingMessage, response: ServerResponse, answerers: readonly Answerer[]): Promise<void> {
  try {
    const body = await readBody(request);
    const answer = body === undefined ? textReply('Too large\n', 413) : await answerOf(askedBy(request, body), answerers);
    if (answer === 'hang-up') {
      request.socket.destroy();
      return;
    }
    response.writeHead(answer.status, { ...answer.headers, 'content-length': Buffer.byteLength(answer.body) });
    response.end(request.method === 'HEAD' ? undefined : answer.body);
  } catch (error) {
    console.error('stand-ins: a request failed', error);
    if (!response.headersSent) response.writeHead(500, { 'content-type': 'text/plain' });
    response.end('The stand-in failed\n');
  }
}

async function answerOf(asked: Asked, answerers: readonly Answerer[]): Promise<Reply | 'hang-up'> {
  for (const answerer of answerers) {
    const answer = await answerer(asked);
    if (answer !== undefined) return answer;
  }
  return textReply('There is nothing at this address\n', 404);
}

function askedBy(request: IncomingMessage, body: string): Asked {
  const [path = '/', query = ''] = splitOnce(request.url ?? '/', '?');
  const method = request.method === 'HEAD' ? 'GET' : (request.method ?? 'GET');
  return { method, path, query, headers: request.headers, body };
}

function splitOnce(text: string, sign: string): [string, string] {
  const at = text.indexOf(sign);
  return at < 0 ? [text, ''] : [text.slice(0, at), text.slice(at + 1)];
}

/** The whole body as text, or nothing when it is too large. */
async function readBody(request: IncomingMessage): Promise<string | undefined> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of request) {
    const bytes: Buffer = Buffer.isBuffer(chunk) ? chunk : Buffer.from(String(chunk));
    size += bytes.length;
    if (size <= LARGEST_BODY) chunks.push(bytes);
  }
  return size <= LARGEST_BODY ? Buffer.concat(chunks).toString('utf8') : undefined;
}

function portOf(server: Server): number {
  const address: AddressInfo | string | null = server.address();
  return typeof address === 'object' && address !== null ? address.port : 0;
}

function closeServer(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => {
      resolve();
    });
    server.closeIdleConnections();
    // What is still being answered gets a moment; a client that keeps its connection open does not hold us.
    setTimeout(() => {
      server.closeAllConnections();
    }, 1000).unref();
  });
}

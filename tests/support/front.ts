/** The front with a site of the test's own behind it, on a free port, asked by requests that are sent exactly as written. */
import { createServer, request as httpRequest, type IncomingHttpHeaders, type IncomingMessage, type OutgoingHttpHeaders, type ServerResponse } from 'node:http';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { servingFront, type ServingSettings } from '#server/web/front/front.ts';

export type Site = (request: IncomingMessage, response: ServerResponse) => void;

export interface Answer {
  readonly status: number;
  readonly headers: IncomingHttpHeaders;
  readonly bytes: Buffer;
  readonly text: string;
}

export interface Question {
  readonly method?: string;
  readonly headers?: OutgoingHttpHeaders;
  readonly body?: Uint8Array | string;
  /** Send the body in chunks, without saying how long it is. */
  readonly chunked?: boolean;
}

export interface RunningFront {
  readonly port: number;
  readonly folder: string;
  ask(target: string, question?: Question): Promise<Answer>;
  stop(): Promise<void>;
}

export const PUBLIC_HOST = 'loom.example';

/**
 * @param files of the build, by name
 * @param uploads files of people, by key
 */
export async function startFront({ site, files = {}, uploads = {}, settings = {} }: {
  site: Site;
  files?: Readonly<Record<string, string | Uint8Array>>;
  uploads?: Readonly<Record<string, string | Uint8Array>>;
  settings?: Partial<ServingSettings>;
}): Promise<RunningFront> {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'fellmark-front-'));
  layOut(path.join(folder, 'client'), files);
  layOut(path.join(folder, 'uploads'), uploads);
  const front = servingFront({
    publicUrl: `https://${PUBLIC_HOST}`,
    uploadsFolder: path.join(folder, 'uploads'),
    clientFolder: path.join(folder, 'client'),
    trustedProxies: [],
    loopback: false,
    readiness: [],
    isStopping: () => false,
    count: (_request, _response, next) => { next(); },
    ...settings,
  });
  const listener = (request: IncomingMessage, response: ServerResponse): void => { front(request, response, () => { site(request, response); }); };
  const server = createServer(listener).on('checkContinue', listener);
  await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', resolve); });
  const address = server.address();
  const port = typeof address === 'object' && address !== null ? address.port : 0;
  return {
    port,
    folder,
    ask: (target, question) => ask(port, target, question),
    stop: async () => {
      server.closeAllConnections();
      await new Promise<void>((resolve) => { server.close(() => { resolve(); }); });
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

function layOut(folder: string, files: Readonly<Record<string, string | Uint8Array>>): void {
  mkdirSync(folder, { recursive: true });
  for (const [name, content] of Object.entries(files)) {
    mkdirSync(path.dirname(path.join(folder, name)), { recursive: true });
    writeFileSync(path.join(folder, name), content);
  }
}

function ask(port: number, target: string, { method = 'GET', headers = {}, body, chunked = false }: Question = {}): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const length = body === undefined || chunked ? {} : { 'Content-Length': Buffer.byteLength(body) };
    const sent = httpRequest({ host: '127.0.0.1', port, path: target, method, agent: false, headers: { Host: PUBLIC_HOST, ...length, ...headers } }, (response) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => { chunks.push(chunk); });
      response.on('error', reject);
      response.on('end', () => {
        const bytes = Buffer.concat(chunks);
        resolve({ status: response.statusCode ?? 0, headers: response.headers, bytes, text: bytes.toString() });
      });
    });
    sent.on('error', reject);
    if (body === undefined) {
      sent.end();
    } else if (chunked) {
      const bytes = Buffer.from(body);
      for (let at = 0; at < bytes.length; at += 65_536) sent.write(bytes.subarray(at, at + 65_536));
      sent.end();
    } else {
      sent.end(body);
    }
  });
}

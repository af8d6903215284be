/** The doors for what comes in pieces, videos and photos, behind the real front, over real connections that can be cut. */
import { createServer, request as httpRequest, type IncomingHttpHeaders } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Readable } from 'node:stream';
import { vi } from 'vitest';
import { limitBody } from '#server/web/front/body-limits.ts';
import type { Context } from '#server/context.ts';

export interface DoorAnswer {
  readonly status: number;
  readonly headers: IncomingHttpHeaders;
  readonly text: string;
}

export interface Sent {
  readonly method: string;
  readonly path?: string;
  readonly headers?: Readonly<Record<string, string>>;
  readonly body?: Uint8Array | Readable;
  /** Send so many bytes only, and cut the connection once `hasArrived`. */
  readonly cut?: { readonly after: number; hasArrived(): Promise<boolean> };
}

export interface UploadDoor {
  /** Who asks from now on. */
  ctx: Context;
  /** @returns null when the connection was cut. */
  send(sent: Sent): Promise<DoorAnswer | null>;
  stop(): Promise<void>;
}

type Answering = (ctx: Context, request: Request) => Promise<Response>;

/** A door as a process just started would have it: nothing is left in memory of the one before. */
export async function openVideoDoor(ctx: Context): Promise<UploadDoor> {
  vi.resetModules();
  return open(ctx, (await import('#server/web/video-uploads.ts')).answerVideoUpload);
}

export async function openPhotoDoor(ctx: Context): Promise<UploadDoor> {
  vi.resetModules();
  return open(ctx, (await import('#server/web/photo-uploads.ts')).answerPhotoUpload);
}

async function open(ctx: Context, answerUpload: Answering): Promise<UploadDoor> {
  const limit = limitBody();
  const server = createServer((request, response) => {
    limit(request, response, () => {
      const hasBody = request.method === 'POST' || request.method === 'PATCH';
      const asked = new Request(`http://127.0.0.1${request.url ?? '/'}`, {
        method: request.method ?? 'GET',
        headers: Object.entries(request.headers).flatMap(([name, value]): [string, string][] => (typeof value === 'string' ? [[name, value]] : [])),
        ...(hasBody && { body: Readable.toWeb(request) as ReadableStream, duplex: 'half' }),
      } as RequestInit);
      answerUpload(door.ctx, asked).then(
        async (answer) => {
          response.writeHead(answer.status, Object.fromEntries(answer.headers));
          response.end(Buffer.from(await answer.arrayBuffer()));
        },
        () => { response.writeHead(500).end(); },
      );
    });
  });
  await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', resolve); });
  const { port } = server.address() as AddressInfo;
  const door: UploadDoor = {
    ctx,
    send: (sent) => send(port, sent),
    stop: async () => {
      server.closeAllConnections();
      await new Promise<void>((resolve) => { server.close(() => { resolve(); }); });
    },
  };
  return door;
}

function send(port: number, { method, path = '/api/videos', headers = {}, body, cut }: Sent): Promise<DoorAnswer | null> {
  return new Promise((resolve, reject) => {
    const length = body instanceof Uint8Array ? { 'Content-Length': String(body.length) } : {};
    const asked = httpRequest({ host: '127.0.0.1', port, path, method, agent: false, headers: { 'Tus-Resumable': '1.0.0', ...length, ...headers } }, (response) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => { resolve({ status: response.statusCode ?? 0, headers: response.headers, text: Buffer.concat(chunks).toString() }); });
    });
    asked.on('error', (error) => { if (cut === undefined) reject(error); else resolve(null); });
    if (body === undefined) asked.end();
    else if (!(body instanceof Uint8Array)) body.pipe(asked);
    else if (cut === undefined) asked.end(body);
    else asked.write(body.subarray(0, cut.after), () => { void vi.waitUntil(cut.hasArrived, { timeout: 30_000 }).then(() => { asked.destroy(); resolve(null); }, reject); });
  });
}

const base64 = (words: string): string => Buffer.from(words).toString('base64');

/** The head of a request that begins an upload. */
export function beginning(lesson: string, byteCount: number | string, told: Readonly<Record<string, string>> = {}): Sent {
  return telling({ lesson, filename: 'rya.mp4', filetype: 'video/mp4', ...told }, byteCount);
}

export function beginningPhoto(at: { readonly series: string; readonly lesson: string }, byteCount: number): Sent {
  return { ...telling({ ...at, filename: 'warped-loom.jpg' }, byteCount), path: '/api/photos/pieces' };
}

function telling(metadata: Readonly<Record<string, string>>, byteCount: number | string): Sent {
  return { method: 'POST', headers: { 'Upload-Length': String(byteCount), 'Upload-Metadata': Object.entries(metadata).map(([name, value]) => `${name} ${base64(value)}`).join(',') } };
}

export function going(path: string, offset: number, body: Uint8Array, cut?: Sent['cut']): Sent {
  return { method: 'PATCH', path, headers: { 'Upload-Offset': String(offset), 'Content-Type': 'application/offset+octet-stream' }, body, ...(cut !== undefined && { cut }) };
}

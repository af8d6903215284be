/**
 * Files of people. The endpoint decides who may have one and answers with the file's key in an inner header; the front
 * streams it from the uploads folder, with ranges and at the client's pace. Another proxy can take this over unchanged.
 */
import { stat } from 'node:fs/promises';
import type { Stats } from 'node:fs';
import path from 'node:path';
import type { IncomingMessage, ServerResponse } from 'node:http';
import send from 'send';
import type { Handler } from '#server/web/front/handler.ts';
import { refuse } from '#server/web/front/refuse.ts';
import { gateOf } from '#server/web/front/response-gate.ts';
import { SEND_HEADER } from '#server/web/send-file.ts';

const KEY = /^[A-Za-z0-9_-][A-Za-z0-9._-]*(?:\/[A-Za-z0-9_-][A-Za-z0-9._-]*)*$/;
const FILE_POLICY = "sandbox; default-src 'none'";

/** True when `key` names a file below the uploads folder: plain segments, none of them hidden or `..`. */
export function isFileKey(key: string): boolean {
  return key.length <= 255 && KEY.test(key);
}

/** Streams the file an endpoint names. The endpoint's Content-Type, Cache-Control and other headers are kept. */
export function privateFile(uploadsFolder: string): Handler {
  const root = path.resolve(uploadsFolder);
  return (request, response, next) => {
    gateOf(response).beforeHead((head) => {
      const key = head.getHeader(SEND_HEADER);
      head.removeHeader(SEND_HEADER);
      if (typeof key !== 'string' || head.statusCode !== 200) return undefined;
      head.removeHeader('Content-Length');
      if (!head.hasHeader('content-security-policy')) head.setHeader('Content-Security-Policy', FILE_POLICY);
      // The writer's own body is empty; the file follows once the writer is done with the response.
      return { holdsHead: true, sink: { write: () => true, end: () => { void stream(request, response, root, key); } } };
    });
    next();
  };
}

async function stream(request: IncomingMessage, response: ServerResponse, root: string, key: string): Promise<void> {
  gateOf(response).release();
  const file = isFileKey(key) ? await fileAt(path.join(root, key)) : undefined;
  if (response.destroyed) return;
  if (file === undefined) {
    fail(request, response, 404, {});
    return;
  }
  if (!response.hasHeader('etag')) response.setHeader('ETag', strongTag(file));
  setRange(request, file.size);
  send(request, `/${key}`, { root, etag: false, cacheControl: false, dotfiles: 'deny', index: false })
    .on('error', (error: unknown) => {
      const { status, headers } = refusalOf(error);
      fail(request, response, status, headers);
    })
    .pipe(response);
}

/** Leaves `send` only such a Range header as it reads in the same way as RFC 9110; without one it sends the whole file. */
function setRange(request: IncomingMessage, size: number): void {
  // A weak tag may not vouch for the bytes of a part (section 13.1.5).
  const isVouchedFor = !String(request.headers['if-range'] ?? '').trimStart().startsWith('W/');
  const range = isVouchedFor ? singleRange(request.headers.range, size) : undefined;
  if (range === undefined) delete request.headers.range;
  else request.headers.range = range;
}

/**
 * The one range that `header` asks for, or undefined when it asks for several or for nothing that can be read.
 * A last part longer than the file is the whole file (section 14.1.2).
 */
export function singleRange(header: string | undefined, size: number): string | undefined {
  const asked = /^bytes=(?:(\d+)-(\d*)|-(\d+))$/i.exec(header ?? '');
  if (asked === null) return undefined;
  const [, first, last, suffix] = asked;
  if (suffix !== undefined) return `bytes=-${Math.min(Number(suffix), size)}`;
  if (last !== '' && Number(last) < Number(first)) return undefined;
  return `bytes=${first ?? ''}-${last ?? ''}`;
}

async function fileAt(name: string): Promise<Stats | undefined> {
  try {
    const found = await stat(name);
    return found.isFile() ? found : undefined;
  } catch {
    return undefined;
  }
}

/** Files are written once under a random key, so size and time tell one content from another. */
function strongTag(file: Stats): string {
  return `"${file.size.toString(36)}-${Math.trunc(file.mtimeMs).toString(36)}"`;
}

function refusalOf(error: unknown): { status: number; headers: Record<string, string> } {
  if (typeof error !== 'object' || error === null) return { status: 500, headers: {} };
  const status = 'status' in error && typeof error.status === 'number' ? error.status : 500;
  const range = 'headers' in error && typeof error.headers === 'object' && error.headers !== null && 'Content-Range' in error.headers ? error.headers['Content-Range'] : undefined;
  return { status, headers: typeof range === 'string' ? { 'Content-Range': range } : {} };
}

const SENTENCES: Readonly<Record<number, string>> = {
  404: 'This file is not here.',
  412: 'This file is not the one you asked about.',
  416: 'The file has no such part.',
};

function fail(request: IncomingMessage, response: ServerResponse, status: number, headers: Record<string, string>): void {
  if (response.headersSent) response.destroy();
  else refuse(request, response, status, SENTENCES[status] ?? 'This file could not be read.', headers);
}

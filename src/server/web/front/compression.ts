/**
 * Compresses what is made on the way: pages, JSON, drawings. Files of people and of the build never pass here
 * compressed: pictures and videos gain nothing, and the build's files were compressed once for all.
 */
import type { ServerResponse } from 'node:http';
import type { BrotliCompress, Gzip } from 'node:zlib';
import { constants, createBrotliCompress, createGzip } from 'node:zlib';
import { acceptedCoding, varyByEncoding } from '#server/web/front/accepted-encoding.ts';
import type { Coding } from '#server/web/front/accepted-encoding.ts';
import type { Handler } from '#server/web/front/handler.ts';
import type { BodySink, RawResponse } from '#server/web/front/response-gate.ts';
import { gateOf } from '#server/web/front/response-gate.ts';

const COMPRESSIBLE = /^(?:text\/(?!event-stream)|image\/svg\+xml|application\/(?:[a-z.+-]*\+)?(?:json|xml)\b|application\/(?:javascript|manifest))/i;
/** Below this a compressed body saves no packet. */
const SMALLEST_BYTES = 1_024;
/** A page that pauses while it is made shows what it has after so long. */
const FLUSH_AFTER_MS = 20;

/** Compresses the body of answers whose kind and size make it worth while. */
export const compression: Handler = (request, response, next) => {
  gateOf(response).beforeHead((head, raw, bodyTaken) => {
    if (bodyTaken || !isWorthIt(head)) return undefined;
    head.setHeader('Vary', varyByEncoding(head.getHeader('vary')));
    const coding = acceptedCoding(headerText(request.headers['accept-encoding']));
    if (coding === undefined || request.method === 'HEAD') return undefined;
    head.removeHeader('Content-Length');
    head.setHeader('Content-Encoding', coding);
    weakenTag(head);
    return { sink: compressingSink(coding, head, raw), holdsHead: false };
  });
  next();
};

function headerText(value: string | readonly string[] | undefined): string | undefined {
  return typeof value === 'string' || value === undefined ? value : value.join(',');
}

function isWorthIt(head: ServerResponse): boolean {
  if (head.statusCode === 204 || head.statusCode === 206 || head.statusCode === 304) return false;
  if (head.hasHeader('content-encoding') || head.hasHeader('content-range')) return false;
  if (String(head.getHeader('cache-control') ?? '').includes('no-transform')) return false;
  const length = head.getHeader('content-length');
  if (length !== undefined && Number(length) < SMALLEST_BYTES) return false;
  return COMPRESSIBLE.test(String(head.getHeader('content-type') ?? ''));
}

/** The compressed bytes are another representation: its tag may only say "means the same". */
function weakenTag(head: ServerResponse): void {
  const tag = head.getHeader('etag');
  if (typeof tag === 'string' && !tag.startsWith('W/')) head.setHeader('ETag', `W/${tag}`);
}

function compressor(coding: Coding): BrotliCompress | Gzip {
  if (coding === 'gzip') return createGzip({ level: 6 });
  return createBrotliCompress({ params: { [constants.BROTLI_PARAM_QUALITY]: 4 } });
}

function compressingSink(coding: Coding, response: ServerResponse, raw: RawResponse): BodySink {
  const stream = compressor(coding);
  let flushTimer: NodeJS.Timeout | undefined;
  stream.on('data', (chunk: Buffer) => {
    if (!raw.write(chunk)) stream.pause();
  });
  response.on('drain', () => { stream.resume(); });
  stream.on('end', raw.end);
  stream.on('error', () => { response.destroy(); });
  response.once('close', () => {
    clearTimeout(flushTimer);
    stream.destroy();
  });
  return {
    write: (chunk) => {
      clearTimeout(flushTimer);
      flushTimer = setTimeout(() => { stream.flush(); }, FLUSH_AFTER_MS);
      return stream.write(chunk);
    },
    end: () => {
      clearTimeout(flushTimer);
      stream.end();
    },
  };
}

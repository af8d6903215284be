/**
 * A gate on a response that somebody else writes: parts of the front see its head before it goes out, may send
 * the body through a stream of their own, or answer instead of the writer, who goes on unaware.
 *
 * Works for every writer that uses writeHead, write and end, which is all that Astro and `send` do.
 */
import type { OutgoingHttpHeader, OutgoingHttpHeaders, ServerResponse } from 'node:http';

type HeaderArgument = OutgoingHttpHeaders | OutgoingHttpHeader[];

/** Takes the body in place of the client. */
export interface BodySink {
  /** False when the writer should wait for `drain`. */
  readonly write: (chunk: Uint8Array) => boolean;
  readonly end: () => void;
}

/** The response's own methods, behind the gate. */
export interface RawResponse extends BodySink {
  readonly writeHead: (status: number) => void;
}

/**
 * Told of the head when all its headers are set (read and change them on the response) and none is sent.
 * A returned sink receives the body; with `holdsHead` the head is not sent either, and the sink calls `release`.
 * `bodyTaken`: a watcher before this one has the body already, so a head must not promise another form of it.
 */
export type HeadWatcher = (response: ServerResponse, raw: RawResponse, bodyTaken: boolean) => { sink: BodySink; holdsHead: boolean } | undefined;

export interface ResponseGate {
  /** Adds a watcher; watchers run in the order added, and the first one that returns a sink has the body. */
  beforeHead(watcher: HeadWatcher): void;
  /** Gives the response back its own methods: whatever is written from now on goes straight out. */
  release(): void;
  /** Shuts the writer out and returns the response's own methods, or undefined when an answer is already on its way. */
  seize(): RawResponse | undefined;
}

const gates = new WeakMap<ServerResponse, ResponseGate>();

/** The gate of `response`, put up at the first call. */
export function gateOf(response: ServerResponse): ResponseGate {
  let gate = gates.get(response);
  if (gate === undefined) {
    gate = putUpGate(response);
    gates.set(response, gate);
  }
  return gate;
}

function putUpGate(response: ServerResponse): ResponseGate {
  // eslint-disable-next-line @typescript-eslint/unbound-method -- always applied to the response
  const own = { writeHead: response.writeHead, write: response.write, end: response.end, flushHeaders: response.flushHeaders };
  const raw: RawResponse = {
    writeHead: (status) => { Reflect.apply(own.writeHead, response, [status]); },
    write: (chunk) => Boolean(Reflect.apply(own.write, response, [chunk])),
    end: () => { Reflect.apply(own.end, response, []); },
  };
  const watchers: HeadWatcher[] = [];
  let sink: BodySink = { write: raw.write, end: raw.end };
  let open = true;
  let released = false;
  let headDone = false;
  let bodyDone = false;

  const sendHead = (): void => {
    if (headDone) return;
    headDone = true;
    let held = false;
    let taken = false;
    for (const watcher of watchers) {
      const outcome = watcher(response, raw, taken);
      if (outcome === undefined || taken) continue;
      taken = true;
      sink = outcome.sink;
      held = outcome.holdsHead;
    }
    if (!held) raw.writeHead(response.statusCode);
  };

  response.writeHead = (status: number, reason?: string | HeaderArgument, headers?: HeaderArgument) => {
    if (!open || headDone) return response;
    response.statusCode = status;
    if (typeof reason === 'string') response.statusMessage = reason;
    setHeaders(response, typeof reason === 'string' ? headers : reason);
    sendHead();
    return response;
  };
  response.flushHeaders = () => {
    if (!open) return;
    sendHead();
  };
  response.write = (chunk: unknown, encoding?: unknown, callback?: unknown) => {
    const done = callbackAmong(encoding, callback);
    if (!open || bodyDone) {
      done?.();
      return true;
    }
    sendHead();
    const wantsMore = sink.write(bytesOf(chunk, encoding));
    if (done !== undefined) process.nextTick(done);
    return wantsMore;
  };
  response.end = (chunk?: unknown, encoding?: unknown, callback?: unknown) => {
    const done = callbackAmong(chunk, encoding, callback);
    if (!open || bodyDone) return response;
    if (done !== undefined) response.once('finish', done);
    // Known in full, the body needs no chunks on the wire.
    if (!headDone && !response.hasHeader('content-length') && isBody(chunk)) {
      response.setHeader('Content-Length', bytesOf(chunk, encoding).length);
    }
    sendHead();
    bodyDone = true;
    if (isBody(chunk)) sink.write(bytesOf(chunk, encoding));
    sink.end();
    return response;
  };

  return {
    beforeHead: (watcher) => { watchers.push(watcher); },
    release: () => {
      released = true;
      Object.assign(response, own);
    },
    seize: () => {
      if (released) return response.headersSent ? undefined : raw;
      if (!open || headDone) return undefined;
      open = false;
      return raw;
    },
  };
}

function setHeaders(response: ServerResponse, headers: HeaderArgument | undefined): void {
  if (headers === undefined) return;
  if (!Array.isArray(headers)) {
    for (const [name, value] of Object.entries(headers)) {
      if (value !== undefined) response.setHeader(name, value);
    }
    return;
  }
  // The flat form: name, value, name, value …
  for (let at = 0; at + 1 < headers.length; at += 2) {
    const value = headers[at + 1];
    if (value !== undefined) response.setHeader(String(headers[at]), value);
  }
}

function isBody(chunk: unknown): boolean {
  return chunk !== undefined && chunk !== null && typeof chunk !== 'function';
}

function bytesOf(chunk: unknown, encoding: unknown): Uint8Array {
  if (chunk instanceof Uint8Array) return chunk;
  return Buffer.from(String(chunk), typeof encoding === 'string' && Buffer.isEncoding(encoding) ? encoding : 'utf8');
}

function callbackAmong(...values: readonly unknown[]): (() => void) | undefined {
  for (const value of values) {
    if (typeof value === 'function') return () => { Reflect.apply(value, undefined, []); };
  }
  return undefined;
}

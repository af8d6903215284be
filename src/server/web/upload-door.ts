/**
 * A door for files that come in pieces: tus 1.0 (creation, expiration, termination). What was promised stands in a row,
 * how much has come is the length of the file; so any web process, also one started anew, goes on where the last byte
 * lies. The address of an upload is no key: every request is asked who sends it.
 */
import { AsyncLocalStorage } from 'node:async_hooks';
import { FileStore } from '@tus/file-store';
import { Server } from '@tus/server';
import type { Context } from '#server/context.ts';
import { newPublicId, PUBLIC_ID } from '#server/db/public-id.ts';
import { uploadLocker, type UploadTable } from '#server/db/upload-lock.ts';
import { AppError } from '#server/errors.ts';
import { knownError } from '#server/web/respond.ts';

/** An upload as its row tells of it. */
export interface UploadRow {
  readonly ownerId: number;
  readonly byteCount: number;
  readonly begunAt: Date;
  /** Its bytes were taken over: nothing more comes, whoever asks again. */
  readonly isTaken: boolean;
}

/** What an upload says of itself before its first byte. */
export interface Promised {
  readonly byteCount: number;
  readonly metadata: Readonly<Record<string, string | null>>;
}

export interface DoorFor {
  readonly path: string;
  readonly table: UploadTable;
  /** Of files in the making (`MediaStore.temporaryFolder`). */
  readonly folder: string;
  readonly hours: number;
  rowOf(publicId: string): Promise<UploadRow | null>;
  /** Judges what was promised, its size too, and makes the row. What it throws refuses the upload. */
  begin(ctx: Context, publicId: string, promised: Promised): Promise<void>;
  /** All bytes are here. Comes again when the answer was lost. What it throws refuses the upload. */
  take(ctx: Context, publicId: string): Promise<void>;
  /** Its sender took it back; its bytes are gone already. */
  forget(publicId: string): Promise<void>;
}

const METHODS = ['POST', 'HEAD', 'PATCH', 'DELETE', 'OPTIONS'];
const asking = new AsyncLocalStorage<Context>();

/** @returns what answers one request of a tus client. */
export function openDoor(door: DoorFor): (ctx: Context, request: Request) => Promise<Response> {
  const servers = new Map<string, Server>();
  return async (ctx, request) => {
    // Nothing is read back here, and other methods are none of ours.
    if (!METHODS.includes(request.method)) return new Response(null, { status: 405, headers: { Allow: METHODS.join(', ') } });
    const folder = await ctx.services.media.temporaryFolder(door.folder);
    const server = servers.get(folder) ?? makeServer(door, folder);
    servers.set(folder, server);
    const answer = await asking.run(ctx, async () => (await wholeAlready(door, ctx, request)) ?? takenIfWhole(door, ctx, request, await server.handleWeb(request)));
    answer.headers.set('Cache-Control', 'no-store');
    return answer;
  };
}

const idIn = ({ url }: Request): string => new URL(url).pathname.split('/').at(-1) ?? '';

/** Who asks how far an upload is whose bytes were taken over hears that all of it came. */
async function wholeAlready(door: DoorFor, ctx: Context, request: Request): Promise<Response | null> {
  if (request.method !== 'HEAD' || !PUBLIC_ID.test(idIn(request))) return null;
  const row = await door.rowOf(idIn(request));
  if (row?.isTaken !== true || row.ownerId !== ctx.actor?.userId) return null;
  return new Response(null, { headers: { 'Tus-Resumable': '1.0.0', 'Upload-Offset': String(row.byteCount), 'Upload-Length': String(row.byteCount) } });
}

/** A server that died between the last byte and the note of it left a whole file that nobody sends on; its sender asks how far it is. */
async function takenIfWhole(door: DoorFor, ctx: Context, request: Request, answer: Response): Promise<Response> {
  const length = answer.headers.get('Upload-Length');
  if (request.method !== 'HEAD' || length === null || answer.headers.get('Upload-Offset') !== length) return answer;
  try {
    await door.take(ctx, idIn(request));
    return answer;
  } catch (error) {
    const { status_code: status, body } = asProblem(error);
    return new Response(body, { status });
  }
}

function makeServer(door: DoorFor, folder: string): Server {
  return new Server({
    path: door.path,
    datastore: new FileStore({
      directory: folder,
      expirationPeriodInMilliseconds: door.hours * 3_600_000,
      configstore: {
        get: async (id) => {
          const row = await door.rowOf(id);
          return row === null ? undefined : { id, size: row.byteCount, offset: 0, creation_date: row.begunAt.toISOString(), sizeIsDeferred: false, metadata: undefined, storage: undefined };
        },
        // The row is written when the upload is begun, before there is a file.
        set: async () => undefined,
        delete: (id) => door.forget(id),
      },
    }),
    locker: uploadLocker(door.table),
    relativeLocation: true,
    respectForwardedHeaders: false,
    allowedOrigins: () => false,
    disableTerminationForFinishedUploads: true,
    namingFunction: () => newPublicId(),
    getFileIdFromRequest: (_request, last) => (last !== undefined && PUBLIC_ID.test(last) ? last : undefined),
    onIncomingRequest: ({ method }, id) => requireOwner(door, method, id),
    onUploadCreate: async ({ headers }, upload) => {
      if (headers.get('upload-defer-length') !== null) throw new AppError('VALIDATION', { says: 'Say how long the file is before it comes.' });
      await door.begin(current(), upload.id, { byteCount: upload.size ?? 0, metadata: upload.metadata ?? {} });
      return {};
    },
    onUploadFinish: async (_request, { id }) => {
      await door.take(current(), id);
      return {};
    },
    onResponseError: (_request, error) => (error instanceof Error && !('status_code' in error) ? asProblem(error) : undefined),
  });
}

/** An upload begun by somebody else looks like none. */
async function requireOwner(door: DoorFor, method: string, id: string): Promise<void> {
  const { actor } = current();
  if (actor === null) throw new AppError('UNAUTHENTICATED');
  if (method === 'POST') return;
  const row = await door.rowOf(id);
  if (row?.ownerId !== actor.userId) throw new AppError('NOT_FOUND');
}

function current(): Context {
  const ctx = asking.getStore();
  if (ctx === undefined) throw new RangeError('An upload is asked for outside a request');
  return ctx;
}

/** Refusals of ours as problems (RFC 9457); those of the protocol keep their own words. */
function asProblem(error: unknown): { status_code: number; body: string } {
  const { status, says, code } = knownError(error);
  if (code === 'BUG') console.error(JSON.stringify({ level: 'error', requestId: current().requestId, message: error instanceof Error ? error.stack ?? error.message : String(error) }));
  return { status_code: status, body: JSON.stringify({ type: 'about:blank', title: says, status, code }) };
}

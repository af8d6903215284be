/**
 * The door for videos: tus 1.0 (creation, expiration, termination). What was promised stands in a row, how much has come
 * is the length of the file; so any web process, also one started anew, goes on where the last byte lies.
 * The address of an upload is no key: every request is asked who sends it.
 */
import { AsyncLocalStorage } from 'node:async_hooks';
import { FileStore } from '@tus/file-store';
import { Server } from '@tus/server';
import { BeginVideo } from '#contracts/video.ts';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import type { Context } from '#server/context.ts';
import { newPublicId, PUBLIC_ID } from '#server/db/public-id.ts';
import { uploadLocker } from '#server/db/upload-lock.ts';
import { AppError } from '#server/errors.ts';
import { VIDEO_UPLOADS_FOLDER } from '#server/media/video/folders.ts';
import { uploadOf } from '#server/queries/videos/upload-of.ts';
import { beginVideoUpload } from '#server/use-cases/videos/begin-upload.ts';
import { stopVideoUpload } from '#server/use-cases/videos/stop-upload.ts';
import { takeVideoUpload } from '#server/use-cases/videos/take-upload.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { knownError } from '#server/web/respond.ts';

export const VIDEO_UPLOADS_PATH = '/api/videos';

const asking = new AsyncLocalStorage<Context>();
const doors = new Map<string, Server>();

/** Answers one request of a tus client. */
export async function answerVideoUpload(ctx: Context, request: Request): Promise<Response> {
  // Nothing is read back here, and other methods are none of ours.
  if (!['POST', 'HEAD', 'PATCH', 'DELETE', 'OPTIONS'].includes(request.method)) return new Response(null, { status: 405, headers: { Allow: 'POST, HEAD, PATCH, DELETE, OPTIONS' } });
  const door = await doorTo(await ctx.services.media.temporaryFolder(VIDEO_UPLOADS_FOLDER));
  const answer = await asking.run(ctx, () => door.handleWeb(request));
  await takeIfWhole(request, answer);
  answer.headers.set('Cache-Control', 'no-store');
  return answer;
}

/** A server that died between the last byte and the note of it left a whole file that nobody sends on; its sender asks how far it is. */
async function takeIfWhole({ method, url }: Request, { headers }: Response): Promise<void> {
  const length = headers.get('Upload-Length');
  if (method === 'HEAD' && length !== null && headers.get('Upload-Offset') === length) await takeVideoUpload(new URL(url).pathname.split('/').at(-1) ?? '');
}

async function doorTo(folder: string): Promise<Server> {
  let door = doors.get(folder);
  if (door === undefined) {
    door = makeDoor(folder);
    doors.set(folder, door);
  }
  return door;
}

function makeDoor(folder: string): Server {
  return new Server({
    path: VIDEO_UPLOADS_PATH,
    datastore: new FileStore({
      directory: folder,
      expirationPeriodInMilliseconds: VIDEO_LIMITS.uploadHours * 3_600_000,
      configstore: {
        get: async (id) => {
          const upload = await uploadOf(id);
          return upload === null ? undefined : { id, size: upload.byteCount, offset: 0, creation_date: upload.begunAt.toISOString(), sizeIsDeferred: false, metadata: undefined, storage: undefined };
        },
        // The row is written when the upload is begun, before there is a file.
        set: async () => undefined,
        delete: stopVideoUpload,
      },
    }),
    locker: uploadLocker(),
    maxSize: VIDEO_LIMITS.maxBytes,
    relativeLocation: true,
    respectForwardedHeaders: false,
    allowedOrigins: () => false,
    disableTerminationForFinishedUploads: true,
    namingFunction: () => newPublicId(),
    getFileIdFromRequest: (_request, last) => (last !== undefined && PUBLIC_ID.test(last) ? last : undefined),
    onIncomingRequest: requireOwner,
    onUploadCreate: async ({ headers }, upload) => {
      const ctx = current();
      await countUse(RATE_RULES.video, ctx.actor?.publicId ?? '');
      if (headers.get('upload-defer-length') !== null) throw new AppError('VALIDATION', { says: 'Say how long the file is before it comes.' });
      const { metadata = {} } = upload;
      const said = BeginVideo.safeParse({ lesson: metadata['lesson'], name: metadata['name'], fileName: metadata['filename'], fileType: metadata['filetype'] ?? '', byteCount: upload.size ?? 0 });
      if (!said.success) throw new AppError('VALIDATION', { says: 'This upload does not say what it is for.' });
      await beginVideoUpload(ctx, upload.id, said.data);
      return {};
    },
    onUploadFinish: async (_request, { id }) => {
      await takeVideoUpload(id);
      return {};
    },
    onResponseError: (_request, error) => asProblem(error),
  });
}

/** An upload begun by somebody else looks like none. */
async function requireOwner({ method }: Request, id: string): Promise<void> {
  const { actor } = current();
  if (actor === null) throw new AppError('UNAUTHENTICATED');
  if (method === 'POST') return;
  const upload = await uploadOf(id);
  if (upload?.ownerId !== actor.userId) throw new AppError('NOT_FOUND');
}

function current(): Context {
  const ctx = asking.getStore();
  if (ctx === undefined) throw new RangeError('A video is asked for outside a request');
  return ctx;
}

/** Refusals of ours as problems (RFC 9457); those of the protocol keep their own words. */
function asProblem(error: unknown): { status_code: number; body: string } | undefined {
  if (!(error instanceof Error) || 'status_code' in error) return undefined;
  const { status, says, code, message } = knownError(error);
  if (code === 'BUG') console.error(JSON.stringify({ level: 'error', requestId: current().requestId, message: error.stack ?? message }));
  return { status_code: status, body: JSON.stringify({ type: 'about:blank', title: says, status, code }) };
}

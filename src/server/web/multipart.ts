/**
 * A form with a file or some, read as a stream to disk: never into memory, never more than it may hold. Whatever was written
 * goes when the work is done, whether it went well or not.
 */
import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { basename, dirname } from 'node:path';
import { Readable } from 'node:stream';
import type { ReadableStream as NodeReadableStream } from 'node:stream/web';
import multer, { MulterError } from 'multer';
import { AppError } from '#server/errors.ts';
import type { MediaStore } from '#server/media/store.ts';

export interface ReceivedFile {
  readonly path: string;
  readonly originalName: string;
  readonly byteCount: number;
  /** As the sender says; a hint only. */
  readonly contentType: string;
}

export interface ReceivedForm {
  /** Those that came before the file, when it was not taken. */
  readonly fields: Readonly<Record<string, string>>;
  readonly file: ReceivedFile | null;
  /** All of them, `file` first; empty when one was not taken. */
  readonly files: readonly ReceivedFile[];
  /** Why the file was not taken; null when it was, or when there was none. */
  readonly fault: AppError | null;
}

export interface MultipartLimits {
  /** Name of the file field. */
  readonly field: string;
  readonly maxBytes: number;
  /** The sentence when the file is larger. */
  readonly tooLargeSays: string;
  /** How many files, and the sentence when there are more; without it one. */
  readonly most?: { readonly files: number; readonly says: string };
}

const FIELDS = { fields: 20, fieldSize: 16 * 1_024, fieldNameSize: 100, headerPairs: 50 } as const;

/**
 * Hands the form to `work`, then removes the files.
 * @throws VALIDATION for what is no such form; what `work` throws.
 */
export async function withMultipart<T>(request: Request, store: MediaStore, limits: MultipartLimits, work: (form: ReceivedForm) => Promise<T>): Promise<T> {
  const path = await store.temporaryPath(`upload-${randomUUID()}`);
  const paths = Array.from({ length: limits.most?.files ?? 1 }, (_, index) => `${path}-${index + 1}`);
  try {
    return await work(await receive(request, paths, limits));
  } finally {
    await Promise.all(paths.map((one) => rm(one, { force: true })));
  }
}

/** What multer reads of a request: a stream with headers. */
type MulterRequest = Parameters<ReturnType<ReturnType<typeof multer>['single']>>[0];

async function receive(request: Request, paths: readonly string[], limits: MultipartLimits): Promise<ReceivedForm> {
  if (request.body === null || !(request.headers.get('content-type') ?? '').startsWith('multipart/form-data')) {
    throw new AppError('VALIDATION', { says: 'No file came with this form. Choose one and send it again.' });
  }
  const names = paths.map((path) => basename(path));
  const upload = multer({
    storage: multer.diskStorage({ destination: dirname(paths[0] ?? ''), filename: (_request, _file, named) => { named(null, names.shift() ?? ''); } }),
    limits: { fileSize: limits.maxBytes, files: paths.length, parts: FIELDS.fields + paths.length, ...FIELDS },
    defParamCharset: 'utf8',
  }).array(limits.field, paths.length);
  const source = Object.assign(Readable.fromWeb(request.body as NodeReadableStream), {
    headers: Object.fromEntries(request.headers),
    method: request.method,
  }) as unknown as MulterRequest;
  const fault = await new Promise<void>((resolve, reject) => {
    source.once('error', reject);
    upload(source, {} as Parameters<typeof upload>[1], (error?: unknown) => {
      if (error === undefined || error === null) resolve();
      else reject(error instanceof Error ? error : new Error('The upload could not be read.', { cause: error }));
    });
  }).then(() => null, (error: unknown) => asAppError(error, limits));
  const taken: unknown = source.files;
  const files = fault !== null || !Array.isArray(taken) ? [] : (taken as Express.Multer.File[]).map(({ path, originalname, size, mimetype }) => ({ path, originalName: originalname, byteCount: size, contentType: mimetype }));
  const body: unknown = source.body;
  const fields = Object.fromEntries(Object.entries(body ?? {}).filter((entry): entry is [string, string] => typeof entry[1] === 'string'));
  return { fields, fault, file: files[0] ?? null, files };
}

function asAppError(error: unknown, limits: MultipartLimits): AppError {
  if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') return new AppError('TOO_LARGE', { says: limits.tooLargeSays });
  if (error instanceof MulterError && ['LIMIT_FILE_COUNT', 'LIMIT_UNEXPECTED_FILE'].includes(error.code) && limits.most !== undefined) return new AppError('VALIDATION', { says: limits.most.says });
  return new AppError('VALIDATION', { says: 'The file did not arrive whole. Send it again.', cause: error });
}

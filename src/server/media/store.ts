/**
 * The only door to people's files: put, open, remove. Names of files ("keys") are ours, never a person's words.
 * The disk is behind it here; an object store can stand there without its callers noticing.
 */
import { createReadStream } from 'node:fs';
import { mkdir, rename, rm, stat, statfs } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { Readable } from 'node:stream';
import { AppError } from '#server/errors.ts';

export interface MediaStore {
  /** Moves a finished temporary file to its place. The two must be on one file system, so that nobody ever sees half a file. */
  put(key: string, temporaryPath: string): Promise<void>;
  open(key: string, range?: { start: number; end: number }): Readable;
  byteCount(key: string): Promise<number | null>;
  remove(key: string): Promise<void>;
  /** A fresh path for a file in the making. */
  temporaryPath(name: string): Promise<string>;
  /** The folder in which files in the making of one kind lie, made when it is missing. */
  temporaryFolder(kind: string): Promise<string>;
  /** Throws UNAVAILABLE when the disk is too full to take `byteCount` more. */
  requireRoom(byteCount?: number): Promise<void>;
}

const KEY = /^[a-z0-9]+(?:\/[a-z0-9][a-z0-9.-]*)+$/;
const LEAST_FREE_BYTES = 1_000_000_000;
const LEAST_FREE_SHARE = 0.02;

/** Keeps files below `folder`, by their keys. */
export class DiskMediaStore implements MediaStore {
  readonly #folder: string;

  constructor(folder: string) {
    this.#folder = folder;
  }

  pathOf(key: string): string {
    if (!KEY.test(key) || key.includes('..')) throw new RangeError(`not a media key: ${key}`);
    return join(this.#folder, key);
  }

  async put(key: string, temporaryPath: string): Promise<void> {
    const path = this.pathOf(key);
    await mkdir(dirname(path), { recursive: true });
    await rename(temporaryPath, path);
  }

  open(key: string, range?: { start: number; end: number }): Readable {
    return createReadStream(this.pathOf(key), range);
  }

  async byteCount(key: string): Promise<number | null> {
    return stat(this.pathOf(key)).then(({ size }) => size, () => null);
  }

  async remove(key: string): Promise<void> {
    await rm(this.pathOf(key), { force: true });
  }

  async temporaryPath(name: string): Promise<string> {
    return join(await this.temporaryFolder(''), name);
  }

  async temporaryFolder(kind: string): Promise<string> {
    const folder = join(this.#folder, 'temporary', kind);
    await mkdir(folder, { recursive: true });
    return folder;
  }

  async requireRoom(byteCount = 0): Promise<void> {
    await mkdir(this.#folder, { recursive: true });
    const { bavail, blocks, bsize } = await statfs(this.#folder);
    const free = bavail * bsize - byteCount;
    if (free < LEAST_FREE_BYTES || free < blocks * bsize * LEAST_FREE_SHARE) {
      throw new AppError('UNAVAILABLE', { says: 'There is no room for more files just now. Nothing of yours is lost; try again in an hour.', retryAfterSeconds: 3_600 });
    }
  }
}

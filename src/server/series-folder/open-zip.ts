/**
 * Opens a zip from outside. Its directory is judged before anything is unpacked; while a file is unpacked its bytes are
 * counted against what the directory said, and its checksum at the end.
 */
import { createWriteStream } from 'node:fs';
import { rm, stat } from 'node:fs/promises';
import { Transform, type Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { crc32 } from 'node:zlib';
import yauzl, { type Entry, type ZipFile } from 'yauzl';
import { judgeEntries, type FolderFault, type ZipEntryFacts } from '#core/series-folder/judge-entries.ts';
import { FOLDER_LIMITS } from '#core/series-folder/limits.ts';
import { AppError } from '#server/errors.ts';

export interface OpenFolder {
  /** Names of the files in it. */
  readonly names: readonly string[];
  /** @returns null when there is no such file. @throws VALIDATION when it is damaged or no UTF-8. */
  text(name: string): Promise<string | null>;
  /** Unpacks a file to `path`; its length, or null when there is no such file. */
  copy(name: string, path: string): Promise<number | null>;
}

const NO_ZIP = 'This is no zip we can read. Take the one that Fellmark made, or make the zip anew.';

/**
 * Hands the judged zip at `path` to `work` and closes it.
 * @throws VALIDATION with a sentence for each file that stands in the way.
 */
export async function withZip<T>(path: string, work: (folder: OpenFolder) => Promise<T>): Promise<T> {
  const { size } = await stat(path);
  // Names stay bytes: the package would mend some of them, and here each is judged as it is.
  const zip = await yauzl.openPromise(path, { lazyEntries: true, autoClose: false, decodeStrings: false, validateEntrySizes: true }).catch(notAZip);
  try {
    const entries = await readDirectory(zip);
    const faults = judgeEntries([...entries].map(([name, entry]) => factsOf(name, entry)), size);
    if (faults.length > 0) throw refused(faults);
    const byName = new Map(entries.filter(([name]) => !name.endsWith('/')));
    return await work({
      names: [...byName.keys()],
      text: (name) => readText(zip, name, byName.get(name)),
      copy: (name, to) => copyTo(zip, name, byName.get(name), to),
    });
  } finally {
    zip.close();
  }
}

export function refused(faults: readonly FolderFault[]): AppError {
  const fields: Record<string, string> = {};
  for (const { file, says } of faults) fields[file] = fields[file] === undefined ? says : `${fields[file]} ${says}`;
  return new AppError('VALIDATION', { says: 'This folder did not come in. Nothing of it was kept.', fields });
}

async function readDirectory(zip: ZipFile): Promise<[string, Entry][]> {
  if (zip.entryCount > FOLDER_LIMITS.maxEntries) throw refused([{ file: 'zip', says: `This zip holds more than ${FOLDER_LIMITS.maxEntries} files. A series has fewer.` }]);
  const entries: [string, Entry][] = [];
  try {
    // Latin letters stand for bytes one by one, so two names are the same only when their bytes are.
    for await (const entry of zip.eachEntry()) entries.push([entry.fileNameRaw.toString('latin1'), entry]);
  } catch (error) {
    notAZip(error);
  }
  return entries;
}

const LOCAL_HEADER_BYTES = 30;
const MADE_ON_UNIX = 3;

function factsOf(name: string, entry: Entry): ZipEntryFacts {
  return {
    name,
    isEncrypted: entry.isEncrypted(),
    method: entry.compressionMethod,
    unixMode: entry.versionMadeBy >>> 8 === MADE_ON_UNIX ? entry.externalFileAttributes >>> 16 : 0,
    byteCount: entry.uncompressedSize,
    packedByteCount: entry.compressedSize,
    offset: entry.relativeOffsetOfLocalHeader,
    spanBytes: LOCAL_HEADER_BYTES + entry.fileNameRaw.length + entry.compressedSize,
  };
}

async function readText(zip: ZipFile, name: string, entry: Entry | undefined): Promise<string | null> {
  if (entry === undefined) return null;
  const chunks: Buffer[] = [];
  await unpack(zip, name, entry, async (source) => {
    for await (const chunk of source as AsyncIterable<Buffer>) chunks.push(chunk);
  });
  try {
    // A mark of byte order is part of the text, as everything else.
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(Buffer.concat(chunks));
  } catch {
    throw refused([{ file: name, says: 'This file is not written in UTF-8. Save it as UTF-8 and make the zip anew.' }]);
  }
}

async function copyTo(zip: ZipFile, name: string, entry: Entry | undefined, path: string): Promise<number | null> {
  if (entry === undefined) return null;
  try {
    await unpack(zip, name, entry, (source) => pipeline(source, createWriteStream(path, { flags: 'wx' })));
    return entry.uncompressedSize;
  } catch (error) {
    await rm(path, { force: true });
    throw error;
  }
}

async function unpack(zip: ZipFile, name: string, entry: Entry, take: (source: Readable) => Promise<void>): Promise<void> {
  let seen = 0;
  let sum = 0;
  const counted = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      seen += chunk.length;
      sum = crc32(chunk, sum);
      done(seen > entry.uncompressedSize ? new Error('more bytes than the directory said') : null, chunk);
    },
  });
  try {
    const source = await zip.openReadStreamPromise(entry);
    await Promise.all([pipeline(source, counted), take(counted)]);
  } catch (error) {
    // The disk's own trouble is not the zip's.
    if (error instanceof Error && 'code' in error && typeof error.code === 'string' && /^E[A-Z]+$/.test(error.code)) throw error;
    throw damaged(name, error);
  }
  if (seen !== entry.uncompressedSize || sum !== entry.crc32) throw damaged(name);
}

function damaged(name: string, cause?: unknown): AppError {
  return new AppError('VALIDATION', { says: 'This folder did not come in. Nothing of it was kept.', fields: { [name]: 'This file is damaged in the zip. Make the zip anew.' }, cause });
}

function notAZip(cause: unknown): never {
  throw new AppError('VALIDATION', { says: 'This folder did not come in. Nothing of it was kept.', fields: { zip: NO_ZIP }, cause });
}

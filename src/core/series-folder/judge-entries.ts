/**
 * Whether a zip may be opened as a series folder, judged by what its directory claims, before a byte of it is unpacked.
 * Names are compared with the few shapes a series folder knows, so a way out of the folder, a name of a device and two
 * names that some disks take for one (case, composed letters) are no names of its own.
 */
import { sizeWords } from '#core/video/limits.ts';
import { FOLDER_LIMITS, kindOfName, mostBytesOf } from './limits.ts';

/** One line of a zip's directory (PKWARE APPNOTE 4.3.12). */
export interface ZipEntryFacts {
  /** As it stands there, sign for sign. */
  readonly name: string;
  readonly isEncrypted: boolean;
  /** 0 stored, 8 deflated. */
  readonly method: number;
  /** Upper half of the external attributes when they were made on Unix, else 0. */
  readonly unixMode: number;
  readonly byteCount: number;
  readonly packedByteCount: number;
  /** Where its own header begins in the zip, and the least it takes up there with its bytes. */
  readonly offset: number;
  readonly spanBytes: number;
}

export interface FolderFault {
  /** A file's name made fit to be shown; `zip` for the whole. */
  readonly file: string;
  readonly says: string;
}

const MOST_FAULTS = 20;
const FILE_TYPE = 0o170000;
const REGULAR = 0o100000;
const DIRECTORY = 0o040000;

/** Everything that stands in the way; empty when it may be opened. `zipBytes` is the size of the zip itself. */
export function judgeEntries(entries: readonly ZipEntryFacts[], zipBytes: number): FolderFault[] {
  if (entries.length > FOLDER_LIMITS.maxEntries) return [whole(`This zip holds more than ${FOLDER_LIMITS.maxEntries} files. A series has fewer.`)];
  const seen = new Set<string>();
  const faults = entries.flatMap((entry) => {
    const says = entryFault(entry) ?? (seen.has(entry.name) ? 'This name is in the zip twice.' : null);
    seen.add(entry.name);
    return says === null ? [] : [{ file: shownName(entry.name), says }];
  });
  const total = entries.reduce((sum, { byteCount }) => sum + byteCount, 0);
  if (total > FOLDER_LIMITS.maxBytes) faults.push(whole(`Unpacked this would be ${sizeWords(total)}. At most ${sizeWords(FOLDER_LIMITS.maxBytes)} work; send films one by one, in their parts.`));
  if (overlaps(entries, zipBytes)) faults.push(whole('Files in this zip lie over each other. Make the zip anew.'));
  if (!seen.has('series.yaml')) faults.push(whole('There is no series.yaml at the top of this zip. Take a zip that Fellmark made, or zip what is in the folder and not the folder itself.'));
  return faults.slice(0, MOST_FAULTS);
}

function entryFault({ name, isEncrypted, method, unixMode, byteCount, packedByteCount }: ZipEntryFacts): string | null {
  const nameSays = nameFault(name);
  if (nameSays !== null) return nameSays;
  const kind = kindOfName(name);
  if (kind === null) return 'A series folder has no file of this name or kind. Take it out of the zip.';
  const type = unixMode & FILE_TYPE;
  if (type !== 0 && type !== (kind === 'folder' ? DIRECTORY : REGULAR)) return 'This is no plain file but a link or a device.';
  if (isEncrypted) return 'This file is locked with a password. Make the zip without one.';
  if (method !== 0 && method !== 8) return 'This file is packed in a way we do not read. Make the zip anew with your computer’s own tools.';
  if (kind === 'folder') return byteCount > 0 ? 'This is named like a folder and has bytes like a file.' : null;
  if (byteCount > mostBytesOf(kind)) return `Unpacked this file would be ${fineSize(byteCount)}. At most ${fineSize(mostBytesOf(kind))} work.`;
  if (method === 0 && byteCount !== packedByteCount) return 'This file says two different lengths of itself.';
  const isBomb = byteCount > FOLDER_LIMITS.ratioFromBytes && byteCount > packedByteCount * FOLDER_LIMITS.maxRatio;
  return isBomb ? 'This file would grow more than a hundredfold when unpacked.' : null;
}

function nameFault(name: string): string | null {
  if (name.includes('\0')) return 'This name has a sign in it that no name has.';
  if (name.includes('\\') || name.startsWith('/') || /^[a-z]:/i.test(name) || name.split('/').includes('..')) return 'This name leads out of the folder.';
  if (/\.(?:zip|jar|gz|tgz|bz2|xz|7z|rar|tar)$/i.test(name)) return 'This is a packed file within the zip. Put in what it holds.';
  return null;
}

/** Texts are small: megabytes would not tell one from another. */
function fineSize(bytes: number): string {
  return bytes < 10e6 ? `${Math.ceil(bytes / 1_000).toLocaleString('en-GB')}\u00a0kB` : sizeWords(bytes);
}

/** Sorted by place, each has to begin where the one before it has ended. */
function overlaps(entries: readonly ZipEntryFacts[], zipBytes: number): boolean {
  const sorted = [...entries].sort((a, b) => a.offset - b.offset);
  return sorted.some(({ offset, spanBytes }, index) => offset + spanBytes > (sorted[index + 1]?.offset ?? zipBytes));
}

function whole(says: string): FolderFault {
  return { file: 'zip', says };
}

/** Without signs that turn or hide what stands beside them. */
export function shownName(name: string): string {
  const clean = name.replace(/[\p{C}\u2028\u2029]/gu, '�');
  return clean.length > 120 ? `${clean.slice(0, 120)}…` : clean;
}

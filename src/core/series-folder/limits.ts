/** What a series folder may hold, in one place: the page says it, the door counts by it, the reader of the zip judges by it. */
const MIB = 1_048_576;

export const FOLDER_LIMITS = {
  /** The whole zip, as it is sent. Longer films are sent one by one, in their parts. */
  maxZipBytes: 500 * MIB,
  maxEntries: 500,
  /** All files together, unpacked. */
  maxBytes: 600 * MIB,
  /** A text, unpacked: lesson, piece, list or captions. */
  maxTextBytes: MIB,
  /** The list, whose reader is the slowest: half a megabyte of the worst takes three seconds, and the longest series has a tenth of that. */
  maxListBytes: MIB / 2,
  maxPictureBytes: 25_000_000,
  /** Unpacked to packed; words come to ten at the most. Counted for files large enough to do harm. */
  maxRatio: 100,
  ratioFromBytes: 100_000,
} as const;

/** The kinds of files in a series folder, by the shapes of their names. Everything else is refused. */
const KINDS = {
  list: /^series\.yaml$/,
  piece: /^piece\.json$/,
  lesson: /^[0-9]{2}-[a-z0-9-]{1,80}\.mdx$/,
  captions: /^videos\/[0-9]{2}-[a-z0-9-]{1,64}\.vtt$/,
  film: /^videos\/[0-9]{2}-[a-z0-9-]{1,64}\.(?:mp4|m4v|mov|mkv|webm)$/,
  picture: /^pictures\/[0-9]{2}-[a-z0-9-]{1,64}\.(?:webp|jpg|png)$/,
} as const;
export type FolderFileKind = keyof typeof KINDS;

const FOLDERS = /^(?:videos|pictures)\/$/;

/** What a name promises; `folder` for the two folders themselves, null when it is none of a series folder. */
export function kindOfName(name: string): FolderFileKind | 'folder' | null {
  if (FOLDERS.test(name)) return 'folder';
  for (const [kind, shape] of Object.entries(KINDS)) if (shape.test(name)) return kind as FolderFileKind;
  return null;
}

/** The most bytes a file of a kind may have, unpacked. */
export function mostBytesOf(kind: FolderFileKind): number {
  if (kind === 'film') return FOLDER_LIMITS.maxBytes;
  if (kind === 'list') return FOLDER_LIMITS.maxListBytes;
  return kind === 'picture' ? FOLDER_LIMITS.maxPictureBytes : FOLDER_LIMITS.maxTextBytes;
}

import { SeriesFile } from '#contracts/series-folder.ts';
import { LONGEST_DRAFT } from '#contracts/workroom.ts';
import type { Piece } from '#core/craft/crafts.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { FolderFault } from '#core/series-folder/judge-entries.ts';
import { nestsTooDeep } from '#core/series-folder/nests-too-deep.ts';
import { instantOfWall } from '#core/timetable/opening.ts';
import { readLessonText } from '#server/lesson-text/parse-pool.ts';
import type { ParseResult } from '#server/lesson-text/serve-parses.ts';
import { listFromYaml } from '#core/series-folder/list-as-yaml.ts';
import { refused, type OpenFolder } from '#server/series-folder/open-zip.ts';

/** Reads one file of the folder as text; null when there is none. */
export type ReadFile = (name: string) => Promise<string | null>;

export interface CheckedFolder {
  readonly file: SeriesFile;
  readonly piece: Piece | null;
  readonly texts: readonly { readonly source: string; readonly reading: ParseResult }[];
  /** What may come into the workroom as it is, and has to be mended before it can be published. */
  readonly toMend: readonly FolderFault[];
}

/** What a zip's directory and its list already tell. @throws VALIDATION with a sentence for each file. */
export async function checkList(zip: OpenFolder): Promise<void> {
  requireAllNamed(zip.names, await readSeriesFile((name) => zip.text(name)));
}

/**
 * Reads list, piece and lessons of a folder. A lesson with mistakes is a draft like any other: it is kept and told.
 * @throws VALIDATION with one sentence for each file that cannot be taken.
 */
export async function checkFolder(read: ReadFile): Promise<CheckedFolder> {
  const file = await readSeriesFile(read);
  const faults: FolderFault[] = [];
  const toMend: FolderFault[] = [];
  const piece = await readPiece(read, faults);
  if (piece !== null && piece.craft !== file.craft) faults.push({ file: 'piece.json', says: 'This piece is of another craft than series.yaml says.' });
  const texts: { source: string; reading: ParseResult }[] = [];
  for (const [index, { file: name, opens }] of file.lessons.entries()) {
    const source = await read(name);
    if (source === null) faults.push({ file: name, says: 'This file is named in series.yaml but is not in the folder.' });
    else if (source.length > LONGEST_DRAFT) faults.push({ file: name, says: `This text has ${source.length.toLocaleString('en-GB')} signs. At most ${LONGEST_DRAFT.toLocaleString('en-GB')} work: make two parts of it.` });
    else {
      const reading = await readLessonText(source);
      if (!reading.ok) toMend.push({ file: name, says: reading.problems.map(({ line, reason }) => `Line ${line}: ${reason}`).join(' ') });
      texts.push({ source, reading });
    }
    if (opens.rule === 'on-date' && instantOfWall(opens.wall, opens.zone) === null) faults.push({ file: 'series.yaml', says: `Part ${index + 1} opens on a day or in a time zone that is none.` });
    if (opens.rule === 'after-part' && (opens.part === undefined || opens.part > index)) toMend.push({ file: 'series.yaml', says: `Part ${index + 1} waits for a part that is not an earlier one.` });
    if (opens.rule === 'after-verdict' && !isOpenable(file, index, opens.part)) toMend.push({ file: 'series.yaml', says: `Part ${index + 1} waits for a verdict on a part that is not an earlier one with a checkpoint.` });
  }
  if (faults.length > 0) throw refused(faults);
  return { file, piece, texts, toMend };
}

/** A file that nothing speaks of would be lost without a word. */
function requireAllNamed(names: readonly string[], { lessons, videos, pictures }: SeriesFile): void {
  const named = new Set(['series.yaml', 'piece.json', ...lessons.map(({ file }) => file), ...videos.flatMap(({ film, captions }) => [film, captions]), ...pictures.map(({ file }) => file)]);
  const faults = names.filter((name) => !named.has(name)).map((file) => ({ file, says: 'series.yaml says nothing of this file. Name it there, or take it out.' }));
  const twice = [...videos, ...pictures].map(({ name }) => name).find((name, index, all) => all.indexOf(name) !== index);
  if (twice !== undefined) faults.push({ file: 'series.yaml', says: `Two videos or pictures have the name ${twice}.` });
  if (faults.length > 0) throw refused(faults);
}

function isOpenable({ lessons }: SeriesFile, index: number, part: number | undefined): boolean {
  return part !== undefined && part <= index && lessons[part - 1]?.checkpoint !== undefined;
}

async function readSeriesFile(read: ReadFile): Promise<SeriesFile> {
  const file = 'series.yaml';
  const source = await read(file);
  if (source === null) throw refused([{ file, says: 'There is no series.yaml in this folder.' }]);
  if (nestsTooDeep(source)) throw refused([{ file, says: 'This list nests deeper than the list of a series ever does.' }]);
  let data: unknown;
  try {
    data = listFromYaml(source);
  } catch (error) {
    throw refused([{ file, says: error instanceof Error ? error.message : 'This is no YAML.' }]);
  }
  const parsed = SeriesFile.safeParse(data);
  if (!parsed.success) throw refused([{ file, says: parsed.error.issues.slice(0, 10).map(({ path, message }) => `${path.join('.')}: ${message}`).join('; ') }]);
  return parsed.data;
}

async function readPiece(read: ReadFile, faults: FolderFault[]): Promise<Piece | null> {
  const file = 'piece.json';
  const source = await read(file);
  if (source === null) return null;
  let data: unknown;
  try {
    data = JSON.parse(source);
  } catch {
    faults.push({ file, says: 'This is no JSON.' });
    return null;
  }
  const plan = planPiece(data);
  if (!plan.ok) {
    faults.push({ file, says: plan.problems.map(({ path, message }) => `${path}: ${message}`).join(' ') });
    return null;
  }
  // Reckoned without a problem, so it has the shape of a piece.
  return data as Piece;
}

import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { MediaDetail } from '#contracts/media.ts';
import type { PictureEntry, SeriesFile, VideoEntry } from '#contracts/series-folder.ts';
import { chapterFaults } from '#core/captions/caption-faults.ts';
import type { Cue } from '#core/captions/cues.ts';
import { readVtt } from '#core/captions/read-vtt.ts';
import type { FolderFault } from '#core/series-folder/judge-entries.ts';
import { kindOfName } from '#core/series-folder/limits.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { AppError } from '#server/errors.ts';
import { takePhoto, type ReadPhoto } from '#server/media/photo.ts';
import type { MediaStore } from '#server/media/store.ts';
import { VIDEO_UPLOADS_FOLDER } from '#server/media/video/folders.ts';
import { refused, type OpenFolder } from '#server/series-folder/open-zip.ts';
import { SERIES_FOLDERS } from '#server/series-folder/folders.ts';

export interface TakenVideo {
  readonly publicId: string;
  readonly entry: VideoEntry;
  readonly detail: MediaDetail;
  /** Of the film that came with it; null when none did. */
  readonly filmBytes: number | null;
}

export interface TakenPicture {
  readonly publicId: string;
  readonly entry: PictureEntry;
  readonly photo: ReadPhoto;
}

export interface TakenMedia {
  readonly videos: readonly TakenVideo[];
  readonly pictures: readonly TakenPicture[];
  /** Removes every file that was put in its place. */
  undo(): Promise<void>;
}

/** How what is done is told, and stopped. */
export interface MediaSteps {
  readonly signal: AbortSignal;
  /** Before the first file is put in its place: under which public ids. */
  willPut(mediaIds: readonly string[]): Promise<void>;
  /** After each: how many are. */
  hasPut(count: number): Promise<void>;
}

/**
 * Puts pictures, decoded and written anew, and films, as an upload that has just arrived, in their places.
 * @throws VALIDATION with a sentence for each file that does not fit, the signal's reason when it aborts; then nothing is left.
 */
export async function takeMedia(store: MediaStore, folder: OpenFolder, { videos, pictures }: SeriesFile, steps: MediaSteps): Promise<TakenMedia> {
  const undone: (() => Promise<void>)[] = [];
  const undo = async (): Promise<void> => { await Promise.all(undone.map((act) => act())); };
  const faults: FolderFault[] = [];
  const taken: { videos: TakenVideo[]; pictures: TakenPicture[] } = { videos: [], pictures: [] };
  const ids = [...videos, ...pictures].map(() => newPublicId());
  await steps.willPut(ids);
  let begun = 0;
  const next = async (): Promise<string> => {
    steps.signal.throwIfAborted();
    if (begun > 0) await steps.hasPut(begun);
    begun += 1;
    return ids[begun - 1] ?? newPublicId();
  };
  try {
    for (const entry of videos) {
      const publicId = await next();
      const detail = await wordsOf(folder, entry, faults);
      taken.videos.push({ publicId, entry, detail, filmBytes: await takeFilm(store, folder, entry, publicId, undone, faults) });
    }
    for (const entry of pictures) {
      const publicId = await next();
      const photo = await takePicture(store, folder, entry, publicId, faults);
      if (photo === null) continue;
      undone.push(async () => { await Promise.all(Object.values(photo.files).map(({ key }) => store.remove(key))); });
      taken.pictures.push({ publicId, entry, photo });
    }
    if (faults.length > 0) throw refused(faults);
    return { ...taken, undo };
  } catch (error) {
    await undo();
    throw error;
  }
}

async function wordsOf(folder: OpenFolder, { captions, chapters = [], poster }: VideoEntry, faults: FolderFault[]): Promise<MediaDetail> {
  let cues: readonly Cue[] = [];
  if (captions !== undefined) {
    const text = kindOfName(captions) === 'captions' ? await folder.text(captions) : null;
    const reading = text === null ? null : readVtt(text, null);
    if (reading === null) faults.push({ file: captions, says: 'These captions are named in series.yaml but are not in the folder.' });
    else if (reading.ok) cues = reading.cues;
    else faults.push({ file: captions, says: reading.problems.map(({ line, says }) => `Line ${line}: ${says}`).join(' ') });
  }
  const [fault] = chapterFaults(chapters, null);
  if (fault !== undefined) faults.push({ file: 'series.yaml', says: fault.says });
  return { ...(cues.length > 0 && { cues }), ...(chapters.length > 0 && { chapters }), ...(poster !== undefined && { poster }) };
}

async function takeFilm(store: MediaStore, folder: OpenFolder, { film }: VideoEntry, publicId: string, undone: (() => Promise<void>)[], faults: FolderFault[]): Promise<number | null> {
  if (film === undefined) return null;
  const path = join(await store.temporaryFolder(VIDEO_UPLOADS_FOLDER), publicId);
  undone.push(() => rm(path, { force: true }));
  const byteCount = kindOfName(film) === 'film' ? await folder.copy(film, path) : null;
  if (byteCount === null || byteCount === 0) faults.push({ file: film, says: 'This film is named in series.yaml but is not in the folder, or is empty.' });
  return byteCount;
}

async function takePicture(store: MediaStore, folder: OpenFolder, { file }: PictureEntry, publicId: string, faults: FolderFault[]): Promise<ReadPhoto | null> {
  const path = join(await store.temporaryFolder(SERIES_FOLDERS), randomUUID());
  try {
    if (kindOfName(file) !== 'picture' || (await folder.copy(file, path)) === null) {
      faults.push({ file, says: 'This picture is named in series.yaml but is not in the folder.' });
      return null;
    }
    return await takePhoto(store, path, `pictures/${publicId}`);
  } catch (error) {
    if (!(error instanceof AppError) || (error.code !== 'UNSUPPORTED' && error.code !== 'TOO_LARGE')) throw error;
    faults.push({ file, says: error.says });
    return null;
  } finally {
    await rm(path, { force: true });
  }
}

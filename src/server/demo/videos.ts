/** The short films of a shipped series: drawn frame by frame from their storyboards and the pattern piece. */
import { mkdtemp, rm, stat } from 'node:fs/promises';
import { load as parseYaml } from 'js-yaml';
import type { Piece, Plan } from '#core/craft/crafts.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { MediaFile } from '#contracts/media.ts';
import { SeriesFile } from '#contracts/series-folder.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { readShipped } from '#server/demo/series.ts';
import { drawStoryboard, readStoryboard } from '#server/media/draw-storyboard.ts';
import type { MediaStore } from '#server/media/store.ts';
import { Media, PatternPiece, SeriesMedia, type Series } from '#server/models/index.ts';

/** Draws every video that `series.yaml` names and puts it in under its name. */
export async function drawVideos(store: MediaStore, series: Series, ownerId: number): Promise<void> {
  const file = SeriesFile.parse(parseYaml((await readShipped(series.slug, 'series.yaml')) ?? ''));
  const piece = (await PatternPiece.findByPk(series.id))?.data;
  const plan = piece === undefined ? null : planPiece(piece);
  if (piece === undefined || plan?.ok !== true) throw new RangeError(`${series.slug} has no piece that can be reckoned`);
  for (const { name, title, file: storyboard = `videos/${name}.yaml` } of file.videos) {
    await drawVideo({ store, series, ownerId, name, title, storyboard, piece, plan: plan.value });
  }
}

interface VideoToDraw {
  store: MediaStore; series: Series; ownerId: number; name: string; title: string; storyboard: string;
  piece: Piece; plan: Plan;
}

async function drawVideo({ store, series, ownerId, name, title, storyboard, piece, plan }: VideoToDraw): Promise<void> {
  const publicId = newPublicId();
  const folder = await mkdtemp(await store.temporaryPath('film-'));
  try {
    const yaml = await readShipped(series.slug, storyboard);
    if (yaml === null) throw new RangeError(`${storyboard} is missing`);
    const drawn = await drawStoryboard(readStoryboard(yaml), { piece, plan, units: 'cm' }, folder, name);
    const keep = async (path: string, ending: string, contentType: string, size: { width?: number; height?: number } = {}): Promise<MediaFile> => {
      const key = `videos/${publicId}/${ending}`;
      const { size: byteCount } = await stat(path);
      await store.put(key, path);
      return { key, contentType, byteCount, ...size };
    };
    const size = { width: drawn.width, height: drawn.height };
    const files = {
      video: await keep(drawn.videoPath, 'video.mp4', 'video/mp4', size),
      poster: await keep(drawn.posterPath, 'poster.jpg', 'image/jpeg', size),
    };
    const media = await Media.create({
      publicId, ownerId, kind: 'video', state: 'ready', originalName: `${name}.mp4`, byteCount: files.video.byteCount, ...size,
      durationMs: Math.round(drawn.durationMs), files, detail: { cues: drawn.cues, chapters: drawn.chapters },
    });
    await SeriesMedia.create({ seriesId: series.id, name, mediaId: media.id, title });
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

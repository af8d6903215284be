/** A video on its way with how much of it lies on the disk, for the page and for the island that watches it. */
import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import type { VideoOnItsWay } from '#contracts/video.ts';
import type { Context } from '#server/context.ts';
import { VIDEO_UPLOADS_FOLDER } from '#server/media/video/folders.ts';
import type { ArrivingVideo } from '#server/queries/videos/video-desk.ts';

export async function onItsWay({ services }: Context, video: ArrivingVideo): Promise<VideoOnItsWay> {
  if (video.state !== 'created') return { ...video, arrivedBytes: video.byteCount };
  const path = join(await services.media.temporaryFolder(VIDEO_UPLOADS_FOLDER), video.video);
  return { ...video, arrivedBytes: await stat(path).then(({ size }) => size, () => 0) };
}

import type { MediaDetail } from '#contracts/media.ts';
import { captionFaults, chapterFaults } from '#core/captions/caption-faults.ts';
import { clockTime } from '#core/captions/clock-time.ts';
import type { Context } from '#server/context.ts';
import { AppError, found } from '#server/errors.ts';
import { Media } from '#server/models/index.ts';
import { requireRevision, withSeriesLocked } from '#server/use-cases/workroom/_own-series.ts';
import { ownVideo } from './_own-video.ts';

export interface VideoDraft {
  /** Public id of the video. */
  readonly video: string;
  readonly revision: number;
  /** What is changed; the rest stays. */
  readonly change: Pick<MediaDetail, 'cues' | 'chapters' | 'poster'>;
}

export interface VideoDraftSaved {
  readonly series: string;
  readonly name: string;
  readonly revision: number;
  readonly savedAt: Date;
}

/**
 * Keeps captions, chapters or the poster of a video as its draft; students see it after publishing.
 * @throws CONFLICT when another window kept something else since `revision`; VALIDATION for what cannot stand.
 */
export async function saveVideoDraft(ctx: Context, { video, revision, change }: VideoDraft): Promise<VideoDraftSaved> {
  const { media: known, series, name } = await ownVideo(ctx, video);
  requireSound(change, known);
  return withSeriesLocked(series, async () => {
    const media = found(await Media.findByPk(known.id));
    const before = media.draftDetail ?? media.detail;
    const after = { ...before, ...change };
    if (JSON.stringify(after) !== JSON.stringify(before)) {
      requireRevision(media.revision, revision);
      await media.update({ draftDetail: after, revision: media.revision + 1 });
    }
    return { series: series.slug, name, revision: media.revision, savedAt: ctx.clock.now() };
  });
}

function requireSound({ cues = [], chapters = [], poster }: VideoDraft['change'], { durationMs, files }: Media): void {
  const [cueFault] = captionFaults(cues, durationMs);
  if (cueFault !== undefined) throw new AppError('VALIDATION', { fields: { cues: `At ${clockTime(cues[cueFault.index]?.fromMs ?? 0)}: ${cueFault.says}` } });
  const [chapterFault] = chapterFaults(chapters, durationMs);
  if (chapterFault !== undefined) throw new AppError('VALIDATION', { fields: { chapters: chapterFault.says } });
  if (poster !== undefined && (!Object.hasOwn(files, poster) || files[poster]?.contentType.startsWith('image/') !== true)) {
    throw new AppError('VALIDATION', { fields: { poster: 'Choose one of the pictures.' } });
  }
}

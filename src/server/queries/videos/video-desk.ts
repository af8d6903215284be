/** Videos as their teacher has them on her table. */
import { Op, QueryTypes } from 'sequelize';
import type { MediaDetail, MediaFiles } from '#contracts/media.ts';
import type { VideoOnItsWay } from '#contracts/video.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { Lesson, Media, Series, SeriesMedia, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { videoUses, type VideoUse } from './video-uses.ts';

/** A video that is not ready, or will not be. How much of it has come is told by its file. */
export type ArrivingVideo = Omit<VideoOnItsWay, 'arrivedBytes'>;

export interface ReadyVideo {
  readonly video: string;
  readonly revision: number;
  readonly durationMs: number;
  readonly files: MediaFiles;
  readonly detail: MediaDetail;
  /** Students see something else, or nothing yet. */
  readonly isDraft: boolean;
}

export interface VideoOnDesk {
  readonly name: string;
  readonly title: string;
  /** What is worked on: the draft that is ready, else what students see. */
  readonly ready: ReadyVideo | null;
  readonly arriving: ArrivingVideo | null;
}

export interface VideoDesk extends VideoOnDesk {
  readonly series: { readonly slug: string; readonly title: string; readonly workroomName: string; readonly timeZone: string };
  /** The part it was put in for; null when that is gone. */
  readonly part: { readonly publicId: string; readonly title: string; readonly number: number } | null;
  /** Parts that speak of it. */
  readonly uses: readonly VideoUse[];
}

/** @returns null when there is no such video in a series of the asker. */
export async function videoDesk(actor: Actor, slug: string, name: string): Promise<VideoDesk | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const named = await SeriesMedia.findOne({ where: { seriesId: series.id, name } });
  if (named === null) return null;
  const [workroom, lesson, [video], uses] = await Promise.all([
    Workroom.findByPk(series.workroomId, { rejectOnEmpty: true }),
    partOf(named),
    onDesk([named]),
    videoUses(series.id, name),
  ]);
  if (video === undefined) return null;
  return {
    ...video,
    uses,
    series: { slug, title: series.title, workroomName: workroom.name, timeZone: workroom.timeZone },
    part: lesson === null ? null : { publicId: lesson.publicId, title: lesson.title, number: lesson.position },
  };
}

/** The part it was put in for; for one that came with the series, the first whose text speaks of it. */
async function partOf({ seriesId, lessonId, name }: SeriesMedia): Promise<Lesson | null> {
  if (lessonId !== null) return Lesson.findByPk(lessonId);
  const [row] = await sequelize.query<{ id: number }>(
    "SELECT id FROM lessons WHERE series_id = ? AND taken_out_at IS NULL AND JSON_CONTAINS(JSON_EXTRACT(draft_reading, '$.media[*].name'), JSON_QUOTE(?)) ORDER BY position LIMIT 1",
    { replacements: [seriesId, name], type: QueryTypes.SELECT },
  );
  return row === undefined ? null : Lesson.findByPk(row.id);
}

/** Videos that were put in for a part, or that its text speaks of. */
export async function videosOfPart(seriesId: number, partId: string, namesInText: readonly string[]): Promise<VideoOnDesk[]> {
  const lesson = await Lesson.findOne({ where: { publicId: partId, seriesId }, attributes: ['id'] });
  const named = await SeriesMedia.findAll({ where: { seriesId, [Op.or]: [{ lessonId: lesson?.id ?? 0 }, { name: [...namesInText] }] }, order: ['createdAt', 'name'] });
  return onDesk(named);
}

/** One video of the asker's, ready or not. */
export async function videoInHand(actor: Actor, publicId: string): Promise<ArrivingVideo | null> {
  const media = await Media.findOne({ where: { publicId, kind: 'video', ownerId: actor.userId } });
  const named = media === null ? null : await SeriesMedia.findOne({ where: { [Op.or]: [{ mediaId: media.id }, { draftMediaId: media.id }] } });
  return media === null || named === null ? null : arriving(media, named);
}

async function onDesk(named: readonly SeriesMedia[]): Promise<VideoOnDesk[]> {
  const ids = named.flatMap(({ mediaId, draftMediaId }) => [mediaId, draftMediaId]).filter((id) => id !== null);
  const videos = await Media.findAll({ where: { id: ids, kind: 'video' } });
  const byId = (id: number | null): Media | undefined => videos.find((media) => media.id === id);
  const rows = named.filter(({ mediaId, draftMediaId }) => (byId(draftMediaId) ?? byId(mediaId)) !== undefined);
  return Promise.all(rows.map(async (row) => {
    const [shown, draft] = [byId(row.mediaId), byId(row.draftMediaId)];
    const ready = draft?.state === 'ready' ? draft : shown?.state === 'ready' ? shown : undefined;
    const waiting = draft !== undefined && draft.state !== 'ready' ? draft : undefined;
    return {
      name: row.name,
      title: row.title,
      ready: ready === undefined ? null : {
        video: ready.publicId,
        revision: ready.revision,
        durationMs: ready.durationMs ?? 0,
        files: ready.files,
        detail: ready.draftDetail ?? ready.detail,
        isDraft: ready !== shown || ready.draftDetail !== null,
      },
      arriving: waiting === undefined ? null : await arriving(waiting, row),
    };
  }));
}

async function arriving(media: Media, { name, title }: SeriesMedia): Promise<ArrivingVideo> {
  const { publicId, originalName, state, byteCount, progressPermille, failure } = media;
  return { video: publicId, name, title, fileName: originalName, state, byteCount, permille: progressPermille, before: state === 'uploaded' ? await waitingBefore(publicId) : null, failure };
}

/** Videos that were sent to the worker earlier and are not done. */
async function waitingBefore(publicId: string): Promise<number> {
  const [row] = await sequelize.query<{ n: number }>(
    `SELECT COUNT(*) AS n FROM jobs j JOIN jobs own ON own.unique_key = ? AND j.type = own.type AND j.state = 'ready' AND (j.run_at, j.id) < (own.run_at, own.id)`,
    { replacements: [`process-video:${publicId}`], type: QueryTypes.SELECT },
  );
  return row?.n ?? 0;
}

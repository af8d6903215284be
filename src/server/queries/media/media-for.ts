/** A file with all that decides who may see it. */
import { QueryTypes } from 'sequelize';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { FinishedPiece, Media } from '#server/models/index.ts';
import { looksAfterMedia, maySeeMedia, type MediaUse } from '#server/policies/media.ts';
import { isPhotoOnWall } from '#server/queries/finish/wall-pieces.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

export interface MediaFor {
  readonly media: Media;
  /** Whether the asker looks after it, and so may see its drafts. */
  readonly looksAfter: boolean;
  /** Whether who may see it can change at any moment, so that a browser must ask each time. */
  readonly mayBeWithdrawn: boolean;
}

/** The file, when `actor` may see it; null when there is none or it must look so. */
export async function mediaFor(actor: Actor | null, publicId: string, now: Date): Promise<MediaFor | null> {
  const media = await Media.findOne({ where: { publicId } });
  if (media === null) return null;
  const uses = media.kind === 'photo' ? [...(await photoUses(media.id)), ...(await finishedUses(media.id))] : await lessonUses(actor, media.id, now);
  return maySeeMedia(actor, media.ownerId, uses) ? { media, looksAfter: looksAfterMedia(actor, media.ownerId, uses), mayBeWithdrawn: uses.some(({ kind }) => kind === 'finished') } : null;
}

async function photoUses(mediaId: number): Promise<MediaUse[]> {
  const rows = await sequelize.query<{ studentId: number; workroomId: number }>(
    `SELECT e.user_id AS studentId, s.workroom_id AS workroomId
       FROM progress_photos p JOIN enrolments e ON e.id = p.enrolment_id JOIN series s ON s.id = e.series_id
      WHERE p.media_id = :mediaId OR p.id IN (SELECT f.photo_id FROM further_shots f WHERE f.media_id = :mediaId)`,
    { replacements: { mediaId }, type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ kind: 'progress-photo', ...row }));
}

async function finishedUses(mediaId: number): Promise<MediaUse[]> {
  if ((await FinishedPiece.count({ where: { mediaId } })) === 0) return [];
  return [{ kind: 'finished', onWall: await isPhotoOnWall(mediaId) }];
}

/** A draft is used in no part yet, whatever the texts say: only who looks after the series finds it. */
async function lessonUses(actor: Actor | null, mediaId: number, now: Date): Promise<MediaUse[]> {
  const rows = await sequelize.query<{ slug: string; lessonId: number | null }>(
    `SELECT s.slug, l.id AS lessonId
       FROM series_media m
       JOIN series s ON s.id = m.series_id
       LEFT JOIN lessons l ON l.series_id = s.id AND l.taken_out_at IS NULL AND m.media_id = :media
        AND EXISTS (SELECT 1 FROM lesson_versions v WHERE v.id = l.published_version_id AND JSON_CONTAINS(JSON_EXTRACT(v.facts, '$.media[*].name'), JSON_QUOTE(m.name)))
      WHERE m.media_id = :media OR m.draft_media_id = :media`,
    { replacements: { media: mediaId }, type: QueryTypes.SELECT },
  );
  const uses: MediaUse[] = [];
  for (const slug of new Set(rows.map((row) => row.slug))) {
    const series = await seriesFor(actor, slug, now);
    if (series === null) continue;
    const lessonIds = new Set(rows.filter((row) => row.slug === slug).map(({ lessonId }) => lessonId));
    uses.push({ kind: 'lesson', workroomId: series.workroom.id, accesses: series.parts.filter(({ id }) => lessonIds.has(id)).map(({ access }) => access) });
  }
  return uses;
}

/** The door for videos. */
import { BeginVideo } from '#contracts/video.ts';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import { AppError } from '#server/errors.ts';
import { VIDEO_UPLOADS_FOLDER } from '#server/media/video/folders.ts';
import { uploadOf } from '#server/queries/videos/upload-of.ts';
import { beginVideoUpload } from '#server/use-cases/videos/begin-upload.ts';
import { stopVideoUpload } from '#server/use-cases/videos/stop-upload.ts';
import { takeVideoUpload } from '#server/use-cases/videos/take-upload.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { openDoor } from '#server/web/upload-door.ts';

/** Answers one request of a tus client. */
export const answerVideoUpload = openDoor({
  path: '/api/videos',
  table: 'video_uploads',
  folder: VIDEO_UPLOADS_FOLDER,
  hours: VIDEO_LIMITS.uploadHours,
  rowOf: async (publicId) => {
    const upload = await uploadOf(publicId);
    // The worker takes the bytes where they lie: until then they can be asked for.
    return upload === null ? null : { ...upload, isTaken: false };
  },
  begin: async (ctx, publicId, { byteCount, metadata }) => {
    await countUse(RATE_RULES.video, ctx.actor?.publicId ?? '');
    const said = BeginVideo.safeParse({ lesson: metadata['lesson'], name: metadata['name'], fileName: metadata['filename'], fileType: metadata['filetype'] ?? '', byteCount });
    if (!said.success) throw new AppError('VALIDATION', { says: 'This upload does not say what it is for.' });
    await beginVideoUpload(ctx, publicId, said.data);
  },
  take: (_ctx, publicId) => takeVideoUpload(publicId),
  forget: stopVideoUpload,
});

/** The door for photos that come in pieces. */
import { BeginPhoto } from '#contracts/photos.ts';
import { PHOTO_LIMITS } from '#core/photo/limits.ts';
import { AppError } from '#server/errors.ts';
import { PHOTO_UPLOADS_FOLDER } from '#server/media/photo.ts';
import { photoUploadOf } from '#server/queries/photos/photo-upload-of.ts';
import { beginPhotoUpload } from '#server/use-cases/photos/begin-photo-upload.ts';
import { stopPhotoUpload } from '#server/use-cases/photos/stop-photo-upload.ts';
import { takePhotoUpload } from '#server/use-cases/photos/take-photo-upload.ts';
import { openDoor } from '#server/web/upload-door.ts';

/** Answers one request of a tus client. */
export const answerPhotoUpload = openDoor({
  path: '/api/photos/pieces',
  table: 'photo_uploads',
  folder: PHOTO_UPLOADS_FOLDER,
  hours: PHOTO_LIMITS.uploadHours,
  rowOf: photoUploadOf,
  begin: async (ctx, publicId, { byteCount, metadata }) => {
    const said = BeginPhoto.safeParse({ series: metadata['series'], lesson: metadata['lesson'], fileName: metadata['filename'] ?? '', byteCount });
    if (!said.success) throw new AppError('VALIDATION', { says: 'This upload does not say what it is for.' });
    await beginPhotoUpload(ctx, publicId, said.data);
  },
  take: takePhotoUpload,
  forget: stopPhotoUpload,
});

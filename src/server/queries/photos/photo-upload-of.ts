/** A photo that arrives in pieces, as its row tells of it; also when it has come and waits to be shown. */
import { Media, PhotoUpload } from '#server/models/index.ts';

export interface PhotoUploadFacts {
  readonly ownerId: number;
  readonly byteCount: number;
  readonly begunAt: Date;
  /** It was read and written anew; its bytes are gone. */
  readonly isTaken: boolean;
}

/** @returns null when there is none of that name, or it was shown or forgotten. */
export async function photoUploadOf(publicId: string): Promise<PhotoUploadFacts | null> {
  const media = await Media.findOne({ where: { publicId, kind: 'photo' }, attributes: ['id', 'ownerId', 'state'] });
  const upload = media === null ? null : await PhotoUpload.findByPk(media.id);
  return media === null || upload === null ? null : { ownerId: media.ownerId, byteCount: upload.byteCount, begunAt: upload.createdAt, isTaken: media.state === 'ready' };
}

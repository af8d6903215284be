/** An upload as its row tells of it. */
import { Media, VideoUpload } from '#server/models/index.ts';

export interface UploadFacts {
  readonly ownerId: number;
  readonly byteCount: number;
  readonly begunAt: Date;
  readonly fileName: string;
}

/** @returns null when there is none of that name, or it was forgotten. */
export async function uploadOf(publicId: string): Promise<UploadFacts | null> {
  const media = await Media.findOne({ where: { publicId, kind: 'video' }, attributes: ['id', 'ownerId', 'originalName'] });
  const upload = media === null ? null : await VideoUpload.findByPk(media.id);
  return media === null || upload === null ? null : { ownerId: media.ownerId, byteCount: upload.byteCount, begunAt: upload.createdAt, fileName: media.originalName };
}

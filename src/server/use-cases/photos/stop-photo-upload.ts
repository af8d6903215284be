import { Media } from '#server/models/index.ts';

/** A student put a photo away that was not whole; its bytes are gone already. */
export async function stopPhotoUpload(publicId: string): Promise<void> {
  await Media.destroy({ where: { publicId, kind: 'photo', state: 'created' } });
}

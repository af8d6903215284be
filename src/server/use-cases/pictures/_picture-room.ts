import { AppError } from '#server/errors.ts';
import { Media } from '#server/models/index.ts';
import { sizeWords } from '#core/video/limits.ts';

/** All pictures of one teacher together. */
const MOST_PICTURE_BYTES = 2_000_000_000;

/**
 * Whether `byteCount` more fit into a teacher's room for pictures. Called with the person's row locked, so that pictures sent
 * at once are counted one after the other.
 * @throws CONFLICT with what would not go in
 */
export async function requirePictureRoom(userId: number, byteCount: number): Promise<void> {
  const used = ((await Media.sum('byteCount', { where: { ownerId: userId, kind: 'picture' } })) as number | null) ?? 0;
  if (used + byteCount <= MOST_PICTURE_BYTES) return;
  throw new AppError('CONFLICT', { says: `Your pictures together may be 2 GB. These ${sizeWords(byteCount)} would not go in beside the ${sizeWords(used)} you have. Write to us, and we see what can be done.` });
}

import type { Cue } from '#contracts/media.ts';
import type { Actor } from '#server/context.ts';
import { Media } from '#server/models/index.ts';

/** The captions of a video of the asker's as they are kept now. */
export async function captionsInHand(actor: Actor, publicId: string): Promise<{ revision: number; cues: readonly Cue[] } | null> {
  const media = await Media.findOne({ where: { publicId, kind: 'video', ownerId: actor.userId } });
  return media === null ? null : { revision: media.revision, cues: (media.draftDetail ?? media.detail).cues ?? [] };
}

import type { Context } from '#server/context.ts';
import { failVideo } from './_fail-video.ts';

/** Every try ended badly through no fault of the file, as far as we know. */
export async function giveUpVideo({ services }: Context, publicId: string): Promise<void> {
  await failVideo(services.media, publicId, 'We could not make this video ready, and do not know why. Send it again; if it stays so, export it once more as MP4.');
}

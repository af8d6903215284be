import { withTransaction } from '#server/db/transaction.ts';
import { processVideo } from '#server/jobs/definitions/videos.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { Media } from '#server/models/index.ts';

/** The last byte is here: the video goes to the worker. Doing it again changes nothing. */
export async function sendToWorker(publicId: string): Promise<void> {
  await withTransaction(async () => {
    const media = await Media.findOne({ where: { publicId, kind: 'video' }, lock: true });
    if (media?.state !== 'created') return;
    await media.update({ state: 'uploaded' });
    await enqueue(processVideo, { video: publicId }, { uniqueKey: `${processVideo.type}:${publicId}` });
  });
}

import { sendToWorker } from './_send-to-worker.ts';

/** The last byte of an upload is here. Doing it again changes nothing. */
export async function takeVideoUpload(publicId: string): Promise<void> {
  await sendToWorker(publicId);
}

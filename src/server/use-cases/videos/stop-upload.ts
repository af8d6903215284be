import { forgetUpload } from './_forget-upload.ts';

/** A teacher took back an upload that was not whole; its bytes are gone already. */
export async function stopVideoUpload(publicId: string): Promise<void> {
  await forgetUpload(publicId);
}

import type { MediaFiles } from '#contracts/media.ts';
import type { MediaStore } from '#server/media/store.ts';

/** Files are put before their row is made; when no row comes of `work`, they go again. */
export async function keepingFilesOnlyWithRows<T>(store: MediaStore, { files }: { readonly files: MediaFiles }, work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    await Promise.all(Object.values(files).map(({ key }) => store.remove(key)));
    throw error;
  }
}

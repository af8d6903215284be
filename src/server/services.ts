/** The ports a use-case may call, with their real adapters built from the settings. Tests hand in fakes. */
import { resolve } from 'node:path';
import { config } from '#server/config.ts';
import { DiskMediaStore, type MediaStore } from '#server/media/store.ts';

export interface Services {
  readonly media: MediaStore;
}

let kept: Services | undefined;

/** The services of this process. */
export function services(): Services {
  kept ??= { media: new DiskMediaStore(resolve(config().uploadsFolder)) };
  return kept;
}

/** Among the temporary files: zips of series on their way out, and what is unpacked on the way in. */
export const SERIES_FOLDERS = 'series-folders';
/** Zips that have arrived and wait for the worker, by the public ids of their imports. */
export const ARRIVED_FOLDERS = 'arrived-folders';

/** Among the temporary files: zips of series on their way out, and what is unpacked on the way in. */
export const SERIES_FOLDERS = 'series-folders';

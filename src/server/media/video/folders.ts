/** Among the temporary files: uploads that are not made ready yet, each under the name of its video. */
export const VIDEO_UPLOADS_FOLDER = 'videos';
/** Where the worker makes them ready; each try has a folder of its own in here. */
export const VIDEO_WORK_FOLDER = 'video-work';

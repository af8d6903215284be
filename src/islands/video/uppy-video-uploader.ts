// Carries a video in pieces. What an upload is called the server knows, so nothing is kept in the browser.
import { carry } from '#islands/uploading/carry.ts';
import type { StartVideoUpload } from './video-uploader.ts';

/** The door lets ten minutes for each piece. */
const PIECE_BYTES = 8 * 1_048_576;
const NO_ANSWER = 'The video was not taken, and no reason came back. Send it again in a moment.';

export const startUppyVideoUpload: StartVideoUpload = (file, { lesson, name, goesOn }, events) =>
  carry(file, {
    endpoint: '/api/videos',
    pieceBytes: PIECE_BYTES,
    meta: { lesson, ...(name !== null && { name }), filename: file.name, filetype: file.type },
    goesOn,
    noAnswer: NO_ANSWER,
  }, events);

// Carries a video by Uppy and tus: in pieces, each of which is there for good once it is taken. Fetched only when a
// teacher sends one. What an upload is called the server knows, so nothing is kept in the browser.
import type { StartVideoUpload } from './video-uploader.ts';

const ENDPOINT = '/api/videos';
/** A piece is sent anew when the line drops in it; the door lets ten minutes for each. */
const PIECE_BYTES = 8 * 1_048_576;
const NO_ANSWER = 'The video was not taken, and no reason came back. Send it again in a moment.';

export const startUppyVideoUpload: StartVideoUpload = async (file, { lesson, name, goesOn }, events) => {
  const [{ default: Uppy }, { default: Tus }] = await Promise.all([import('@uppy/core'), import('@uppy/tus')]);
  const uppy = new Uppy({ id: 'video', autoProceed: false, restrictions: { maxNumberOfFiles: 1 } });
  const meta = { lesson, ...(name !== null && { name }), filename: file.name, filetype: file.type };
  uppy.use(Tus, {
    endpoint: ENDPOINT,
    chunkSize: PIECE_BYTES,
    limit: 1,
    retryDelays: [0, 1_000, 3_000],
    storeFingerprintForResuming: false,
    allowedMetaFields: Object.keys(meta),
  });
  const id = uppy.addFile({ name: file.name, type: file.type, data: file });
  // Uppy's own name and type of a file stand in the same place.
  uppy.setFileState(id, { meta: { ...meta, name: name ?? '' }, ...(goesOn !== null && { tus: { uploadUrl: `${ENDPOINT}/${goesOn}` } }) } as Parameters<typeof uppy.setFileState>[1]);
  uppy.on('upload-progress', (_file, { bytesUploaded }) => { events.progress(bytesUploaded || 0); });
  uppy.on('upload-success', (_file, response) => { events.done(response.uploadURL?.split('/').at(-1) ?? ''); });
  uppy.on('upload-error', (_file, error) => {
    const answer = answerOf(error);
    if (answer === undefined || answer.status === 0 || answer.status >= 500 || [408, 409, 423, 429].includes(answer.status)) events.dropped();
    else events.refused(reasonOf(answer.body));
  });
  // Every outcome is told by the events above.
  const quietly = (work: Promise<unknown>): void => { void work.catch(() => undefined); };
  quietly(uppy.upload());
  return {
    pause: () => { if (uppy.getFile(id).isPaused !== true) uppy.pauseResume(id); },
    goOn: () => { if (uppy.getFile(id).isPaused === true) uppy.pauseResume(id); },
    again: () => { quietly(uppy.retryUpload(id)); },
    stop: () => { uppy.removeFile(id); uppy.destroy(); },
    leave: () => { uppy.pauseAll(); },
  };
};

/** The carrier hands its last answer over on the error. */
function answerOf(error: unknown): { status: number; body: string } | undefined {
  if (typeof error !== 'object' || error === null || !('originalResponse' in error)) return undefined;
  const response = error.originalResponse as { getStatus(): number; getBody(): string } | null;
  return response === null ? undefined : { status: response.getStatus(), body: response.getBody() };
}

function reasonOf(text: string): string {
  try {
    const body: unknown = JSON.parse(text);
    return typeof body === 'object' && body !== null && 'title' in body && typeof body.title === 'string' ? body.title : NO_ANSWER;
  } catch {
    return NO_ANSWER;
  }
}

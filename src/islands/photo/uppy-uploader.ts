// Carries a photo by Uppy: one file as multipart, a few quick tries, then it tells that the line dropped. Fetched only
// when somebody sends a photo: most who read a part do not.
import type { StartUpload } from './uploader.ts';

const FIELD = 'photo';
const NO_ANSWER = 'The photo was not taken, and no reason came back. Send it again in a moment.';

/** Worth another try by itself: no answer at all, or a server that is busy. */
const mayTryAgain = (status: number): boolean => status === 0 || status === 408 || status === 429 || status >= 500;

export const startUppyUpload: StartUpload = async (file, fields, events) => {
  const [{ default: Uppy }, { default: XHRUpload }] = await Promise.all([import('@uppy/core'), import('@uppy/xhr-upload')]);
  const uppy = new Uppy({ id: 'photo', autoProceed: false, restrictions: { maxNumberOfFiles: 1 } });
  uppy.use(XHRUpload, {
    endpoint: '/api/photos',
    fieldName: FIELD,
    allowedMetaFields: Object.keys(fields),
    limit: 1,
    timeout: 60_000,
    headers: { Accept: 'application/json' },
    shouldRetry: ({ status }) => mayTryAgain(status),
  });
  const id = uppy.addFile({ name: file.name, type: file.type, data: file, meta: { ...fields } });
  uppy.on('upload-progress', (_file, { bytesUploaded }) => { events.progress(bytesUploaded); });
  uppy.on('upload-success', () => { events.done(); });
  uppy.on('upload-error', (_file, _error, response) => {
    const request = xhrOf(response);
    if (request === undefined || mayTryAgain(request.status)) events.dropped();
    else events.refused(reasonOf(request.responseText));
  });
  // Every outcome is told by the events above.
  const quietly = (work: Promise<unknown>): void => { void work.catch(() => undefined); };
  quietly(uppy.upload());
  return {
    again: () => { quietly(uppy.retryUpload(id)); },
    stop: () => { uppy.destroy(); },
  };
};

/** The plugin hands its request over under another name than its types say. */
function xhrOf(response: unknown): { status: number; responseText: string } | undefined {
  if (typeof response !== 'object' || response === null || !('status' in response) || typeof response.status !== 'number') return undefined;
  return { status: response.status, responseText: 'responseText' in response && typeof response.responseText === 'string' ? response.responseText : '' };
}

function reasonOf(text: string): string {
  try {
    const body: unknown = JSON.parse(text);
    if (typeof body !== 'object' || body === null) return NO_ANSWER;
    if ('detail' in body && typeof body.detail === 'string') return body.detail;
    return 'title' in body && typeof body.title === 'string' ? body.title : NO_ANSWER;
  } catch {
    return NO_ANSWER;
  }
}

// Carries a file by Uppy and tus: in pieces, each of which is there for good once it is taken. Fetched only when
// somebody sends something.

export interface CarryEvents {
  progress(sentBytes: number): void;
  /** No answer came. `Carried.again` goes on where it was. */
  dropped(): void;
  /** The server will not take it, and says why. */
  refused(says: string): void;
  /** All of it is there, under this public id. */
  done(publicId: string): void;
}

export interface Carried {
  pause(): void;
  goOn(): void;
  again(): void;
  /** Stops for good: what has come is taken back. */
  stop(): void;
  /** Lets go of it here; what has come stays and can be gone on with. */
  leave(): void;
}

export interface Parcel {
  /** Of the door that takes it. */
  readonly endpoint: string;
  /** A piece is sent anew when the line drops in it. */
  readonly pieceBytes: number;
  /** What it says of itself before its first byte. */
  readonly meta: Readonly<Record<string, string>>;
  /** Public id of the upload it goes on with. */
  readonly goesOn: string | null;
  /** What is said when it is not taken and no reason comes back. */
  readonly noAnswer: string;
  /** Called once the door has given it a public id, so that it can be gone on with later. */
  readonly begun?: (publicId: string) => void;
}

export async function carry(file: File, { endpoint, pieceBytes, meta, goesOn, noAnswer, begun }: Parcel, events: CarryEvents): Promise<Carried> {
  const [{ default: Uppy }, { default: Tus }] = await Promise.all([import('@uppy/core'), import('@uppy/tus')]);
  const uppy = new Uppy({ id: `carry-${endpoint}`, autoProceed: false, restrictions: { maxNumberOfFiles: 1 } });
  let told = goesOn;
  uppy.use(Tus, {
    endpoint,
    chunkSize: pieceBytes,
    limit: 1,
    retryDelays: [0, 1_000, 3_000],
    storeFingerprintForResuming: false,
    allowedMetaFields: Object.keys(meta),
    onAfterResponse: (_request, response) => {
      const given = response.getHeader('Location')?.split('/').at(-1);
      if (given === undefined || given === told) return;
      told = given;
      begun?.(given);
    },
  });
  const id = uppy.addFile({ name: file.name, type: file.type, data: file });
  // Uppy's own name and type of a file stand in the same place.
  uppy.setFileState(id, { meta: { ...meta, name: meta['name'] ?? '' }, ...(goesOn !== null && { tus: { uploadUrl: `${endpoint}/${goesOn}` } }) } as Parameters<typeof uppy.setFileState>[1]);
  uppy.on('upload-progress', (_file, { bytesUploaded }) => { events.progress(bytesUploaded || 0); });
  uppy.on('upload-success', (_file, response) => { events.done(response.uploadURL?.split('/').at(-1) ?? ''); });
  uppy.on('upload-error', (_file, error) => {
    const answer = answerOf(error);
    if (answer === undefined || answer.status === 0 || answer.status >= 500 || [408, 409, 423, 429].includes(answer.status)) events.dropped();
    else events.refused(reasonIn(answer.body) ?? noAnswer);
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
}

/** The carrier hands its last answer over on the error. */
function answerOf(error: unknown): { status: number; body: string } | undefined {
  if (typeof error !== 'object' || error === null || !('originalResponse' in error)) return undefined;
  const response = error.originalResponse as { getStatus(): number; getBody(): string } | null;
  return response === null ? undefined : { status: response.getStatus(), body: response.getBody() };
}

/** The sentence of a problem document (RFC 9457); undefined when there is none. */
export function reasonIn(text: string): string | undefined {
  try {
    const body: unknown = JSON.parse(text);
    return typeof body === 'object' && body !== null && 'title' in body && typeof body.title === 'string' ? body.title : undefined;
  } catch {
    return undefined;
  }
}

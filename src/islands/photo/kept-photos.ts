// Photos that wait on this device for a connection: in the outbox, whole, with their words. It sends them as a form
// would; a file that had come in part is known again by its digest, so nothing is shown twice.
import { isWaiting, outboxOf, personOfPage, type OutboxState } from '#islands/keeping/outbox.ts';
import type { PhotoTarget } from './uploader.ts';

const KIND = 'photo';

export interface KeptPhotos {
  /** Showings of this checkpoint that wait. */
  readonly waiting: number;
  /** Why one was not taken, since the page was opened. */
  readonly refused: string | undefined;
}

export interface KeepPhotos {
  /** @returns false where nothing can be kept: nobody is signed in. */
  put(target: PhotoTarget, words: string, files: readonly File[]): Promise<boolean>;
  current(lesson: string): KeptPhotos;
  subscribe(hear: () => void): () => void;
}

function ofLesson({ entries, refused }: OutboxState, lesson: string): KeptPhotos {
  const own = ({ kind, name }: { readonly kind: string; readonly name: string }): boolean => kind === KIND && name.startsWith(`${lesson}:`);
  return { waiting: entries.filter((entry) => own(entry) && isWaiting(entry)).length, refused: refused.findLast(({ entry }) => own(entry))?.says };
}

const outbox = () => {
  const person = personOfPage();
  return person === null ? null : outboxOf(person);
};

export const keptPhotos: KeepPhotos = {
  put: async ({ series, lesson }, words, files) => {
    const box = outbox();
    if (box === null) return false;
    const fields = [['series', series], ['lesson', lesson], ['words', words]] as const;
    await box.put({ kind: KIND, name: `${lesson}:${Date.now()}`, address: '/api/photos', body: { form: [...fields, ...files.map((file) => ['photo', file] as const)] } });
    return true;
  },
  current: (lesson) => {
    const box = outbox();
    return box === null ? { waiting: 0, refused: undefined } : ofLesson(box.current(), lesson);
  },
  subscribe: (hear) => outbox()?.subscribe(hear) ?? (() => undefined),
};

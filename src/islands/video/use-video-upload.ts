import { useCallback, useEffect, useReducer, useRef } from 'react';
import type { VideoOnItsWay } from '#contracts/video.ts';
import { videoFault } from '#core/video/limits.ts';
import { useTryingAgain } from '#islands/uploading/use-trying-again.ts';
import { videoUploadAfter, type VideoUploadState } from './video-upload-state.ts';
import type { StartVideoUpload, VideoTarget, VideoUpload } from './video-uploader.ts';

export interface SendingVideo {
  readonly state: VideoUploadState;
  readonly choose: (file: File | undefined) => void;
  readonly pause: () => void;
  readonly goOn: () => void;
  readonly stop: () => void;
}

/** The unfinished upload that `file` belongs to, by its name and size. */
export function goesOnWith(file: Pick<File, 'name' | 'size'>, unfinished: readonly VideoOnItsWay[]): VideoOnItsWay | undefined {
  return unfinished.find(({ state, fileName, byteCount }) => state === 'created' && fileName === file.name.normalize('NFC').trim() && byteCount === file.size);
}

/** `unfinished`: uploads of this place that the server holds a part of; choosing the same file goes on with one. */
export function useVideoUpload(start: StartVideoUpload, target: Omit<VideoTarget, 'goesOn'>, unfinished: readonly VideoOnItsWay[]): SendingVideo {
  const [state, tell] = useReducer(videoUploadAfter, { at: 'choosing' });
  const upload = useRef<VideoUpload | null>(null);
  useEffect(() => () => { upload.current?.leave(); }, []);
  useTryingAgain(upload, state.at === 'waiting' ? state.tries : 0);

  const isOnItsWay = state.at === 'sending' || state.at === 'waiting';
  useEffect(() => {
    if (!isOnItsWay) return;
    const onLeave = (event: BeforeUnloadEvent): void => { event.preventDefault(); };
    window.addEventListener('beforeunload', onLeave);
    return () => { window.removeEventListener('beforeunload', onLeave); };
  }, [isOnItsWay]);

  const { lesson, name } = target;
  const choose = useCallback((file: File | undefined) => {
    if (file === undefined) return;
    const fault = videoFault(file);
    if (fault !== null) {
      tell({ kind: 'unfit', says: fault });
      return;
    }
    const before = goesOnWith(file, unfinished);
    tell({ kind: 'begin', file, sent: before?.arrivedBytes ?? 0 });
    void start(file, { lesson, name: before?.name ?? name, goesOn: before?.video ?? null }, {
      progress: (sent) => { tell({ kind: 'progress', sent }); },
      dropped: () => { tell({ kind: 'dropped' }); },
      refused: (says) => { upload.current = null; tell({ kind: 'refused', says }); },
      done: (video) => { upload.current = null; tell({ kind: 'done', video }); },
    }).then((begun) => { upload.current = begun; }, () => { tell({ kind: 'refused', says: 'The video could not be sent from here. Load the page again and choose it once more.' }); });
  }, [start, lesson, name, unfinished]);
  const pause = useCallback(() => { upload.current?.pause(); tell({ kind: 'pause' }); }, []);
  const goOn = useCallback(() => { tell({ kind: 'go-on' }); upload.current?.goOn(); }, []);
  const stop = useCallback(() => { upload.current?.stop(); upload.current = null; tell({ kind: 'stop' }); }, []);
  return { state, choose, pause, goOn, stop };
}

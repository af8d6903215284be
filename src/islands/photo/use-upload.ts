import { useCallback, useEffect, useReducer, useRef } from 'react';
import { photoFault } from './photo-rules.ts';
import { uploadAfter, type UploadState } from './upload-state.ts';
import type { StartUpload, Upload } from './uploader.ts';
import { useTryingAgain } from './use-trying-again.ts';

export interface PhotoOnItsWay {
  readonly state: UploadState;
  readonly choose: (file: File | undefined) => void;
  readonly send: (fields: Readonly<Record<string, string>>) => void;
  readonly stop: () => void;
  readonly putAway: () => void;
}

export function useUpload(start: StartUpload, fault: string | undefined): PhotoOnItsWay {
  const [state, tell] = useReducer(uploadAfter, { at: 'choosing', fault });
  const upload = useRef<Upload | null>(null);
  const end = useCallback(() => {
    upload.current?.stop();
    upload.current = null;
  }, []);
  useEffect(() => end, [end]);
  useTryingAgain(upload, state.at === 'waiting' ? state.tries : 0);

  const choose = useCallback((file: File | undefined) => {
    if (file === undefined) return;
    const says = photoFault(file);
    tell(says === null ? { kind: 'choose', file } : { kind: 'unfit', says });
  }, []);
  const send = useCallback((fields: Readonly<Record<string, string>>) => {
    if (!('file' in state)) return;
    tell({ kind: 'send' });
    void start(state.file, fields, {
      progress: (sent) => { tell({ kind: 'progress', sent }); },
      dropped: () => { tell({ kind: 'dropped' }); },
      refused: (says) => { end(); tell({ kind: 'refused', says }); },
      done: () => { tell({ kind: 'done' }); },
    }).then((begun) => { upload.current = begun; }, () => { tell({ kind: 'refused', says: 'The photo could not be sent from here. Load the page again and send it once more.' }); });
  }, [start, state, end]);
  const stop = useCallback(() => { end(); tell({ kind: 'stop' }); }, [end]);
  const putAway = useCallback(() => { end(); tell({ kind: 'put-away' }); }, [end]);
  return { state, choose, send, stop, putAway };
}

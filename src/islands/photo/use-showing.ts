import { useCallback, useEffect, useReducer, useRef } from 'react';
import { useTryingAgain } from '#islands/uploading/use-trying-again.ts';
import { emptyShowing, showingAfter, type Shot, type Showing } from './showing.ts';
import type { KeepPhotos } from './kept-photos.ts';
import type { PhotoTarget, Show, StartUpload } from './uploader.ts';

export interface ShowingInHand {
  readonly state: Showing;
  readonly add: (files: readonly File[]) => void;
  readonly replace: (key: number, file: File) => void;
  readonly putAway: (key: number) => void;
  readonly send: (words: string) => void;
  readonly stop: () => void;
}

interface OnItsWay {
  again(): void;
  leave(): void;
}

/** What is said when the code that carries photos cannot be fetched. */
const NOT_FROM_HERE = 'The photo could not be sent from here. Load the page again and send it once more.';

/**
 * Photos chosen, sent one after the other, then shown together. A line that drops holds them up, nothing more; without any
 * connection they are kept on the device, which sends them from whatever page is open then.
 */
export function useShowing({ series, lesson }: PhotoTarget, start: StartUpload, show: Show, kept: KeepPhotos, fault: string | undefined): ShowingInHand {
  const [state, tell] = useReducer(showingAfter, fault, emptyShowing);
  const now = useRef(state);
  useEffect(() => { now.current = state; });
  const said = useRef('');
  const onItsWay = useRef<OnItsWay | null>(null);
  /** Counts sendings, so that what an earlier one still says is not heard. */
  const round = useRef(0);
  const end = useCallback(() => {
    round.current += 1;
    onItsWay.current?.leave();
    onItsWay.current = null;
  }, []);
  useEffect(() => end, [end]);
  useTryingAgain(onItsWay, state.at === 'waiting' ? state.tries : 0);

  /** @returns its public id once it is there; null when it was refused. */
  const sendOne = useCallback(({ key, file, shot }: Shot, mine: number) => new Promise<string | null>((resolve) => {
    const heard = (hear: () => void): void => { if (round.current === mine) hear(); };
    start(file, { series, lesson, goesOn: shot, begun: (given) => heard(() => tell({ kind: 'begun', key, shot: given })) }, {
      progress: (sent) => heard(() => tell({ kind: 'progress', key, sent })),
      dropped: () => heard(() => tell({ kind: 'dropped' })),
      refused: (says) => heard(() => { tell({ kind: 'refused', key, says }); resolve(null); }),
      done: (given) => heard(() => { tell({ kind: 'there', key, shot: given }); resolve(given); }),
    }).then(
      (begun) => { if (round.current === mine) onItsWay.current = begun; else begun.leave(); },
      () => heard(() => { tell({ kind: 'refused', key: null, says: NOT_FROM_HERE }); resolve(null); }),
    );
  }), [start, series, lesson]);

  const showAll = useCallback((shots: readonly string[], words: string, mine: number) => {
    const ask = async (): Promise<void> => {
      const answer = await show({ series, lesson, words, shots: [...shots] });
      if (round.current !== mine) return;
      if (answer === 'shown') tell({ kind: 'shown' });
      else if (answer === 'later') tell({ kind: 'dropped' });
      else tell({ kind: 'refused', key: null, says: answer.says });
    };
    onItsWay.current = { again: () => void ask(), leave: () => undefined };
    void ask();
  }, [show, series, lesson]);

  const isCutOff = state.at === 'waiting' && state.tries > 0;
  useEffect(() => {
    if (!isCutOff || navigator.onLine) return;
    const { shots } = now.current;
    void kept.put({ series, lesson }, said.current, shots.map(({ file }) => file)).then((isKept) => { if (isKept) { end(); tell({ kind: 'kept' }); } }, () => undefined);
  }, [isCutOff, kept, series, lesson, end]);

  const send = useCallback((words: string) => {
    end();
    said.current = words;
    const mine = round.current;
    tell({ kind: 'send' });
    const goThrough = async (): Promise<void> => {
      const there: string[] = [];
      for (const shot of now.current.shots) {
        const given = shot.isThere && shot.shot !== null ? shot.shot : await sendOne(shot, mine);
        if (given === null || round.current !== mine) return;
        there.push(given);
      }
      if (there.length > 0) showAll(there, words, mine);
    };
    void goThrough();
  }, [end, sendOne, showAll]);
  const stop = useCallback(() => { end(); tell({ kind: 'stop' }); }, [end]);
  return {
    state,
    add: useCallback((files) => tell({ kind: 'add', files }), []),
    replace: useCallback((key, file) => tell({ kind: 'replace', key, file }), []),
    putAway: useCallback((key) => tell({ kind: 'put-away', key }), []),
    send,
    stop,
  };
}

import { useEffect, useState } from 'react';
import { tickQueue } from '#islands/ticks/browser-queue.ts';
import { markStep, moveHere, stepOf, tickedNow } from './step-marks.ts';

interface LiveLessonProps {
  seat: string;
  series: string;
  lesson: string;
}

/**
 * Takes over what the page under it can do by itself: the small forms of the steps answer at once. Draws nothing but the
 * words that say where a tick is kept.
 */
export function LiveLesson({ seat, series, lesson }: LiveLessonProps) {
  const [words, setWords] = useState('');
  useEffect(() => {
    const queue = tickQueue(seat);
    for (const [id, ticked] of queue.kept()) if (id.startsWith('step ')) markStep(id.slice(5), ticked);
    moveHere();
    const onSubmit = (event: SubmitEvent): void => {
      const step = event.target instanceof HTMLFormElement ? stepOf(event.target) : undefined;
      if (step === undefined) return;
      event.preventDefault();
      const ticked = !tickedNow(step);
      markStep(step, ticked);
      moveHere();
      queue.put({ id: `step ${step}`, body: { subject: 'step', series, lesson, item: step, ticked, changedAt: new Date().toISOString() } });
    };
    // The queue tells of a refusal again and again; the tick is taken back once.
    let takenBack: ReadonlySet<string> = new Set();
    const onQueue = (): void => {
      const { unsent, waits, refused } = queue.current();
      const fresh = [...refused].filter((id) => id.startsWith('step ') && !takenBack.has(id)).map((id) => id.slice(5));
      for (const step of fresh) markStep(step, !tickedNow(step));
      takenBack = refused;
      if (fresh.length > 0) moveHere();
      setWords(refused.size > 0 ? 'This step was not ticked: the part is not open to you any more. Load the page again.' : unsent.size > 0 && waits !== 'nothing' ? 'Kept on this device. It goes out when there is signal.' : '');
    };
    const stop = queue.subscribe(onQueue);
    document.addEventListener('submit', onSubmit);
    void queue.flush();
    return () => {
      stop();
      document.removeEventListener('submit', onSubmit);
    };
  }, [seat, series, lesson]);
  return <p className="kept-steps small" role="status">{words}</p>;
}

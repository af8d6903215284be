import { useEffect, useState } from 'react';
import { outboxOf, personOfPage } from '#islands/keeping/outbox.ts';
import { putTick, ticksHere, type TicksHere } from '#islands/ticks/tick-outbox.ts';
import { markStep, moveHere, stepOf, tickedNow } from './step-marks.ts';

interface LiveLessonProps {
  /** Revision of the seat's ticks the page was drawn with. */
  asOf: number;
  series: string;
  lesson: string;
}

/**
 * Takes over what the page under it can do by itself: the small forms of the steps answer at once. Draws nothing but the
 * words that say where a tick is kept.
 */
export function LiveLesson({ asOf, series, lesson }: LiveLessonProps) {
  const [words, setWords] = useState('');
  useEffect(() => {
    const person = personOfPage();
    if (person === null) return;
    const outbox = outboxOf(person);
    const steps = [...document.querySelectorAll<HTMLFormElement>('form.step-form')].flatMap((form) => stepOf(form) ?? []);
    const drawn = new Map(steps.map((step) => [step, tickedNow(step)]));
    const show = (): void => {
      const here = ticksHere(outbox.current(), series, asOf);
      for (const [step, was] of drawn) markStep(step, here.ticked.get(`step ${lesson}:${step}`) ?? was);
      moveHere();
      setWords(wordsOf(here));
    };
    const onSubmit = (event: SubmitEvent): void => {
      const step = event.target instanceof HTMLFormElement ? stepOf(event.target) : undefined;
      if (step === undefined) return;
      event.preventDefault();
      putTick(outbox, { subject: 'step', series, lesson, item: step, ticked: !tickedNow(step) }, asOf);
    };
    const stop = outbox.subscribe(show);
    document.addEventListener('submit', onSubmit);
    show();
    return () => {
      stop();
      document.removeEventListener('submit', onSubmit);
    };
  }, [asOf, series, lesson]);
  return <p className="kept-steps small" role="status">{words}</p>;
}

function wordsOf({ refused, unsent, waits }: TicksHere): string {
  if (refused > 0) return 'This step was not ticked: the part is not open to you any more. Load the page again.';
  return unsent.size > 0 && waits !== 'nothing' ? 'Kept on this device. It goes out when there is signal.' : '';
}

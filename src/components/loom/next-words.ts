// What is next on the loom, said to the person: a heading, a line under it, and the one act.
import { firstName, opensWhen } from '#core/following/opening-words.ts';
import type { NextAct } from '#core/following/next-act.ts';
import { stepsDone } from '#core/following/progress.ts';
import { titleHalves } from '#core/series/title.ts';
import { minutesText } from '#core/units/minutes-text.ts';
import type { PartOnLoom, SeatOnLoom } from '#server/queries/loom/my-loom.ts';

export interface NextWords {
  /** `Part 2 of 7`; empty where it is about no part. */
  readonly where: string;
  readonly heading: string;
  readonly lead: string;
  readonly act: { readonly label: string; readonly href: string };
  /** Whether the part has steps to be seen at the loom side; its address. */
  readonly loomSide: string | undefined;
}

export interface NextFacts {
  readonly seat: SeatOnLoom;
  readonly next: NextAct;
  /** The words of the step in hand, with her own amounts. */
  readonly step: string | undefined;
  readonly timeZone: string;
}

export function nextWords(facts: NextFacts): NextWords {
  const { seat, next } = facts;
  const address = `/series/${seat.slug}`;
  const { name } = titleHalves(seat.title);
  if (next.act === 'finished' && seat.partsToCome > 0) {
    const to = seat.parts.length + 1;
    return { where: '', heading: `Part ${to} is being written.`, lead: 'Every part that is out is done. You get a letter when the next one opens to you.', act: { label: 'See the parts again', href: `${address}/1` }, loomSide: undefined };
  }
  if (next.act === 'finished') {
    return { where: '', heading: `${name} is off the loom.`, lead: 'Every part is done. What you learned stays open to you, as long as you like.', act: { label: 'Photo, hours and label', href: `${address}/finish` }, loomSide: undefined };
  }
  const part = seat.parts.find(({ number }) => 'part' in next && number === next.part.number);
  if (next.act === 'none' || part === undefined) {
    return { where: '', heading: `${name} has no part yet.`, lead: 'You get a letter when the first one opens.', act: { label: 'See the series', href: address }, loomSide: undefined };
  }
  const here = `${address}/${part.number}`;
  return {
    where: `Part ${part.number} of ${seat.parts.length}`,
    loomSide: next.act === 'go-on' && part.steps.length > 0 ? `${here}/loomside` : undefined,
    ...wordsOf(facts, part, here),
  };
}

function wordsOf({ seat, next, step, timeZone }: NextFacts, part: PartOnLoom, here: string): Pick<NextWords, 'heading' | 'lead' | 'act'> {
  const teacher = firstName(seat.teacherName);
  const days = seat.answerDays === 1 ? 'a day' : `${seat.answerDays} days`;
  const takes = part.minutes === 0 ? '' : ` It takes about ${minutesText(part.minutes)}.`;
  const gather = `/series/${seat.slug}/gather`;
  switch (next.act) {
    case 'begin':
      return { heading: 'Begin with what to gather.', lead: `${part.title} is open.${takes} See what it needs before you begin.`, act: { label: 'Begin with Part 1', href: here } };
    case 'show':
      return { heading: part.checkpoint === null ? 'Send a photo.' : `${part.checkpoint.ask.replace(/\.$/, '')}.`, lead: `All steps of ${part.title} are ticked. ${teacher} looks at your photo, and most answers come within ${days}.`, act: { label: `Send the photo of Part ${part.number}`, href: `${here}#checkpoint` } };
    case 'mend':
      return { heading: 'Mend first.', lead: `${part.noteCount === 0 ? `${teacher} says what to mend` : `${teacher} left ${part.noteCount === 1 ? 'one note' : `${part.noteCount} notes`} on your photo`} of Part ${part.number}. Then send a second one.`, act: { label: 'See what to mend', href: `${here}#checkpoint` } };
    case 'wait': {
      const after = seat.parts.find(({ number }) => number === part.number + 1);
      const opens = after === undefined ? '' : ` Part ${after.number} ${opensWhen({ standing: after.standing, awaited: awaitedBy(seat, after), teacher, timeZone })}.`;
      return { heading: `${teacher} has your photo.`, lead: `Most answers come within ${days}.${opens} Gather for it meanwhile.`, act: { label: 'What to gather next', href: after === undefined ? gather : `${gather}?part=${after.number}` } };
    }
    case 'close':
      return { heading: `${part.title}: every step is ticked.`, lead: 'Read the end of the part once more, then say that it is done.', act: { label: `Finish Part ${part.number}`, href: `${here}#end` } };
    case 'opens':
      return { heading: `Next: ${part.title.charAt(0).toLowerCase()}${part.title.slice(1)}.`, lead: `Part ${part.number} ${opensWhen({ standing: part.standing, awaited: awaitedBy(seat, part), teacher, timeZone })}. Gather for it meanwhile.`, act: { label: 'What to gather next', href: `${gather}?part=${part.number}` } };
    default: {
      const done = stepsDone(part);
      return {
        heading: step === undefined ? `Next: ${part.title.charAt(0).toLowerCase()}${part.title.slice(1)}.` : `Next: ${step.charAt(0).toLowerCase()}${step.slice(1)}`,
        lead: done === 0 ? `${part.title} is open.${takes}` : `You did ${done} of ${part.steps.length} steps of ${part.title}.`,
        act: { label: done === 0 ? `Begin Part ${part.number}` : `Go on with Part ${part.number}`, href: here },
      };
    }
  }
}

/** The part whose photo a closed part waits for. */
export function awaitedBy(seat: SeatOnLoom, { standing }: Pick<PartOnLoom, 'standing'>): { number: number; ask: string | null } | undefined {
  if (standing.open || standing.until === 'date') return undefined;
  const before = seat.parts.find(({ publicId }) => publicId === standing.lesson);
  return before === undefined ? undefined : { number: before.number, ask: before.checkpoint?.ask ?? null };
}

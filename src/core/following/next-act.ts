/** What a student does next in a series: one act, never two. */
import { howFar, stepsDone, type PartInHand } from './progress.ts';

export type NextAct =
  /** Nothing begun: what to gather comes first. */
  | { readonly act: 'begin'; readonly part: PartInHand }
  /** `step`: id of the first that is not ticked; undefined when the text has none. */
  | { readonly act: 'go-on'; readonly part: PartInHand; readonly step: string | undefined }
  /** All steps are ticked: the photo is missing. */
  | { readonly act: 'show'; readonly part: PartInHand }
  | { readonly act: 'mend'; readonly part: PartInHand }
  /** Her photo is with the teacher, and nothing else is open. */
  | { readonly act: 'wait'; readonly part: PartInHand }
  /** All steps are ticked; nothing is asked but to say that it is done. */
  | { readonly act: 'close'; readonly part: PartInHand }
  /** The part in hand opens later. */
  | { readonly act: 'opens'; readonly part: PartInHand }
  | { readonly act: 'finished' }
  /** The series has no part yet. */
  | { readonly act: 'none' };

export function nextAct(parts: readonly PartInHand[]): NextAct {
  const { inHand } = howFar(parts);
  if (inHand === undefined) return { act: parts.length === 0 ? 'none' : 'finished' };
  // While a photo waits, a later part may be open already.
  if (inHand.verdict === 'waits') {
    const ahead = parts.find((part) => part.number > inHand.number && part.standing.open && part.verdict === null && !part.isFinished);
    return ahead === undefined ? { act: 'wait', part: inHand } : stepIn(ahead, parts);
  }
  if (inHand.verdict === 'mend-first') return { act: 'mend', part: inHand };
  return inHand.standing.open ? stepIn(inHand, parts) : { act: 'opens', part: inHand };
}

function stepIn(part: PartInHand, parts: readonly PartInHand[]): NextAct {
  const step = part.steps.find((id) => !part.ticked.has(id));
  if (step === undefined && part.steps.length > 0) return { act: part.asksForPhoto ? 'show' : 'close', part };
  const untouched = part.number === 1 && stepsDone(part) === 0 && parts.every(({ ticked }) => ticked.size === 0);
  return untouched ? { act: 'begin', part } : { act: 'go-on', part, step };
}

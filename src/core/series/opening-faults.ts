/**
 * Whether every part of a series can open, each no earlier than those before it. A student who paid must be able to
 * come to the end, so this is asked before publishing and at each change of an open series.
 */
export interface PartOpening {
  /** 1 for the first part. */
  readonly number: number;
  /** The part it waits for; `taken-out` when that one is no longer there. */
  readonly opensAfterPart: number | 'taken-out' | null;
  /** What it waits for there: that the photo has its verdict, or only that the part is done. */
  readonly waitsFor: 'verdict' | 'done';
  readonly hasCheckpoint: boolean;
  /** Of a part that opens on a date. */
  readonly opensAt: Date | null;
}

export interface OpeningFault {
  readonly part: number;
  readonly says: string;
}

/** `parts` in their order; at most two faults for each. */
export function openingFaults(parts: readonly PartOpening[]): OpeningFault[] {
  return parts.flatMap((part) => [waitsInVain(part, parts), opensTooEarly(part, parts)].flatMap((says) => (says === null ? [] : [{ part: part.number, says }])));
}

function waitsInVain({ number, opensAfterPart: awaited, waitsFor }: PartOpening, parts: readonly PartOpening[]): string | null {
  if (awaited === null) return null;
  if (awaited === 'taken-out') return 'It waits for a part that was taken out. Choose another part, or let it open in another way.';
  if (awaited === number) return waitsFor === 'done' ? 'It waits for itself, so nobody could ever open it.' : 'It waits for its own photo, so nobody could ever open it.';
  if (awaited > number) return `It waits for Part ${awaited}, which comes later, so nobody could ever open it.`;
  const earlier = parts.find((part) => part.number === awaited);
  return waitsFor === 'done' || earlier?.hasCheckpoint === true ? null : `It waits for a verdict on Part ${awaited}, which asks for no photo.`;
}

function opensTooEarly({ number, opensAt }: PartOpening, parts: readonly PartOpening[]): string | null {
  if (opensAt === null) return null;
  const later = parts.find((part) => part.number < number && part.opensAt !== null && part.opensAt > opensAt);
  return later === undefined ? null : `It opens before Part ${later.number}. Parts open in their order.`;
}

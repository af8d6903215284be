/** Parts a student can open while one in front of them still waits: mostly a rule that was forgotten after the first was set. */
import type { PartOpening } from '#core/series/opening-faults.ts';
import { partsList } from '#core/series/parts-list.ts';

export interface PassingBy {
  /** The first of the parts that pass. */
  readonly part: number;
  readonly says: string;
}

type Part = Pick<PartOpening, 'number' | 'opensAfterPart'> & { readonly isPreview: boolean };

/** Told by the waiting part that stands nearest in front; a part free to read may be read at any time. */
export function passingBy(parts: readonly Part[]): PassingBy[] {
  const gates = parts.flatMap(({ number, opensAfterPart: awaited }) => (typeof awaited === 'number' && awaited < number ? [{ number, awaited }] : []));
  return gates.flatMap((gate, index) => {
    const next = gates[index + 1]?.number ?? Infinity;
    const passing = parts.filter((part) => part.number > gate.number && part.number <= next && !part.isPreview && !waitsFor(part, new Set([gate.awaited, gate.number]), parts)).map(({ number }) => number);
    const [first] = passing;
    if (first === undefined) return [];
    const they = passing.length === 1 ? 'it builds on it, let it' : 'they build on it, let them';
    return [{ part: first, says: `${partsList(passing)} can be opened while Part ${gate.number} still waits for Part ${gate.awaited}. If ${they} wait too.` }];
  });
}

/** Whether a part waits for one of `awaited`, be it through others. Waits only ever go back, so this ends. */
function waitsFor({ number, opensAfterPart: next }: Part, awaited: ReadonlySet<number>, parts: readonly Part[]): boolean {
  if (typeof next !== 'number' || next >= number) return false;
  const before = parts.find((part) => part.number === next);
  return awaited.has(next) || (before !== undefined && waitsFor(before, awaited, parts));
}

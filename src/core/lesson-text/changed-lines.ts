/** What changed between two texts, line by line. */

export interface LineChange {
  /** `in`: only in the new text. `out`: only in the old one. `gap`: lines that are the same, left out. */
  readonly kind: 'same' | 'in' | 'out' | 'gap';
  readonly text: string;
}

/** Beyond this many pairs of lines the differing middle is told as taken out and put in anew. */
const MOST_PAIRS = 4_000_000;
/** Lines that are shown round a change. */
const AROUND = 2;

/** The changes from `before` to `after` with a little of what stands round them; empty when the texts are the same. */
export function changedLines(before: string, after: string): LineChange[] {
  if (before === after) return [];
  const [old, fresh] = [before.split('\n'), after.split('\n')];
  const head = sameAtHead(old, fresh);
  const tail = sameAtTail(old.slice(head), fresh.slice(head));
  const all: LineChange[] = [
    ...asLines('same', old.slice(0, head)),
    ...middle(old.slice(head, old.length - tail), fresh.slice(head, fresh.length - tail)),
    ...asLines('same', old.slice(old.length - tail)),
  ];
  return withoutFarLines(all);
}

const asLines = (kind: LineChange['kind'], lines: readonly string[]): LineChange[] => lines.map((text) => ({ kind, text }));

function sameAtHead(old: readonly string[], fresh: readonly string[]): number {
  let count = 0;
  while (count < old.length && count < fresh.length && old[count] === fresh[count]) count += 1;
  return count;
}

function sameAtTail(old: readonly string[], fresh: readonly string[]): number {
  let count = 0;
  while (count < old.length && count < fresh.length && old[old.length - 1 - count] === fresh[fresh.length - 1 - count]) count += 1;
  return count;
}

/** By the longest run of lines that both have in common (dynamic programming from the end). */
function middle(old: readonly string[], fresh: readonly string[]): LineChange[] {
  if (old.length * fresh.length > MOST_PAIRS) return [...asLines('out', old), ...asLines('in', fresh)];
  const width = fresh.length + 1;
  const common = new Uint16Array((old.length + 1) * width);
  const at = (i: number, j: number): number => common[i * width + j] ?? 0;
  for (let i = old.length - 1; i >= 0; i -= 1) {
    for (let j = fresh.length - 1; j >= 0; j -= 1) common[i * width + j] = old[i] === fresh[j] ? at(i + 1, j + 1) + 1 : Math.max(at(i + 1, j), at(i, j + 1));
  }
  const changes: LineChange[] = [];
  let [i, j] = [0, 0];
  while (i < old.length || j < fresh.length) {
    const [was, is] = [old[i], fresh[j]];
    if (was !== undefined && was === is) {
      changes.push({ kind: 'same', text: was });
      i += 1;
      j += 1;
    } else if (was !== undefined && (is === undefined || at(i + 1, j) >= at(i, j + 1))) {
      changes.push({ kind: 'out', text: was });
      i += 1;
    } else {
      changes.push({ kind: 'in', text: is ?? '' });
      j += 1;
    }
  }
  return changes;
}

function withoutFarLines(all: readonly LineChange[]): LineChange[] {
  const isNear = all.map(() => false);
  for (const [index, { kind }] of all.entries()) {
    if (kind !== 'same') for (let near = Math.max(0, index - AROUND); near <= Math.min(all.length - 1, index + AROUND); near += 1) isNear[near] = true;
  }
  return all.flatMap((line, index) => {
    if (isNear[index] === true) return [line];
    return index === 0 || isNear[index - 1] === true ? [{ kind: 'gap' as const, text: '' }] : [];
  });
}

/**
 * How a thread goes through the warp: the one model behind the drawn cloth, the figures that move, and the words for both.
 *
 * A lay is the thread's way in the order the hand leads it: stretch after stretch on one face of the cloth, each passing some
 * ends. Where the next stretch begins at the very end the last one ended at, the thread turns round that end; else it goes
 * through the gap between the two. Ends are working ends, from the left, beginning with 0; two ends worked as one are one.
 */

export type Face = 'front' | 'back';
export type Way = 'right' | 'left';

export interface Pass {
  readonly face: Face;
  /** First and last end passed. */
  readonly from: number;
  readonly to: number;
  /** Which way the hand goes; a stretch past a single end has one, too. */
  readonly way: Way;
  /** Stands off from the cloth: a loop that is drawn up, roving that is puffed. */
  readonly raised?: 'loop' | 'puff';
}

export type Lay = readonly Pass[];

/** Ends side by side, `last` included. */
export interface Ends {
  readonly first: number;
  readonly last: number;
}

export const endsIn = ({ from, to }: Pass): number => Math.abs(to - from) + 1;
/** Whether the thread turns round an end to come to this stretch, and does not go through a gap. */
export const turnsBefore = (pass: Pass, before: Pass | undefined): boolean => before !== undefined && before.to === pass.from;

const otherFace = (face: Face): Face => (face === 'front' ? 'back' : 'front');
const otherWay = (way: Way): Way => (way === 'right' ? 'left' : 'right');
/** The same ends passed from the other side. */
const reversed = (pass: Pass): Pass => ({ ...pass, from: pass.to, to: pass.from, way: otherWay(pass.way) });
/** Stretches laid to the right, as the hand that goes `way` lays them. */
const inWay = (passes: readonly Pass[], way: Way): Lay => (way === 'right' ? passes : passes.map(reversed).reverse());

/** The spacer card lies below the first row, like one that came before it. */
export const CARD_ROW = -1;

/** Which face a row of tabby lies on at an end. Row 0 is the first one woven, and goes over end 0. */
export function tabbyFace(end: number, row: number): Face {
  return (((end + row) % 2) + 2) % 2 === 0 ? 'front' : 'back';
}

/** The hand goes to the right in even rows. */
export const wayOfRow = (row: number): Way => (row % 2 === 0 ? 'right' : 'left');

/** A row of tabby over some ends: of a whole width, or of one colour in it. Neighbouring colours keep step with each other. */
export function tabbyRow({ first, last }: Ends, row: number, way: Way = wayOfRow(row)): Lay {
  const passes = Array.from({ length: Math.max(0, last - first + 1) }, (_, index): Pass => {
    const end = first + index;
    return { face: tabbyFace(end, row), from: end, to: end, way: 'right' };
  });
  return inWay(passes, way);
}

/** Two neighbouring ends taken as one each time, whatever number they have: over two, under two. */
export function basketRow(ends: Ends, row: number, together = 2, way: Way = wayOfRow(row)): Lay {
  return floatsOf(ends, together, tabbyFace(0, row), way);
}

function floatsOf({ first, last }: Ends, together: number, begin: Face, way: Way): Lay {
  const passes: Pass[] = [];
  for (let from = first, face = begin; from <= last; from += together, face = otherFace(face)) {
    passes.push({ face, from, to: Math.min(last, from + together - 1), way: 'right' });
  }
  return inWay(passes, way);
}

/** Over two ends and under two, moved on by one end to the right in every row: after four rows it begins again. */
export function twillRow({ first, last }: Ends, row: number, way: Way = wayOfRow(row)): Lay {
  const faceAt = (end: number): Face => ((((end - row) % 4) + 4) % 4 < 2 ? 'front' : 'back');
  const passes: Pass[] = [];
  for (let end = first; end <= last; end++) {
    const before = passes.at(-1);
    if (before?.face === faceAt(end)) passes[passes.length - 1] = { ...before, to: end };
    else passes.push({ face: faceAt(end), from: end, to: end, way: 'right' });
  }
  return inWay(passes, way);
}

/** A very thick weft over some ends and under as many, puffed up where it lies in front. A last short stretch is laid flat. */
export function rovingRow(ends: Ends, over: number, way: Way = 'right'): Lay {
  return floatsOf(ends, over, 'front', way).map((pass) => (pass.face === 'front' && endsIn(pass) === over ? { ...pass, raised: 'puff' } : pass));
}

/** Tabby with every stretch on the face drawn up to a loop, but for the ends at both selvedges. */
export function loopRow(ends: Ends, row: number, way: Way = wayOfRow(row)): Lay {
  return tabbyRow(ends, row, way).map((pass) => (pass.face === 'front' && pass.from > ends.first && pass.from < ends.last ? { ...pass, raised: 'loop' } : pass));
}

/**
 * Soumak: forward over some ends, back under fewer, round and round. Ends that are left at the far side take one shorter
 * stitch. Throws `RangeError` unless 1 ≤ back < over.
 */
export function soumakRow({ first, last }: Ends, over: number, back: number, way: Way = 'right'): Lay {
  if (!(back >= 1 && back < over)) throw new RangeError(`no stitch over ${over} and back ${back}`);
  const passes: Pass[] = [];
  for (let from = first; from + back <= last || from === first; from += over - back) {
    const to = Math.min(last, from + over - 1);
    passes.push({ face: 'front', from, to, way: 'right' }, { face: 'back', from: to, to: Math.max(first, to - back + 1), way: 'left' });
    if (to === last) break;
  }
  /* To the left the same is seen in a mirror: forward and back keep their order. */
  const mirror = (end: number): number => first + last - end;
  return way === 'right' ? passes : passes.map((pass) => ({ face: pass.face, from: mirror(pass.from), to: mirror(pass.to), way: otherWay(pass.way) }));
}

/**
 * A rya knot on two legs of `legEnds`: from one tail, between the legs, behind the left one, round it, over both, round the
 * right one, behind it, and out between them again.
 */
export function ryaKnot(first: number, legEnds: number): Lay {
  const [inner, last] = [first + legEnds - 1, first + 2 * legEnds - 1];
  return [
    { face: 'back', from: inner, to: first, way: 'left' },
    { face: 'front', from: first, to: last, way: 'right' },
    { face: 'back', from: last, to: inner + 1, way: 'left' },
  ];
}

/** The two strands of a row of twining: where one lies in front the other lies behind. They change places after so many ends each time. */
export function twinedRow(ends: Ends, endsPerTwist = 1): readonly [Lay, Lay] {
  return [floatsOf(ends, endsPerTwist, 'front', 'right'), floatsOf(ends, endsPerTwist, 'back', 'right')];
}

/** Hem-stitch, from right to left: behind a bundle, round the front of it, behind it again; then up into the cloth. */
export function hemStitch({ first, last }: Ends): Lay {
  return [
    { face: 'back', from: last, to: first, way: 'left' },
    { face: 'front', from: first, to: last, way: 'right' },
    { face: 'back', from: last, to: first, way: 'left' },
  ];
}

/** How two colours of a row meet: at a slit each turns round its own last end, dovetailed both round one, interlocked round each other. */
export type Meeting = 'slit' | 'dovetail' | 'interlock';

/** The ends of the colour at the left of a boundary, which lies before end `at`, and of the one at its right. */
export function colourEnds(ends: Ends, at: number, meeting: Meeting): readonly [Ends, Ends] {
  const shared = meeting === 'dovetail' ? at : at - 1;
  return [{ first: ends.first, last: shared }, { first: at, last: ends.last }];
}

/**
 * The ends on which one row shows each of the two colours. An end that is shared shows one of them there and back, then the
 * other: that is how the hand takes turns.
 */
export function endsShown(ends: Ends, at: number, meeting: Meeting, row: number): readonly [Ends, Ends] {
  const [left, right] = colourEnds(ends, at, meeting);
  if (left.last < right.first) return [left, right];
  return (((row % 4) + 4) % 4) < 2 ? [left, { ...right, first: right.first + 1 }] : [{ ...left, last: left.last - 1 }, right];
}

/** Stretches of a lay on one face. */
export const onFace = (lay: Lay, face: Face): Lay => lay.filter((pass) => pass.face === face);

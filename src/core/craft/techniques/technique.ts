/**
 * What a weaving technique is to the reckoning: how its band is read, how high it
 * comes out, what can be wrong with it on this loom, and what it takes. One technique
 * is one file beside this one, and one line in `registry.ts`.
 */
import type { BandByTechnique, TechniqueName } from '#core/craft/piece.ts';
import { spacingOfRows, type PickGeometry, type RowBeat } from '#core/craft/picks.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import type { ErrorCode, WarningCode } from '#core/craft/reading/findings.ts';
import type { Work } from '#core/craft/time.ts';
import { withStrands, type Thread } from '#core/craft/yarn/thread.ts';

/** The dressed loom, as far as weaving needs to know it. */
export interface DressedLoom {
  readonly workingEnds: number;
  /** Between working ends. */
  readonly spacingMm: number;
  /** Compressed, of a working end. */
  readonly warpDiameterMm: number;
  /** Finished width of the cloth. */
  readonly widthMm: number;
  readonly beat: RowBeat;
  readonly tailMm: number;
  /** By yarn role. */
  readonly threads: ReadonlyMap<string, Thread>;
  /** By `pickKey`, where such picks can be woven at all. */
  readonly picks: ReadonlyMap<string, LaidPicks>;
}

/**
 * How yarn comes to the loom: wound on a shuttle or butterfly, which costs two tails a
 * load; laid in row by row, tails already counted; or cut into strands.
 */
export type Carry = 'shuttle' | 'by-the-row' | 'cut';

export interface YarnUse {
  readonly role: string;
  readonly carry: Carry;
  /** The thread as it lies, all its strands together. */
  readonly threadMm: number;
  /** Yarn it takes: the thread's length times its strands. */
  readonly yarnMm: number;
  /** The thread of one whole row, where there are rows a load can last for. */
  readonly rowMm?: number;
}

/** A yarn as it lies in the picks of a band. */
export interface PickOf {
  readonly role: string;
  /** Strands in a row, where not as many as the yarn is taken together otherwise. */
  readonly strands?: number;
  /** Over and under two working ends at a time. */
  readonly pairs?: true;
}

/** Picks on this loom. */
export interface LaidPicks extends PickGeometry {
  readonly pick: PickOf;
  /** Ends the weft meets: half the loom's in basket weave. */
  readonly workingEnds: number;
  /** Between them. */
  readonly spacingMm: number;
}

/** The name under which such picks are laid. */
export function pickKey({ role, strands, pairs }: PickOf): string {
  return [role, ...(strands === undefined ? [] : [`${String(strands)} strands`]), ...(pairs === true ? ['pairs'] : [])].join(', ');
}

/** Rows of tabby with one ground yarn. */
export interface PickRun {
  /** Its `pickKey`. */
  readonly key: string;
  readonly rows: number;
  /** Before rounding to whole rows. */
  readonly rawRows: number;
}

/** What one band takes. */
export interface Woven {
  readonly picks?: PickRun;
  readonly counts: {
    readonly picks?: number;
    readonly stitches?: number;
    readonly knots?: number;
    readonly strands?: number;
    readonly cutMm?: number;
  };
  readonly uses: readonly YarnUse[];
  readonly work: Partial<Work>;
}

/** Where a technique says what is wrong with its band; `key` is a path below the band, such as `over`. */
export interface BandReport {
  reject(code: ErrorCode, key: string, message: string): void;
  warn(code: WarningCode, key: string, message: string): void;
  /** A length in the person's own units. */
  length(mm: number): string;
}

/** A yarn role a band names, and the path below the band where it does. */
export interface NamedRole {
  readonly key: string;
  readonly role: string;
  /** Picks of it are woven so, and must close between the ends; missing where none are. */
  readonly picks?: PickOf;
}

/** What a person is told of a technique. */
export interface TechniqueWords {
  /** In a list of choices. */
  readonly label: string;
  /** What the hand does, in a sentence. */
  readonly how: string;
  /** Beside loom and needle; none where those are enough. */
  readonly tools: readonly string[];
  /** What goes wrong, and what to do. */
  readonly cautions: readonly string[];
}

export interface Technique<N extends TechniqueName> {
  /** Reads its band; keys that nobody read are refused by the caller. */
  read(fields: Fields): BandByTechnique[N];
  roles(band: BandByTechnique[N]): readonly NamedRole[];
  /** Whether the band asks for an even number of working ends; missing where no band of it does. */
  needsEvenEnds?(band: BandByTechnique[N]): boolean;
  height(band: BandByTechnique[N], loom: DressedLoom): number | 'fill';
  /** Rows in which its shapes are stepped out, which is what reckoning a large piece takes its time for. */
  shapeRows?(band: BandByTechnique[N], loom: DressedLoom): number;
  check(band: BandByTechnique[N], heightMm: number, loom: DressedLoom, report: BandReport): void;
  /** `fromRow` leaves out so many rows that are woven already; only tabby, whose rows are not told by the band, heeds it. */
  weave(band: BandByTechnique[N], heightMm: number, loom: DressedLoom, fromRow?: number): Woven;
}

/** @throws if the role is not among the loom's threads, which reading the piece has ruled out */
export function threadOn(loom: DressedLoom, role: string): Thread {
  const thread = loom.threads.get(role);
  if (thread === undefined) throw new Error(`no yarn in the role ${role}`);
  return thread;
}

/** The yarn with as many strands as lie in these picks. */
export function threadInPicks(loom: DressedLoom, pick: PickOf): Thread {
  const thread = threadOn(loom, pick.role);
  return pick.strands === undefined ? thread : withStrands(thread, pick.strands);
}

/** @throws if such picks jam, which must have been refused before */
export function picksOn(loom: DressedLoom, pick: PickOf): LaidPicks {
  const key = pickKey(pick);
  const geometry = loom.picks.get(key);
  if (geometry === undefined) throw new Error(`no picks of the yarn ${key}`);
  return geometry;
}

export function pickSpacingOn(loom: DressedLoom, role: string): number {
  return spacingOfRows(loom.beat, threadOn(loom, role).compressedMm, loom.spacingMm);
}

/** D with the yarn lying free: warp and loft of the weft. */
export function loftSum(loom: DressedLoom, thread: Thread): number {
  return loom.warpDiameterMm + thread.loftMm;
}

/** So many rows of one length each. */
export function rowsOf(role: string, carry: Carry, rows: number, rowMm: number, thread: Thread): YarnUse {
  const threadMm = rows * rowMm;
  return { role, carry, threadMm, yarnMm: threadMm * thread.strands, rowMm };
}

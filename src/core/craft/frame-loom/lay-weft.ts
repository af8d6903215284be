/** Every yarn as it lies between these ends: does it close, does it beat down, does the warp show. */
import { ASHENHURST_K, TIGHTNESS } from '#core/craft/defaults.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { admitsWave } from '#core/craft/given-wave.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { BEAT_RANGE, beatOfSwatch, pickGeometry, spacingOfRows, type RowBeat } from '#core/craft/picks.ts';
import type { Weave } from '#core/craft/weave.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { below } from '#core/craft/reading/findings.ts';
import { adviseSpacing, spacingThatSuits, strandsFor, tightness } from '#core/craft/sett.ts';
import type { LaidPicks, PickOf } from '#core/craft/techniques/technique.ts';
import { diameterTogether } from '#core/craft/yarn/diameter.ts';
import { threadOf, withStrands, type Thread } from '#core/craft/yarn/thread.ts';

export function threadsOf(yarns: ReadonlyMap<string, Yarn | undefined>): ReadonlyMap<string, Thread> {
  const threads = new Map<string, Thread>();
  for (const [role, yarn] of yarns) {
    if (yarn !== undefined) threads.set(role, threadOf(yarn, ASHENHURST_K.weft));
  }
  return threads;
}

/** A yarn between the ends it meets. */
interface Crossed {
  readonly pick: PickOf;
  /** Where it stands in the piece. */
  readonly path: string;
  readonly thread: Thread;
  readonly workingEnds: number;
  readonly spacingMm: number;
  /** Compressed, of what it meets as one end. */
  readonly warpMm: number;
}

/** In basket weave two working ends are met as one, √2 as thick. */
function crossedBy(pick: PickOf, thread: Thread, { ends, workingDiameterMm }: DressedWarp): Crossed {
  const together = pick.pairs === true ? 2 : 1;
  return {
    pick,
    path: below('/yarns', pick.role),
    thread: pick.strands === undefined ? thread : withStrands(thread, pick.strands),
    workingEnds: Math.floor(ends.working / together),
    spacingMm: ends.spacingMm * together,
    warpMm: diameterTogether(workingDiameterMm, together),
  };
}

/** What would let a thick yarn close, in the order of how easily it is done. */
function waysOut({ thread, warpMm }: Crossed, findings: Findings): string {
  const fewerStrands = thread.strands > 1 ? 'fewer strands together, ' : '';
  const least = findings.length(warpMm + thread.compressedMm, 'up');
  return `Use a thinner yarn, ${fewerStrands}or ends at least ${least} apart.`;
}

function reportJam(crossed: Crossed, findings: Findings): void {
  const { path, thread, spacingMm } = crossed;
  const yarn = `This yarn is ${findings.length(thread.compressedMm)} thick. With ends ${findings.length(spacingMm)} apart the rows cannot close.`;
  findings.reject('E_JAM', path, `${yarn} ${waysOut(crossed, findings)}`);
}

/** How many strands of it would come out well; a warp that loosens by itself leaves that open. */
function strandsWords({ thread, spacingMm, warpMm }: Crossed): string {
  const strands = strandsFor(spacingMm, warpMm, withStrands(thread, 1).compressedMm);
  return strands === undefined || strands <= thread.strands ? 'Take more strands together' : `Take ${String(strands)} strands together`;
}

function reportWeftFaced(crossed: Crossed, findings: Findings): void {
  const { path, thread, spacingMm, warpMm } = crossed;
  if (tightness(warpMm, thread.loftMm, spacingMm) > 1) {
    findings.warn('W_WARP_SHOWS', path, 'This yarn is as thick as the room between the ends: it will not beat down, and the warp will show.');
  } else if (adviseSpacing(spacingMm, warpMm, thread.loftMm) === 'too-thick') {
    const suits = findings.length(spacingThatSuits(warpMm, thread.loftMm), 'up');
    findings.warn('W_THICK', path, `This yarn is thick for ends so close, and hard to beat down. It suits ends ${suits} apart and more.`);
  }
  if (tightness(warpMm, thread.compressedMm, spacingMm) < TIGHTNESS.loose) {
    findings.warn('W_LOOSE', path, `This yarn is thin for the room between the ends, and the rows may slip. ${strandsWords(crossed)}, or set the ends closer.`);
  }
}

interface Cloth {
  readonly beat: RowBeat;
  readonly weave: Weave;
}

/** The picks of one yarn, unless it jams. `spacing` from row to row. */
function layYarn(crossed: Crossed, spacing: number, weave: Weave, findings: Findings): LaidPicks | undefined {
  const { path, pick, thread, workingEnds, spacingMm, warpMm } = crossed;
  const weftMm = thread.compressedMm;
  if (weave.mode === 'given' && !admitsWave(weave.weftWaveMm, { diameterSumMm: warpMm + weftMm, warpSpacingMm: spacingMm, weftSpacingMm: spacing }, '/weftWaveMm', findings)) return undefined;
  const geometry = pickGeometry({ spacingMm, warpDiameterMm: warpMm, weftDiameterMm: weftMm, pickSpacingMm: spacing, ...weave });
  if (geometry === undefined) {
    reportJam(crossed, findings);
    return undefined;
  }
  if (beatOfSwatch(1, spacing, thread.compressedMm) > BEAT_RANGE.max + 1e-9) {
    const most = Math.floor((10 * BEAT_RANGE.max * 10) / thread.compressedMm) / 10;
    findings.reject('E_RANGE', '/beat/picksPerCm', `Rows of this yarn cannot lie so close: up to ${String(most)} in a centimetre work. Count the swatch again.`);
  }
  if (geometry.clamped) {
    findings.warn('W_CLAMPED', path, 'Warp and weft cannot bend alike in so close a cloth. The nearest that is possible is reckoned.');
  }
  if (weave.mode === 'straight-warp') reportWeftFaced(crossed, findings);
  return { ...geometry, pick, workingEnds, spacingMm };
}

/** A swatch was counted with the yarn as it is taken together otherwise; rows of more strands lie as much further apart. */
function rowSpacing(beat: RowBeat, usual: Thread, { thread, spacingMm }: Crossed): number {
  const isCounted = beat !== 'as-ends' && beat.picksPerCm !== undefined;
  return spacingOfRows(beat, thread.compressedMm, spacingMm) * (isCounted ? thread.compressedMm / usual.compressedMm : 1);
}

/** Every way in which yarn is woven in picks, by its key; one that jams is reported and missing. */
export function layWeft(
  ways: ReadonlyMap<string, PickOf>,
  threads: ReadonlyMap<string, Thread>,
  warp: DressedWarp,
  { beat, weave }: Cloth,
  findings: Findings,
): ReadonlyMap<string, LaidPicks> {
  const picks = new Map<string, LaidPicks>();
  for (const [key, pick] of ways) {
    const thread = threads.get(pick.role);
    if (thread === undefined) continue;
    const crossed = crossedBy(pick, thread, warp);
    const geometry = layYarn(crossed, rowSpacing(beat, thread, crossed), weave, findings);
    if (geometry !== undefined) picks.set(key, geometry);
  }
  return picks;
}

/** Every yarn as it lies between these ends: does it close, does it beat down, does the warp show. */
import { ASHENHURST_K, TIGHTNESS } from '#core/craft/defaults.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import type { Beat, WeaveMode, Yarn } from '#core/craft/piece.ts';
import { BEAT_RANGE, beatOfSwatch, pickGeometry, pickSpacing, type PickGeometry } from '#core/craft/picks.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { below } from '#core/craft/reading/findings.ts';
import { adviseSpacing, spacingThatSuits, strandsFor, tightness } from '#core/craft/sett.ts';
import { threadOf, type Thread } from '#core/craft/yarn/thread.ts';

export function threadsOf(yarns: ReadonlyMap<string, Yarn | undefined>): ReadonlyMap<string, Thread> {
  const threads = new Map<string, Thread>();
  for (const [role, yarn] of yarns) {
    if (yarn !== undefined) threads.set(role, threadOf(yarn, ASHENHURST_K.weft));
  }
  return threads;
}

/** What would let a thick yarn close, in the order of how easily it is done. */
function waysOut(warp: DressedWarp, thread: Thread, findings: Findings): string {
  const fewerStrands = thread.strands > 1 ? 'fewer strands together, ' : '';
  const least = findings.length(warp.workingDiameterMm + thread.compressedMm, 'up');
  return `Use a thinner yarn, ${fewerStrands}or ends at least ${least} apart.`;
}

function reportJam(role: string, warp: DressedWarp, thread: Thread, findings: Findings): void {
  const yarn = `This yarn is ${findings.length(thread.compressedMm)} thick. With ends ${findings.length(warp.ends.spacingMm)} apart the rows cannot close.`;
  findings.reject('E_JAM', below('/yarns', role), `${yarn} ${waysOut(warp, thread, findings)}`);
}

/** How many strands of it would come out well; a warp that loosens by itself leaves that open. */
function strandsWords(warp: DressedWarp, thread: Thread): string {
  const strandMm = thread.compressedMm / Math.sqrt(thread.strands);
  const strands = strandsFor(warp.ends.spacingMm, warp.workingDiameterMm, strandMm);
  return strands === undefined || strands <= thread.strands ? 'Take more strands together' : `Take ${String(strands)} strands together`;
}

function reportWeftFaced(role: string, warp: DressedWarp, thread: Thread, findings: Findings): void {
  const path = below('/yarns', role);
  const { spacingMm } = warp.ends;
  if (tightness(warp.workingDiameterMm, thread.loftMm, spacingMm) > 1) {
    findings.warn('W_WARP_SHOWS', path, 'This yarn is as thick as the room between the ends: it will not beat down, and the warp will show.');
  } else if (adviseSpacing(spacingMm, warp.workingDiameterMm, thread.loftMm) === 'too-thick') {
    const suits = findings.length(spacingThatSuits(warp.workingDiameterMm, thread.loftMm), 'up');
    findings.warn('W_THICK', path, `This yarn is thick for ends so close, and hard to beat down. It suits ends ${suits} apart and more.`);
  }
  if (tightness(warp.workingDiameterMm, thread.compressedMm, spacingMm) < TIGHTNESS.loose) {
    findings.warn('W_LOOSE', path, `This yarn is thin for the room between the ends, and the rows may slip. ${strandsWords(warp, thread)}, or set the ends closer.`);
  }
}

/** The picks of one yarn, unless it jams. */
function layYarn(role: string, warp: DressedWarp, thread: Thread, beat: Beat, mode: WeaveMode, findings: Findings): PickGeometry | undefined {
  const spacing = pickSpacing(beat, thread.compressedMm);
  const geometry = pickGeometry({
    spacingMm: warp.ends.spacingMm,
    warpDiameterMm: warp.workingDiameterMm,
    weftDiameterMm: thread.compressedMm,
    pickSpacingMm: spacing,
    mode,
  });
  if (geometry === undefined) {
    reportJam(role, warp, thread, findings);
    return undefined;
  }
  if (beatOfSwatch(1, spacing, thread.compressedMm) > BEAT_RANGE.max + 1e-9) {
    const most = Math.floor((10 * BEAT_RANGE.max * 10) / thread.compressedMm) / 10;
    findings.reject('E_RANGE', '/beat/picksPerCm', `Rows of this yarn cannot lie so close: up to ${String(most)} in a centimetre work. Count the swatch again.`);
  }
  if (geometry.clamped) {
    findings.warn('W_CLAMPED', below('/yarns', role), 'Warp and weft cannot bend alike in so close a cloth. The nearest that is possible is reckoned.');
  }
  if (mode === 'straight-warp') reportWeftFaced(role, warp, thread, findings);
  return geometry;
}

/** Picks of every yarn that is woven in picks; one that jams is reported and missing. */
export function layWeft(
  roles: ReadonlySet<string>,
  threads: ReadonlyMap<string, Thread>,
  warp: DressedWarp,
  cloth: { readonly beat: Beat; readonly mode: WeaveMode },
  findings: Findings,
): ReadonlyMap<string, PickGeometry> {
  const picks = new Map<string, PickGeometry>();
  for (const role of roles) {
    const thread = threads.get(role);
    if (thread === undefined) continue;
    const geometry = layYarn(role, warp, thread, cloth.beat, cloth.mode, findings);
    if (geometry !== undefined) picks.set(role, geometry);
  }
  return picks;
}

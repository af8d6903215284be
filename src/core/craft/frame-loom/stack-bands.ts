/** Setting the bands on each other: their heights, the one that fills the rest, and what is wrong with any of them. */
import type { Band } from '#core/craft/piece.ts';
import { below, type Findings } from '#core/craft/reading/findings.ts';
import { techniqueOf } from '#core/craft/techniques/registry.ts';
import { pickKey, type BandReport, type DressedLoom, type NamedRole, type PickOf } from '#core/craft/techniques/technique.ts';

export interface StackedBand {
  readonly index: number;
  readonly band: Band;
  readonly heightMm: number;
  /** Rows of a tabby band that are woven already. */
  readonly fromRow?: number;
}

/** Heights measured by hand agree no closer. */
const CLOSE_ENOUGH_MM = 0.5;

/** Rows of all shapes together: a tapestry three metres high, of ten rows to the centimetre, with ten shapes across all of it. */
const MOST_SHAPE_ROWS = 30_000;

const pathOf = (index: number): string => below('/bands', index);

export function rolesOf(band: Band): readonly NamedRole[] {
  return techniqueOf(band).roles(band);
}

export interface UsedRoles {
  readonly named: ReadonlySet<string>;
  /** Picks that are woven, by their `pickKey`. */
  readonly inPicks: ReadonlyMap<string, PickOf>;
}

/** The yarn roles the bands name. Reports those that no yarn has, unless there are no yarns to name. */
export function collectRoles(bands: readonly (Band | undefined)[], known: ReadonlySet<string>, findings: Findings): UsedRoles {
  const named = new Set<string>();
  const inPicks = new Map<string, PickOf>();
  bands.forEach((band, index) => {
    if (band === undefined) return;
    for (const { key, role, picks } of rolesOf(band)) {
      if (known.size > 0 && !known.has(role)) {
        findings.reject('E_ENUM', `${pathOf(index)}/${key}`, `No yarn of this piece is called “${role}”. There are: ${[...known].join(', ')}.`);
      }
      named.add(role);
      if (picks !== undefined) inPicks.set(pickKey(picks), picks);
    }
  });
  return { named, inPicks };
}

/** Whether all a band is made of is sound, so that its own measures can be looked at. */
export function isReady(band: Band, loom: DressedLoom): boolean {
  return rolesOf(band).every(({ role, picks }) => loom.threads.has(role) && (picks === undefined || loom.picks.has(pickKey(picks))));
}

function reportOf(index: number, findings: Findings): BandReport {
  const path = pathOf(index);
  return {
    reject: (code, key, message) => findings.reject(code, `${path}/${key}`, message),
    warn: (code, key, message) => findings.warn(code, `${path}/${key}`, message),
    length: (mm) => findings.length(mm),
  };
}

function onlyOneFills(bands: readonly Band[], findings: Findings): number | undefined {
  let filling: number | undefined;
  bands.forEach((band, index) => {
    if (!('fill' in band)) return;
    if (filling === undefined) filling = index;
    else findings.reject('E_FIT', `${pathOf(index)}/fill`, 'Only one band can fill what is left. Give this one a height.');
  });
  return filling;
}

/** Heights of all bands, the filling one included; undefined if they do not come to the piece's height. */
function heightsOf(bands: readonly Band[], pieceHeightMm: number, loom: DressedLoom, findings: Findings): readonly number[] | undefined {
  const filling = onlyOneFills(bands, findings);
  const own = bands.map((band) => techniqueOf(band).height(band, loom));
  const fixedMm = own.reduce<number>((sum, height) => sum + (height === 'fill' ? 0 : height), 0);
  const restMm = pieceHeightMm - fixedMm;
  const sum = `The bands come to ${findings.length(fixedMm)}, and the piece is ${findings.length(pieceHeightMm)} high.`;
  if (filling !== undefined && restMm < -1e-9) {
    findings.reject('E_FIT', `${pathOf(filling)}/fill`, `${sum} Nothing is left to fill: take ${findings.length(-restMm, 'up')} from other bands.`);
    return undefined;
  }
  if (filling === undefined && Math.abs(restMm) > CLOSE_ENOUGH_MM) {
    const change = restMm > 0 ? 'Add' : 'Take away';
    findings.reject('E_FIT', '/bands', `${sum} ${change} ${findings.length(Math.abs(restMm))}, or let one band fill the rest.`);
    return undefined;
  }
  return own.map((height, index) => (height !== 'fill' ? height : index === filling ? Math.max(0, restMm) : 0));
}

/** Whether all shapes together can be stepped out in a moment; what is larger was most likely mistyped. */
function canBeSteppedOut(bands: readonly Band[], loom: DressedLoom, findings: Findings): boolean {
  const rows = bands.reduce((sum, band) => sum + (techniqueOf(band).shapeRows?.(band, loom) ?? 0), 0);
  if (rows <= MOST_SHAPE_ROWS) return true;
  findings.reject('E_RANGE', '/bands', `The shapes come to ${String(rows)} rows, and up to ${String(MOST_SHAPE_ROWS)} work. Check the heights, the yarns and the beat.`);
  return false;
}

/** Checks every band that can be checked; answers them all with their heights if they fit together. */
export function stackBands(bands: readonly (Band | undefined)[], pieceHeightMm: number | undefined, loom: DressedLoom, findings: Findings): readonly StackedBand[] | undefined {
  const ready = bands.filter((band): band is Band => band !== undefined && isReady(band, loom));
  if (!canBeSteppedOut(ready, loom, findings)) return undefined;
  const whole = ready.length === bands.length && pieceHeightMm !== undefined;
  const heights = whole ? heightsOf(ready, pieceHeightMm, loom, findings) : undefined;
  const stacked: StackedBand[] = [];
  bands.forEach((band, index) => {
    if (band === undefined || !isReady(band, loom)) return;
    const own = techniqueOf(band).height(band, loom);
    const heightMm = heights?.[index] ?? own;
    if (heightMm === 'fill') return;
    techniqueOf(band).check(band, heightMm, loom, reportOf(index, findings));
    stacked.push({ index, band, heightMm });
  });
  return heights === undefined ? undefined : stacked;
}

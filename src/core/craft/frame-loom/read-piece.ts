/**
 * Reading a frame-loom piece. Every part is read for itself, so that all that is wrong
 * is told at once, and what is sound can still be checked against its neighbours.
 */
import type { Allowances, Band, Dowel, Finish, FinishWay, Fixing, Loom, FrameLoomPiece, Warp, Warping, Yarn } from '#core/craft/piece.ts';
import type { Weave, WeaveMode } from '#core/craft/weave.ts';
import { TAKE_UP_UNKNOWN } from '#core/craft/defaults.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import type { Edges } from '#core/craft/frame-loom/room.ts';
import type { LoomKind } from '#core/craft/looms/loom-kind.ts';
import { LOOM_KIND_NAMES, LOOM_KINDS, loomKind, NAIL_ROW_NAMES } from '#core/craft/looms/looms.ts';
import { BEAT_RANGE, type RowBeat } from '#core/craft/picks.ts';
import { Fields, type NumberRule } from '#core/craft/reading/fields.ts';
import { below, type Findings } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';
import { TECHNIQUE_NAMES, TECHNIQUES } from '#core/craft/techniques/registry.ts';
import { readYarn } from '#core/craft/yarn/read-yarn.ts';
import { END_RANGE } from '#core/craft/ends.ts';

/** The sound parts of a piece; what was refused is missing. */
export interface PieceParts {
  readonly size: FrameLoomPiece['size'] | undefined;
  readonly loom: Loom | undefined;
  readonly warp: Warp | undefined;
  readonly beat: RowBeat | undefined;
  readonly mode: WeaveMode;
  /** The mode with its numbers. */
  readonly weave: Weave | undefined;
  readonly allowances: Allowances | undefined;
  readonly edges: Edges | undefined;
  /** Every role, with its yarn where that is sound. */
  readonly yarns: ReadonlyMap<string, Yarn | undefined>;
  /** In their own order, a gap where one was refused. */
  readonly bands: readonly (Band | undefined)[];
}

const FIXINGS = ['slipped', 'tied', 'lashed'] as const satisfies readonly Fixing[];
const FINISH_WAYS = ['knotted', 'twisted', 'tucked', 'plain'] as const satisfies readonly FinishWay[];
const MODES = ['straight-warp', 'balanced', 'given', 'measured'] as const satisfies readonly WeaveMode[];
const MOST_BANDS = 200;
const MOST_YARNS = 60;
const ROLE = /^[a-z][a-z0-9-]{0,39}$/i;

const length = (name: string, max = LONGEST_MM): NumberRule => ({ name, min: 'over-zero', max, unit: 'mm' });
const allowance = (name: string): NumberRule => ({ name, min: 0, max: LONGEST_MM, unit: 'mm' });
const share = (name: string, max: number): NumberRule => ({ name, min: 0, max, unit: 'share' });

/** Draw-in stays below 40 %: at that the cloth would close to a cord. */
const DRAW_IN: NumberRule = { ...share('Draw-in', 0.4), maxIsOut: true };
const NAIL_PITCH: NumberRule = { name: 'From nail to nail', min: 1, max: 100, unit: 'mm' };
const NTH_NAIL: NumberRule = { name: 'Every so-many-th nail', min: 1, max: 50, whole: true };
const END_COUNT: NumberRule = { name: 'Number of ends', ...END_RANGE, whole: true };
const SEED: NumberRule = { name: 'Seed of the drawing', min: 0, max: Number.MAX_SAFE_INTEGER, whole: true };
/** Weft round a straight warp as close as it goes takes up 57 %. */
const MOST_TAKE_UP = 0.6;
const BEAT: NumberRule = { name: 'Picks in one weft thickness', ...BEAT_RANGE };
const PICKS_PER_CM: NumberRule = { name: 'Picks in a centimetre', min: 'over-zero', max: 200 };

function readSize(fields: Fields): FrameLoomPiece['size'] {
  const group = fields.group('size', 'Size');
  const size = { widthMm: group.number('widthMm', length('Width')), heightMm: group.number('heightMm', length('Height')) };
  group.end();
  return size;
}

/** A way of winding that this kind of loom takes. */
function readWarping(fields: Fields, { warpings, otherWarping }: LoomKind): Warping {
  const warping = fields.choice('warping', 'Warping', ['zigzag', 'two-nail']);
  if (!warpings.includes(warping) && otherWarping !== undefined) {
    fields.reject('E_ENUM', 'warping', `${otherWarping} This works: ${warpings.join(', ')}.`);
  }
  return warping;
}

function readLoom(fields: Fields): Loom {
  const group = fields.group('loom', 'Loom');
  const kind = group.optionalChoice('kind', 'Kind of loom', LOOM_KIND_NAMES);
  const loom = {
    nailPitchMm: group.number('nailPitchMm', NAIL_PITCH),
    warping: readWarping(group, loomKind(present({ kind }))),
    insideHeightMm: group.number('insideHeightMm', length('Inside height of the loom')),
    ...present({
      kind,
      nailRows: kind !== undefined && LOOM_KINDS[kind].rows === 2 ? group.optionalChoice('nailRows', 'Rows of nails', NAIL_ROW_NAMES) : undefined,
      everyNthNail: group.optionalNumber('everyNthNail', NTH_NAIL),
      nailDiameterMm: group.optionalNumber('nailDiameterMm', length('Thickness of a nail', 50)),
      insideWidthMm: group.optionalNumber('insideWidthMm', length('Inside width of the loom')),
    }),
  };
  group.end();
  return loom;
}

function readEndsTogether(fields: Fields): 1 | 2 | undefined {
  const ends = fields.optionalNumber('endsTogether', { name: 'Ends worked together', min: 1, max: 2, whole: true });
  return ends === undefined ? undefined : ends === 2 ? 2 : 1;
}

function readWarp(fields: Fields): Warp {
  const group = fields.group('warp', 'Warp');
  const warp = {
    yarn: readYarn(group.group('yarn', 'Warp yarn')) ?? { tex: 1 },
    ...present({
      endsTogether: readEndsTogether(group),
      parity: group.optionalChoice('parity', 'Number of ends', ['any', 'even', 'odd']),
      endCount: group.optionalNumber('endCount', END_COUNT),
      tieMm: group.optionalNumber('tieMm', length('Yarn for a tie')),
    }),
  };
  group.end();
  return warp;
}

const percent = (of: number): string => String(roundHalfUp(1000 * of) / 10);

function readMeasured(fields: Fields): Weave {
  const takeUp = fields.optionalNumber('takeUp', share('Take-up of the weft', MOST_TAKE_UP));
  const warpTakeUp = fields.optionalNumber('warpTakeUp', share('Take-up of the warp', MOST_TAKE_UP));
  if (takeUp === undefined) {
    const { likely, low, high } = TAKE_UP_UNKNOWN;
    fields.findings.warn('W_TAKE_UP', fields.pathOf('takeUp'), `No take-up is given, so ${percent(likely)} % is reckoned with; balanced cloth takes up between ${percent(low)} and ${percent(high)} %. Draw a pick out of a swatch, measure it straight, and give what it is longer than the swatch is wide.`);
  }
  return { mode: 'measured', ...present({ takeUp, warpTakeUp }) };
}

/** The numbers a mode has; those of another are left to be refused as unknown. */
function readWeave(fields: Fields, mode: WeaveMode): Weave {
  switch (mode) {
    case 'given':
      return { mode, weftWaveMm: fields.number('weftWaveMm', allowance('Height of the weft’s wave')) };
    case 'measured':
      return readMeasured(fields);
    case 'straight-warp':
    case 'balanced':
      return { mode };
  }
}

function readBeat(fields: Fields, mode: WeaveMode): RowBeat {
  if (mode === 'balanced' && fields.take('beat') === undefined) return 'as-ends';
  if (!fields.has('beat')) fields.reject('E_ENUM', 'beat', 'Say how closely the rows lie. As close as the ends is for balanced cloth alone.');
  const group = fields.group('beat', 'Beat');
  const swatch = group.has('picksPerCm');
  if (swatch && group.has('picksPerWeftDiameter')) {
    group.take('picksPerWeftDiameter');
    group.reject('E_ENUM', 'picksPerWeftDiameter', 'Picks counted on a swatch stand already. Give one of the two.');
  }
  const beat = swatch
    ? { picksPerCm: group.number('picksPerCm', PICKS_PER_CM) }
    : { picksPerWeftDiameter: group.number('picksPerWeftDiameter', BEAT) };
  if (!swatch) group.take('picksPerCm');
  group.end();
  return beat;
}

function readAllowances(fields: Fields): Allowances {
  const group = fields.optionalGroup('allowances', 'Allowances');
  if (group === undefined) return {};
  const allowances = present({
    drawIn: group.optionalNumber('drawIn', DRAW_IN),
    relaxation: group.optionalNumber('relaxation', share('Relaxation', 0.2)),
    wetShrinkage: group.optionalNumber('wetShrinkage', share('Wet shrinkage', 0.2)),
    topMm: group.optionalNumber('topMm', allowance('Unwoven warp at the top')),
    bottomMm: group.optionalNumber('bottomMm', allowance('Unwoven warp at the bottom')),
    tailMm: group.optionalNumber('tailMm', length('A tail', 1000)),
    loadMm: group.optionalNumber('loadMm', length('Yarn on a shuttle', 1_000_000)),
    marginWeft: group.optionalNumber('marginWeft', share('Margin of the weft', 1)),
    marginWarp: group.optionalNumber('marginWarp', share('Margin of the warp', 1)),
  });
  group.end();
  return allowances;
}

function readDowel(fields: Fields): Dowel | undefined {
  const group = fields.optionalGroup('dowel', 'Dowel');
  if (group === undefined) return undefined;
  const dowel = {
    diameterMm: group.number('diameterMm', length('Thickness of the dowel', 200)),
    ...present({
      lengthMm: group.optionalNumber('lengthMm', { name: 'Length of the dowel', min: 60, max: LONGEST_MM, unit: 'mm' }),
      fixing: group.optionalChoice('fixing', 'How it is held to the dowel', FIXINGS),
    }),
  };
  group.end();
  return dowel;
}

function readFinish(fields: Fields): Finish | undefined {
  const group = fields.optionalGroup('finish', 'Finish');
  if (group === undefined) return undefined;
  const bottom = group.choice('bottom', 'Finish of the lower ends', FINISH_WAYS);
  // What a finish does not have is left to be refused as unknown.
  const finish = {
    bottom,
    ...present({
      fringeMm: bottom === 'tucked' ? undefined : group.optionalNumber('fringeMm', { name: 'Length of the fringe', min: 0, max: 2000, unit: 'mm' }),
      bundleEnds: bottom === 'knotted' || bottom === 'twisted' ? group.optionalNumber('bundleEnds', { name: 'Ends in a bundle', min: 1, max: 100, whole: true }) : undefined,
    }),
  };
  group.end();
  return finish;
}

function readEdges(fields: Fields): Edges {
  return present({ dowel: readDowel(fields), finish: readFinish(fields) });
}

function readYarns(fields: Fields): ReadonlyMap<string, Yarn | undefined> {
  const group = fields.group('yarns', 'The group of yarns');
  const entries = group.entries();
  if (entries.length > MOST_YARNS) {
    fields.reject('E_RANGE', 'yarns', `${String(entries.length)} yarns are too many. Up to ${String(MOST_YARNS)} work.`);
    return new Map();
  }
  const yarns = new Map<string, Yarn | undefined>();
  for (const [role, value] of entries) {
    const path = group.pathOf(role);
    const named = ROLE.test(role) && !(role in Object.prototype);
    if (role in Object.prototype) fields.findings.reject('E_ENUM', path, `“${role}” cannot name a yarn role. Choose another word.`);
    else if (!named) fields.findings.reject('E_ENUM', path, 'A yarn role begins with a letter and goes on with letters, figures or hyphens, 40 at most.');
    yarns.set(role, named ? readYarn(Fields.of(value, path, 'Yarn', fields.findings)) : undefined);
  }
  return yarns;
}

function readBand(value: unknown, path: string, findings: Findings): Band | undefined {
  return findings.soundly(() => {
    const fields = Fields.of(value, path, 'A band', findings);
    const before = findings.count;
    const technique = fields.choice('technique', 'Technique', TECHNIQUE_NAMES);
    if (findings.count > before) return undefined;
    const band = TECHNIQUES[technique].read(fields);
    fields.end();
    return band;
  });
}

/** Each name once, or a lesson would not know which band is meant. */
function checkNames(bands: readonly (Band | undefined)[], findings: Findings): void {
  const seen = new Set<string>();
  bands.forEach((band, index) => {
    if (band?.name === undefined) return;
    if (seen.has(band.name)) findings.reject('E_ENUM', `/bands/${String(index)}/name`, `Another band is called ${band.name} already.`);
    seen.add(band.name);
  });
}

function readBands(fields: Fields): readonly (Band | undefined)[] {
  const path = fields.pathOf('bands');
  const list = fields.list('bands', 'Bands', MOST_BANDS);
  const bands = list.map((value, index) => readBand(value, below(path, index), fields.findings));
  checkNames(bands, fields.findings);
  return bands;
}

/** Reads every part of a frame-loom piece and refuses keys it does not know. */
export function readPieceParts(fields: Fields): PieceParts {
  const { findings } = fields;
  fields.take('craft');
  const mode = fields.optionalChoice('mode', 'Mode', MODES) ?? 'straight-warp';
  const parts = {
    size: findings.soundly(() => readSize(fields)),
    loom: findings.soundly(() => readLoom(fields)),
    warp: findings.soundly(() => readWarp(fields)),
    beat: findings.soundly(() => readBeat(fields, mode)),
    mode,
    weave: findings.soundly(() => readWeave(fields, mode)),
    allowances: findings.soundly(() => readAllowances(fields)),
    edges: findings.soundly(() => readEdges(fields)),
    yarns: readYarns(fields),
    bands: readBands(fields),
  };
  fields.optionalChoice('hangs', 'Hanging', ['as-woven', 'turned']);
  fields.optionalNumber('seed', SEED);
  fields.end();
  return parts;
}

/** Which field of the page a place in a reckoned question belongs to. */
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

/** `path` below the yarn. */
export function fieldOfYarn(path: string): ReckonerField {
  if (path.startsWith('/ball/grams')) return 'ball-weight';
  if (path.startsWith('/ball')) return 'ball-length';
  if (path.startsWith('/wrapsPerInch')) return 'wraps';
  if (path.startsWith('/strands')) return 'strands';
  if (path.startsWith('/ashenhurstK')) return 'hand';
  return 'yarn';
}

/** By the last key of a place in a band or a short question, or by a whole place. */
export type FieldsOfKeys = Readonly<Record<string, ReckonerField>>;

export const SOUMAK_KEYS: FieldsOfKeys = { over: 'over', back: 'back', rows: 'soumak-rows', tabbyBetween: 'between', '/size/heightMm': 'soumak-rows' };
export const RYA_KEYS: FieldsOfKeys = {
  legEnds: 'leg-ends', strands: 'knot-strands', pileMm: 'pile', trimMm: 'trim', rows: 'rya-rows', edgeEnds: 'edge-ends', cardThicknessMm: 'card', ends: 'edge-ends', heightMm: 'rya-rows',
};
export const SHAPE_KEYS: FieldsOfKeys = { shape: 'shape', baseMm: 'base', heightMm: 'shape-height', radiusMm: 'radius', symmetric: 'sides', pickSpacingMm: 'shape-height' };

export const ROD_KEYS: FieldsOfKeys = { massG: 'rod-load', lengthMm: 'rod-length', riseMm: 'rise' };

const FIELDS: readonly (readonly [string, ReckonerField])[] = [
  ['/size/widthMm', 'width'],
  ['/size/heightMm', 'height'],
  ['/loom/nailPitchMm', 'nails'],
  ['/loom/everyNthNail', 'every'],
  ['/loom/kind', 'loom-kind'],
  ['/loom/nailRows', 'nail-rows'],
  ['/loom/warping', 'warping'],
  ['/loom/insideHeightMm', 'frame-height'],
  ['/loom/insideWidthMm', 'frame-width'],
  ['/warp/yarn', 'warp-tex'],
  ['/warp/parity', 'parity'],
  ['/warp', 'together'],
  ['/allowances/drawIn', 'draw-in'],
  ['/beat', 'swatch'],
  ['/mode', 'weave'],
  ['/dowel', 'dowel'],
];

/** `path` in a piece the page makes of its fields; `ofBand` tells those of the bands it puts in. */
export function fieldOfPath(path: string, ofBand: FieldsOfKeys = {}): ReckonerField {
  const whole = ofBand[path];
  if (whole !== undefined) return whole;
  const yarn = /^\/yarns\/[^/]+/u.exec(path);
  if (yarn !== null) return fieldOfYarn(path.slice(yarn[0].length));
  if (path.startsWith('/bands/')) return ofBand[path.slice(path.lastIndexOf('/') + 1)] ?? 'height';
  return FIELDS.find(([start]) => path === start || path.startsWith(`${start}/`))?.[1] ?? 'height';
}

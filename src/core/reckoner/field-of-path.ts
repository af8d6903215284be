/** Which field of the page a place in the reckoned piece belongs to. */
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';

/** `path` below the yarn. */
export function fieldOfYarn(path: string): ReckonerField {
  if (path.startsWith('/ball/grams')) return 'ball-grams';
  if (path.startsWith('/ball')) return 'ball-metres';
  if (path.startsWith('/wrapsPerInch')) return 'wraps';
  if (path.startsWith('/strands')) return 'strands';
  return 'yarn';
}

const FIELDS: readonly (readonly [string, ReckonerField])[] = [
  ['/size/widthMm', 'width'],
  ['/size/heightMm', 'height'],
  ['/loom/nailPitchMm', 'nails'],
  ['/loom/insideHeightMm', 'frame-height'],
  ['/loom/insideWidthMm', 'frame-width'],
  ['/warp/yarn', 'warp-tex'],
  ['/warp/parity', 'parity'],
  ['/warp', 'together'],
  ['/allowances/drawIn', 'draw-in'],
  ['/beat', 'swatch'],
  ['/dowel', 'dowel'],
  ['/bands/1/pileMm', 'pile'],
  ['/bands/1/strands', 'fringe-strands'],
  ['/bands', 'height'],
];

/** `path` in the piece the page makes of its fields. */
export function fieldOfPath(path: string): ReckonerField {
  if (path.startsWith('/yarns/ground')) return fieldOfYarn(path.slice('/yarns/ground'.length));
  return FIELDS.find(([start]) => path === start || path.startsWith(`${start}/`))?.[1] ?? 'height';
}

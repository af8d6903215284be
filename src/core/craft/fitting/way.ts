/** The ways in which a student may fit a pattern to a loom that is not like the pattern's. */
import type { EndsTogether } from '#core/craft/piece.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { below } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';

/**
 * A chosen way with the measures it came to, so that a piece on the loom stays as it was
 * chosen, however the ways are reckoned later.
 *
 * - `narrower`: fewer ends, shapes keep their share of the width
 * - `fewer-bands`: whole bands are left out, the filling band shrinks to the height; and narrower where the loom asks it
 * - `coarser`: ends further apart, with as many strands of each yarn as keep the cloth as tight
 * - `scaled`: width, heights, shapes and pile by one factor; rows are counted anew
 */
export type FitWay =
  | { readonly kind: 'narrower'; readonly widthMm: number }
  | {
      readonly kind: 'fewer-bands';
      /** Keys of bands, see `bandKey`. */
      readonly leaveOut: readonly string[];
      /** The end from which they were left out; missing where she chose them herself. */
      readonly from?: 'first' | 'last';
      /** Of the finished piece, where a band fills what is left. */
      readonly heightMm?: number;
      readonly widthMm?: number;
    }
  | {
      readonly kind: 'coarser';
      readonly everyNthNail?: number;
      readonly endsTogether?: EndsTogether;
      /** By yarn role. */
      readonly strands: Readonly<Record<string, number>>;
    }
  | { readonly kind: 'scaled'; readonly factor: number };

export type FitKind = FitWay['kind'];

/** How a band is known in a choice: by its name, or by its place, `#0` being the first woven. */
export function bandKey(band: { readonly name?: string }, index: number): string {
  return band.name ?? `#${String(index)}`;
}

const KINDS = ['narrower', 'fewer-bands', 'coarser', 'scaled'] as const satisfies readonly FitKind[];
const SIZE = { name: 'Size', min: 'over-zero', max: LONGEST_MM, unit: 'mm' } as const;
/** Less or more of a pattern is another piece. */
export const FACTOR = { name: 'Factor', min: 0.25, max: 3 } as const;
const MOST_LEFT_OUT = 200;

function readLeaveOut(fields: Fields): readonly string[] {
  const value = fields.take('leaveOut');
  if (Array.isArray(value) && value.length <= MOST_LEFT_OUT && value.every((key): key is string => typeof key === 'string')) return value;
  fields.reject('E_ENUM', 'leaveOut', 'Bands to leave out are given as a list of their names.');
  return [];
}

function readStrands(fields: Fields): Readonly<Record<string, number>> {
  const group = fields.group('strands', 'Strands');
  const roles = group.entries().map(([role]) => role);
  return Object.fromEntries(roles.map((role) => [role, group.number(role, { name: 'Strands', min: 1, max: 100, whole: true })]));
}

function readCoarser(fields: Fields): FitWay {
  const together = fields.optionalNumber('endsTogether', { name: 'Ends worked together', min: 1, max: 2, whole: true });
  return {
    kind: 'coarser',
    strands: readStrands(fields),
    ...present({
      everyNthNail: fields.optionalNumber('everyNthNail', { name: 'Every so-many-th nail', min: 1, max: 50, whole: true }),
      endsTogether: together === undefined ? undefined : together === 2 ? (2 as const) : (1 as const),
    }),
  };
}

function readKind(fields: Fields): FitWay | undefined {
  const kind = fields.findings.soundly(() => fields.choice('kind', 'Way to fit', KINDS));
  switch (kind) {
    case undefined:
      return undefined;
    case 'narrower':
      return { kind, widthMm: fields.number('widthMm', SIZE) };
    case 'fewer-bands':
      return { kind, leaveOut: readLeaveOut(fields), ...present({ from: fields.optionalChoice('from', 'End from which bands are left out', ['first', 'last']), heightMm: fields.optionalNumber('heightMm', SIZE), widthMm: fields.optionalNumber('widthMm', SIZE) }) };
    case 'coarser':
      return readCoarser(fields);
    case 'scaled':
      return { kind, factor: fields.number('factor', FACTOR) };
  }
}

/** Reads a way that was kept; undefined, with problems at `/way`, if it is none. */
export function readWay(value: unknown, around: Fields): FitWay | undefined {
  const { findings } = around;
  return findings.soundly(() => {
    const fields = Fields.of(value, below(around.path, 'way'), 'Way to fit', findings);
    const way = readKind(fields);
    if (way !== undefined) fields.end();
    return way;
  });
}

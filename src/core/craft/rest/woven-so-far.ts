/** What a weaver says of a piece on her loom: how far she is, and what yarn is left. */
import { type Fields } from '#core/craft/reading/fields.ts';
import { present } from '#core/craft/reading/present.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';

export interface WovenSoFar {
  /** Bands that are finished, counted from the one woven first. */
  readonly bandsDone: number;
  /** Rows woven in the band in hand. */
  readonly rows?: number;
  /** Cloth on the loom from its first row to the fell, measured. */
  readonly heightMm?: number;
  /** Yarn left of each role, weighed in grams. */
  readonly leftG?: Readonly<Record<string, number>>;
}

export const NOTHING_WOVEN: WovenSoFar = { bandsDone: 0 };

const MOST_ROWS = 20_000;
const MOST_GRAMS = 100_000;

function readLeft(fields: Fields): Readonly<Record<string, number>> | undefined {
  const group = fields.optionalGroup('leftG', 'Yarn left');
  if (group === undefined) return undefined;
  const roles = group.entries().map(([role]) => role);
  return Object.fromEntries(roles.map((role) => [role, group.number(role, { name: 'Yarn left', min: 0, max: MOST_GRAMS, unit: 'g' })]));
}

/** Reads what was woven; undefined, with problems, if it makes no sense by itself. */
export function readWoven(fields: Fields): WovenSoFar | undefined {
  return fields.findings.soundly(() => {
    const woven: WovenSoFar = {
      bandsDone: fields.number('bandsDone', { name: 'Bands that are finished', min: 0, max: 200, whole: true }),
      ...present({
        rows: fields.optionalNumber('rows', { name: 'Rows woven', min: 0, max: MOST_ROWS, whole: true }),
        heightMm: fields.optionalNumber('heightMm', { name: 'Height of the cloth so far', min: 0, max: LONGEST_MM, unit: 'mm' }),
        leftG: readLeft(fields),
      }),
    };
    fields.end();
    return woven;
  });
}

/** Whether the warp is on the loom and rows are on the warp. */
export function isBegun({ bandsDone, rows = 0 }: WovenSoFar): boolean {
  return bandsDone > 0 || rows > 0;
}

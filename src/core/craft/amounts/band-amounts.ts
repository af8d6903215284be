/** Amounts of one band, asked for by its name. */
import { countOf, lengthOf, type HowReckoned, type Input, type Quantity, type Reckoned } from '#core/craft/amounts/amount-types.ts';
import { beatTrust, type PlannedPiece } from '#core/craft/amounts/fixed-amounts.ts';
import { loftTrust } from '#core/craft/amounts/yarn-amounts.ts';
import type { Band } from '#core/craft/piece.ts';
import type { BandPlan } from '#core/craft/plan-types.ts';
import { leastTrust, type Trust } from '#core/craft/trust.ts';

export interface PlannedBand extends PlannedPiece {
  readonly name: string;
  readonly band: Band;
  readonly bandPlan: BandPlan;
}

export function plannedBand({ piece, plan }: PlannedPiece, name: string): PlannedBand | undefined {
  const index = piece.bands.findIndex((band) => band.name === name);
  const band = piece.bands[index];
  const bandPlan = plan.bands.find((planned) => planned.index === index);
  return band === undefined || bandPlan === undefined ? undefined : { piece, plan, name, band, bandPlan };
}

/** `fringe-over` reads as `Fringe over`. */
function title(name: string): string {
  const words = name.replaceAll('-', ' ').trim();
  return words.charAt(0).toUpperCase() + words.slice(1);
}

const STITCH_SOURCE = 'the path of each stitch and knot; try a swatch';

interface How {
  readonly formula: string;
  readonly inputs?: readonly { readonly name: string; readonly value: Input }[];
  readonly source: string;
  readonly trust: Trust;
}

function reckoned(of: PlannedBand, what: string, quantity: Quantity, how: How): Reckoned {
  const full: HowReckoned = { inputs: [], ...how };
  return { label: `${title(of.name)}: ${what}`, quantity, how: full };
}

const workingEnds = ({ plan }: PlannedBand): { readonly name: string; readonly value: Quantity } => ({
  name: 'working ends',
  value: countOf(plan.ends.working, 'end', 'ends'),
});

function height(of: PlannedBand): Reckoned {
  const { band, bandPlan } = of;
  const how: How =
    'heightMm' in band
      ? { formula: 'as the piece says', source: 'the piece', trust: 'measured' }
      : { formula: 'what the other bands leave, or rows × how thick the yarn lies', source: 'the piece', trust: 'formula' };
  return reckoned(of, 'height', lengthOf(bandPlan.heightMm, 'size'), how);
}

/** Rows of its own technique; in tabby these are the picks. */
function rows(of: PlannedBand): Reckoned | undefined {
  const { band, bandPlan, piece } = of;
  if ('rows' in band) {
    return reckoned(of, 'rows', countOf(band.rows, 'row', 'rows'), { formula: 'as the piece says', source: 'the piece', trust: 'measured' });
  }
  if (bandPlan.picks === undefined) return undefined;
  return reckoned(of, 'rows', countOf(bandPlan.picks, 'row', 'rows'), {
    formula: 'height ÷ room for one row, rounded',
    inputs: [{ name: 'height', value: lengthOf(bandPlan.heightMm, 'size') }],
    source: 'common practice; a counted swatch is better',
    trust: beatTrust(piece),
  });
}

function knots(of: PlannedBand): Reckoned | undefined {
  const { knots: count } = of.bandPlan;
  if (count === undefined) return undefined;
  const how = { formula: 'working ends ÷ ends under a knot, for every row', inputs: [workingEnds(of)], source: STITCH_SOURCE, trust: 'formula' } as const;
  return reckoned(of, 'knots', countOf(count, 'knot', 'knots'), how);
}

function stitches(of: PlannedBand): Reckoned | undefined {
  const { stitches: count } = of.bandPlan;
  if (count === undefined) return undefined;
  const how = { formula: 'working ends ÷ ends one stitch goes on, for every row', inputs: [workingEnds(of)], source: STITCH_SOURCE, trust: 'formula' } as const;
  return reckoned(of, 'stitches', countOf(count, 'stitch', 'stitches'), how);
}

function strands(of: PlannedBand): Reckoned | undefined {
  const { strands: count, knots: knotCount } = of.bandPlan;
  if (count === undefined || knotCount === undefined) return undefined;
  const inputs = [{ name: 'knots', value: countOf(knotCount, 'knot', 'knots') }];
  return reckoned(of, 'strands', countOf(count, 'strand', 'strands'), { formula: 'knots × strands in a knot', inputs, source: 'the piece', trust: 'formula' });
}

function cut(of: PlannedBand): Reckoned | undefined {
  const { bandPlan, band, piece } = of;
  if (bandPlan.cutMm === undefined || !('pileMm' in band)) return undefined;
  const yarn = piece.yarns[band.yarn];
  return reckoned(of, 'cut length', lengthOf(bandPlan.cutMm, 'cut'), {
    formula: '2 × (pile + trim) + what the knot takes',
    inputs: [
      { name: 'pile', value: lengthOf(band.pileMm, 'size') },
      { name: 'trim', value: lengthOf(band.trimMm, 'size') },
    ],
    source: STITCH_SOURCE,
    trust: yarn === undefined ? 'formula' : loftTrust(yarn),
  });
}

/** The band's own yarn; the ground a soumak band is held by, or a shape in it, counts in that yarn's amounts. */
function yarn(of: PlannedBand): Reckoned {
  const { band, bandPlan, piece } = of;
  const used = piece.yarns[band.yarn];
  const loft = used === undefined ? 'formula' : loftTrust(used);
  return reckoned(of, used?.label ?? band.yarn, lengthOf(bandPlan.yarnMm[band.yarn] ?? 0, 'yarn'), {
    formula: 'yarn of one row or stitch × their number, without margin',
    inputs: [workingEnds(of)],
    source: 'Peirce’s geometry of plain weave; the path of each stitch and knot',
    trust: bandPlan.picks === undefined ? loft : leastTrust(loft, beatTrust(piece)),
  });
}

export const BAND_AMOUNTS = { height, rows, knots, stitches, strands, cut, yarn } as const satisfies Record<
  string,
  (of: PlannedBand) => Reckoned | undefined
>;

/** Tabby, over one and under one, with shapes in other colours if the band has any. */
import { areaLength } from '#core/craft/colour-areas.ts';
import { LONGEST_SLIT_MM } from '#core/craft/defaults.ts';
import type { BandHeight, Shape, TabbyBand } from '#core/craft/piece.ts';
import { boxOfPoints, climbOfPoints } from '#core/craft/points-shape.ts';
import { picksInHeight, pickLength } from '#core/craft/picks.ts';
import { Fields, type NumberRule } from '#core/craft/reading/fields.ts';
import { present } from '#core/craft/reading/present.ts';
import { below } from '#core/craft/reading/findings.ts';
import { heightKeyOf, heightOfShape, rowsOfShape, widthKeyOf, widthOfShape } from '#core/craft/shapes.ts';
import {
  areasOfRow,
  centreInEnds,
  longestSlitRows,
  placeShape,
  type BandGrid,
  type PlacedShape,
  type YarnArea,
} from '#core/craft/techniques/colour-rows.ts';
import { LONGEST_MM, readName, readRole } from '#core/craft/techniques/read-rules.ts';
import { readShape } from '#core/craft/techniques/read-shape.ts';
import {
  pickKey,
  picksOn,
  threadInPicks,
  type BandReport,
  type DressedLoom,
  type LaidPicks,
  type PickOf,
  type Technique,
  type TechniqueWords,
  type Woven,
  type YarnUse,
} from '#core/craft/techniques/technique.ts';
import { STRANDS } from '#core/craft/yarn/read-yarn.ts';
import type { Thread } from '#core/craft/yarn/thread.ts';

/** In basket weave two ends are met by two strands, unless the band takes another number. */
const BASKET_STRANDS = 2;
const MOST_SHAPES = 24;
/** Nobody weaves more in one band; a finer beat than the yarn has was most likely mistyped. */
const MOST_ROWS = 20_000;
/** A band without height is woven, too: it has no rows, and says so. */
const TABBY_HEIGHT: NumberRule = { name: 'Height of the band', min: 0, max: LONGEST_MM, unit: 'mm' };
/** Measured by hand, heights agree no closer. */
const CLOSE_ENOUGH_MM = 0.5;

function readHeight(fields: Fields): BandHeight {
  if (!fields.has('fill')) return { heightMm: fields.number('heightMm', TABBY_HEIGHT) };
  const given = fields.take('heightMm') !== undefined;
  if (fields.take('fill') !== true) {
    fields.reject('E_ENUM', 'fill', 'A band that fills the rest says true here; any other leaves it out.');
  } else if (given) {
    fields.reject('E_ENUM', 'heightMm', 'A band has a height or fills the rest. Give one of the two.');
  }
  return { fill: true };
}

function readShapes(fields: Fields): { readonly shapes?: readonly Shape[] } {
  const raw = fields.take('shapes');
  if (raw === undefined || (Array.isArray(raw) && raw.length === 0)) return {};
  const path = fields.pathOf('shapes');
  const shapes = fields.list('shapes', 'Shapes', MOST_SHAPES);
  return { shapes: shapes.map((value, index) => readShape(Fields.of(value, below(path, index), 'A shape', fields.findings))) };
}

function read(fields: Fields): TabbyBand {
  return {
    technique: 'tabby',
    ...readName(fields),
    yarn: readRole(fields),
    ...present({ strands: fields.optionalNumber('strands', STRANDS), basket: fields.optionalFlag('basket', 'Basket weave') }),
    ...readHeight(fields),
    ...readShapes(fields),
  };
}

/** Strands in a row of this band, where it does not leave that to each yarn. */
export function strandsInRow({ strands, basket }: Pick<TabbyBand, 'strands' | 'basket'>): number | undefined {
  return strands ?? (basket === true ? BASKET_STRANDS : undefined);
}

/** How a yarn of this band, the ground or a shape's, lies in its rows. */
export function pickIn(band: TabbyBand, role: string): PickOf {
  return { role, ...present({ strands: strandsInRow(band) }), ...(band.basket === true ? { pairs: true as const } : {}) };
}

function gridOf(band: TabbyBand, heightMm: number, loom: DressedLoom): BandGrid {
  const { pickSpacingMm, workingEnds, spacingMm } = picksOn(loom, pickIn(band, band.yarn));
  return { rows: picksInHeight(heightMm, pickSpacingMm), ends: workingEnds, spacingMm, pickSpacingMm, widthMm: loom.widthMm };
}

/** Half an end beyond the selvedge is still inside: ends are whole. */
function liesInside(places: readonly number[], ends: number): boolean {
  return places.every((place) => place >= -0.5 - 1e-9 && place <= ends + 0.5 + 1e-9);
}

/** Where the corners of a shape stand across the cloth, in ends from the left selvedge, when it leans so far. */
function cornersAcross(shape: Shape, leanEnds: number, grid: BandGrid): number[] {
  const centre = centreInEnds(shape, grid);
  const half = widthOfShape(shape) / grid.spacingMm / 2;
  if (shape.shape !== 'points') {
    const top = shape.shape === 'triangle' ? 0 : half;
    return [centre - half, centre + half, centre + leanEnds - top, centre + leanEnds + top];
  }
  const box = boxOfPoints(shape.points);
  return shape.points.map(({ xMm, yMm }) => centre - half + (xMm - box.leftMm) / grid.spacingMm + (leanEnds * (yMm - box.bottomMm)) / box.heightMm);
}

function fitsAcross(shape: Shape, key: string, grid: BandGrid, report: BandReport): boolean {
  const widthEnds = widthOfShape(shape) / grid.spacingMm;
  if (widthEnds > grid.ends + 0.5) {
    report.reject('E_FIT', `${key}/${widthKeyOf(shape)}`, `The shape is wider than the cloth, which takes ${report.length(grid.ends * grid.spacingMm)}.`);
    return false;
  }
  if (!liesInside(cornersAcross(shape, 0, grid), grid.ends)) {
    report.reject('E_FIT', `${key}/centreMm`, 'The shape runs out over the selvedge. Move its middle inwards, or make it narrower.');
    return false;
  }
  if (!liesInside(cornersAcross(shape, (shape.leanMm ?? 0) / grid.spacingMm, grid), grid.ends)) {
    report.reject('E_FIT', `${key}/leanMm`, 'The shape leans out over the selvedge. Let it lean less.');
    return false;
  }
  return true;
}

function fitsUpright(shape: Shape, key: string, heightMm: number, report: BandReport): boolean {
  const roomMm = Math.max(0, heightMm - (shape.bottomMm ?? 0));
  if (heightOfShape(shape) <= roomMm + CLOSE_ENOUGH_MM) return true;
  const which = shape.bottomMm === undefined ? heightKeyOf(shape) : 'bottomMm';
  report.reject('E_FIT', `${key}/${which}`, `The shape is higher than its band: from its foot to the band’s end there are ${report.length(roomMm)}.`);
  return false;
}

function fitsIn(shape: Shape, key: string, heightMm: number, grid: BandGrid, report: BandReport): boolean {
  return fitsAcross(shape, key, grid, report) && fitsUpright(shape, key, heightMm, report);
}

function warnOfSlit(shape: Shape, key: string, grid: BandGrid, report: BandReport): void {
  if ((shape.join ?? 'slit') !== 'slit') return;
  const slitMm = longestSlitRows(placeShape(shape, grid), grid.ends) * grid.pickSpacingMm;
  if (slitMm > LONGEST_SLIT_MM) {
    report.warn('W_SLIT', `${key}/join`, `The slit at its side is ${report.length(slitMm)} long. Sew it when the piece is off the loom, or join the colours.`);
  }
}

function check(band: TabbyBand, heightMm: number, loom: DressedLoom, report: BandReport): void {
  const grid = gridOf(band, heightMm, loom);
  const heightKey = band.fill === true ? 'fill' : 'heightMm';
  if (grid.rows > MOST_ROWS) {
    report.reject('E_RANGE', heightKey, `That would be ${String(grid.rows)} rows. Check the height, the yarn and the beat.`);
    return;
  }
  if (grid.rows === 0) report.warn('W_THIN', heightKey, 'This band is thinner than one row and will not show.');
  band.shapes?.forEach((shape, index) => {
    const key = `shapes/${String(index)}`;
    if (fitsIn(shape, key, heightMm, grid, report)) warnOfSlit(shape, key, grid, report);
  });
}

function shapeRows(band: TabbyBand, loom: DressedLoom): number {
  const { pickSpacingMm } = picksOn(loom, pickIn(band, band.yarn));
  return (band.shapes ?? []).reduce((sum, shape) => sum + (shape.shape === 'points' ? picksInHeight(climbOfPoints(shape.points), pickSpacingMm) : rowsOfShape(shape, pickSpacingMm)), 0);
}

/** The rows that shapes may stand in; all others are the ground from edge to edge. */
function rowsWithShapes(shapes: readonly PlacedShape[], rows: number): { readonly first: number; readonly end: number } {
  const first = Math.min(rows, ...shapes.map(({ firstRow }) => firstRow));
  const end = Math.max(first, ...shapes.map(({ firstRow, rows: own }) => Math.min(rows, firstRow + own.length)));
  return { first, end };
}

interface Lying {
  readonly picks: LaidPicks;
  readonly thread: Thread;
}

/** How each yarn lies in this band, looked up once: a band may have thousands of rows. */
function lyingIn(band: TabbyBand, loom: DressedLoom): (role: string) => Lying {
  const known = new Map<string, Lying>();
  return (role) => {
    const found = known.get(role) ?? { picks: picksOn(loom, pickIn(band, role)), thread: threadInPicks(loom, pickIn(band, role)) };
    known.set(role, found);
    return found;
  };
}

export interface ColourRows {
  readonly rows: number;
  /** Rows of the ground from edge to edge. */
  readonly fullRows: number;
  /** The rows shapes may stand in, each in its areas. */
  readonly shaped: readonly (readonly YarnArea[])[];
}

/** Rows from `fromRow` on. */
export function colourRows(band: TabbyBand, heightMm: number, loom: DressedLoom, fromRow = 0): ColourRows {
  const grid = gridOf(band, heightMm, loom);
  const shapes = (band.shapes ?? []).map((shape) => placeShape(shape, grid));
  const standing = rowsWithShapes(shapes, grid.rows);
  const [first, end] = [Math.max(fromRow, standing.first), Math.max(fromRow, standing.end)];
  const rows = Math.max(0, grid.rows - fromRow);
  const shaped = Array.from({ length: end - first }, (_, row) => areasOfRow(first + row, band.yarn, shapes, grid.ends));
  return { rows, fullRows: rows - shaped.length, shaped };
}

function weave(band: TabbyBand, heightMm: number, loom: DressedLoom, fromRow = 0): Woven {
  const { rows, fullRows, shaped } = colourRows(band, heightMm, loom, fromRow);
  const { pickSpacingMm, workingEnds } = picksOn(loom, pickIn(band, band.yarn));
  const lying = lyingIn(band, loom);
  const pickMm = (role: string): number => pickLength(workingEnds, lying(role).picks);
  const threadMm = new Map([[band.yarn, fullRows * pickMm(band.yarn)]]);
  for (const area of shaped.flat()) {
    const areaMm = areaLength(area, lying(area.yarn).picks, lying(area.yarn).thread.compressedMm);
    threadMm.set(area.yarn, (threadMm.get(area.yarn) ?? 0) + areaMm);
  }
  const colourChanges = shaped.reduce((sum, areas) => sum + areas.length - 1, 0);
  return {
    picks: { key: pickKey(pickIn(band, band.yarn)), rows, rawRows: Math.max(0, heightMm / pickSpacingMm - fromRow) },
    counts: { picks: rows },
    uses: [...threadMm].map(([role, mm]): YarnUse => ({
      role,
      carry: 'shuttle',
      threadMm: mm,
      yarnMm: mm * lying(role).thread.strands,
      rowMm: pickMm(role),
    })),
    work: { rows, colourChanges },
  };
}

export const TABBY_WORDS: TechniqueWords = {
  label: 'Tabby',
  how: 'The weft goes over one end and under the next, and the other way round in the row that follows.',
  tools: ['shuttle or butterfly', 'comb'],
  cautions: [
    'Lay each row in a hill before you beat it down, or the edges draw in.',
    'Where colours meet at the same end for more than two centimetres, sew the slit or join them.',
  ],
};

export const tabby: Technique<'tabby'> = {
  read,
  roles: (band) => [
    { key: 'yarn', role: band.yarn, picks: pickIn(band, band.yarn) },
    ...(band.shapes ?? []).map((shape, index) => ({ key: `shapes/${String(index)}/yarn`, role: shape.yarn, picks: pickIn(band, shape.yarn) })),
  ],
  needsEvenEnds: (band) => band.basket === true,
  height: (band) => (band.fill === true ? 'fill' : band.heightMm),
  shapeRows,
  check,
  weave,
};

/** From a described piece and its plan to what the drawing needs. */
import type { ClothBand, EndSpan, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { NEUTRAL, mix, shade, yarnColour } from '#core/craft/cloth/colour.ts';
import { ASHENHURST_K, FRINGE_BUNDLE_ENDS } from '#core/craft/defaults.ts';
import type { Band, Finish, FrameLoomPiece, Shape, Yarn } from '#core/craft/piece.ts';
import type { BandPlan, FrameLoomPlan } from '#core/craft/plan-types.ts';
import { strandsInRow } from '#core/craft/techniques/tabby.ts';
import { present } from '#core/craft/reading/present.ts';
import { placeShape, type BandGrid } from '#core/craft/techniques/colour-rows.ts';
import { threadOf, withStrands } from '#core/craft/yarn/thread.ts';

/** Warp that names no colour: undyed cotton. */
const BARE_WARP = '#d8d2c1';
const UNKNOWN_COVER = 0.7;

/** `plan` must be the plan of `piece`; a band the plan does not know is left out. */
export function clothPieceOf(piece: FrameLoomPiece, plan: FrameLoomPlan, title: string): WovenPiece {
  const plans = new Map(plan.bands.map((band) => [band.index, band]));
  const bands = piece.bands.flatMap((band, index) => {
    const planned = plans.get(index);
    return planned === undefined ? [] : [bandOf(band, planned, index, piece, plan)];
  });
  return {
    kind: 'woven',
    title,
    thing: 'wall hanging',
    widthMm: piece.size.widthMm,
    ends: plan.ends.working,
    endsTogether: piece.warp.endsTogether ?? 1,
    warpColour: piece.warp.yarn.colour === undefined ? BARE_WARP : yarnColour(piece.warp.yarn.colour),
    seed: piece.seed ?? 7,
    turned: piece.hangs === 'turned',
    loom: {
      insideWidthMm: piece.loom.insideWidthMm ?? plan.loom.insideWidthNeededMm,
      insideHeightMm: piece.loom.insideHeightMm,
      bottomMm: plan.loom.bottomMm,
    },
    ...present({ finish: finishOf(piece.finish), fixing: piece.dowel?.fixing }),
    bands,
  };
}

function finishOf(finish: Finish | undefined): Required<Finish> | undefined {
  return finish && { bottom: finish.bottom, fringeMm: finish.fringeMm ?? 0, bundleEnds: finish.bundleEnds ?? FRINGE_BUNDLE_ENDS };
}

interface NamedColour {
  readonly colour: string;
  readonly yarn: string;
}

/** A role's colour and its name in a word or two: the last part of its label, or the role itself. */
function roleOf(role: string, piece: FrameLoomPiece): NamedColour {
  const yarn: Yarn | undefined = Object.hasOwn(piece.yarns, role) ? piece.yarns[role] : undefined;
  const label = yarn?.label?.split(',').at(-1)?.trim();
  return { colour: yarn === undefined ? NEUTRAL : yarnColour(yarn.colour), yarn: label === undefined || label === '' ? role : label };
}

function bandOf(band: Band, planned: BandPlan, index: number, piece: FrameLoomPiece, plan: FrameLoomPlan): ClothBand {
  const base = { name: band.name, heightMm: planned.heightMm, ...roleOf(band.yarn, piece) };
  switch (band.technique) {
    case 'tabby': {
      const picks = planned.picks ?? Math.max(1, Math.round(planned.heightMm / plan.weft.pickSpacingMm));
      const pickSpacingMm = planned.heightMm / picks;
      const own = piece.yarns[band.yarn];
      const strands = strandsInRow(band) ?? own?.strands;
      const together = band.basket === true ? 2 : 1;
      const grid = { spacingMm: plan.ends.spacingMm * together, pickSpacingMm, ends: Math.floor(plan.ends.working / together), rows: picks, widthMm: piece.size.widthMm };
      const shapes = (band.shapes ?? []).map((shape) => ({ ...roleOf(shape.yarn, piece), ...present({ join: shape.join }), spans: spansOf(shape, grid) }));
      return { ...base, technique: 'tabby', picks, cover: coverOf(own, strands, pickSpacingMm), shapes, ...(together === 2 && { together }), ...(strands !== undefined && { strands }) };
    }
    case 'soumak':
      return {
        ...base,
        technique: 'soumak',
        rows: band.rows,
        over: band.over,
        back: band.back,
        tabbyBetween: band.tabbyBetween,
        tabbyColour: roleOf(band.tabbyYarn, piece).colour,
        soumakShare: soumakShare(band.rows, band.tabbyBetween, planned.heightMm, plan.weft.pickSpacingMm),
      };
    case 'rya':
      return { ...base, technique: 'rya', rows: band.rows, knotEnds: 2 * band.legEnds, ...present({ edgeEnds: band.edgeEnds }), strands: band.strands, pileMm: band.pileMm, groundColour: groundOf(index, piece) };
    case 'roving':
      return { ...base, technique: 'roving', over: band.over, passes: band.passes ?? 1 };
    case 'loop-pile':
      return { ...base, technique: 'loop-pile', rows: band.rows, loopMm: band.loopMm ?? (Math.PI * band.rodMm) / 2, groundColour: groundOf(index, piece) };
    case 'twining':
      return { ...base, technique: 'twining', rows: band.rows, ...(band.endsPerTwist !== undefined && { endsPerTwist: band.endsPerTwist }) };
    case 'hem-stitch':
      return { ...base, technique: 'hem-stitch', heightMm: 0, bundleEnds: band.bundleEnds, reachMm: band.reachPicks * plan.weft.pickSpacingMm };
  }
}

/** Share of a soumak band that the plain picks between its rows leave to the soumak. */
function soumakShare(rows: number, between: number, heightMm: number, pickSpacingMm: number): number {
  if (heightMm <= 0) return 1;
  const plain = Math.max(0, rows - 1) * between * pickSpacingMm;
  return Math.min(1, Math.max(0.4, 1 - plain / heightMm));
}

/** Pile stands on the tabby it is woven into: that of the nearest tabby band, before or after it. */
function groundOf(index: number, piece: FrameLoomPiece): string {
  for (let step = 1; step < piece.bands.length; step++) {
    for (const near of [piece.bands[index - step], piece.bands[index + step]]) {
      if (near?.technique === 'tabby') return roleOf(near.yarn, piece).colour;
    }
  }
  const own = piece.bands[index];
  return own === undefined ? NEUTRAL : mix(roleOf(own.yarn, piece).colour, shade(NEUTRAL, 0.3), 0.25);
}

/** How far the weft hides the warp: from the thickness of the yarn as it lies free, against the room of a row. */
function coverOf(yarn: Yarn | undefined, strands: number | undefined, pickSpacingMm: number): number {
  if (yarn === undefined || !(pickSpacingMm > 0)) return UNKNOWN_COVER;
  return Math.max(0, Math.min(1, (withStrands(threadOf(yarn, ASHENHURST_K.weft), strands ?? 1).loftMm / pickSpacingMm - 0.6) / 0.6));
}

/** The ends a shape takes in each pick, as its yarn was counted. */
function spansOf(shape: Shape, grid: BandGrid): EndSpan[] {
  const { firstRow, rows } = placeShape(shape, grid);
  return rows.flatMap((runs, index) => runs.map(({ start, ends }) => ({ row: firstRow + index, from: start, to: start + ends })));
}

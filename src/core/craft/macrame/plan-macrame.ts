/**
 * The plan of a knotted piece. Every section tells what it takes of an end that works and of one that is only knotted
 * round; a cord is folded in its middle, so twice its longer end is cut.
 */
import { HANGING, PACE } from '#core/craft/defaults.ts';
import { bundleDiameter, leastDowelDiameter } from '#core/craft/hanging.ts';
import { gatheringCord, HITCH_ROW, larksHead, sectionedCordLength, squareKnotCord, squareKnotsIn } from '#core/craft/macrame/cord.ts';
import type { Column, ColumnPlan, CordCut, MacramePlan, Section, SectionPlan } from '#core/craft/macrame/piece.ts';
import { readPiece, type KnownCord, type PieceParts } from '#core/craft/macrame/read-piece.ts';
import type { Hours, WarpPlan } from '#core/craft/plan-types.ts';
import { ballsFor, withMargin } from '#core/craft/purchase.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { below, type Findings } from '#core/craft/reading/findings.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';
import { massOf } from '#core/craft/yarn/thread.ts';

/** Common practice, no source: knots an hour of a steady hand, cords cut and hung, and drawing level at the end. */
export const KNOTTING_PACE = { knotsPerHour: 60, hitchesPerHour: 90, cordsPerHour: 20, gatheringHours: 0.15, finishingHours: 0.5 } as const;
/** Common practice: tails of a gathering cord, each. */
export const GATHERING_TAIL_MM = 100;
/** The rule of practice and the sum of the knots may differ by this factor before it is worth a word. */
const RULE_AGREES_WITHIN = 1.5;
/** Ends hang this many diameters apart. */
export const END_SPACING = 1.15;
/** Between two columns, in cord diameters. */
export const COLUMN_GAP = 2;

interface Around {
  readonly ends: number;
  readonly cord: KnownCord;
  readonly parts: PieceParts;
}

type Taken = Omit<SectionPlan, 'technique' | 'name'>;

function planSquareKnots(section: Extract<Section, { technique: 'square-knots' }>, { ends, cord: { diameterMm }, parts: { takes } }: Around): Taken {
  const gapMm = section.gapMm ?? 0;
  const each = section.knots ?? Math.max(1, squareKnotsIn(section.heightMm, diameterMm, takes.squareRise, gapMm));
  const gaps = (each - 1) * gapMm;
  const heightMm = each * takes.squareRise * diameterMm + gaps;
  return { heightMm, knots: each * (ends / 4), workerMm: each * squareKnotCord(diameterMm, takes.squareKnot) + gaps, fillerMm: heightMm };
}

/** Half the rows are tied by the neighbours of those that tie the others, so an inner end works in one row and rests in the next. */
function planAlternating({ rows, gapMm = 0 }: Extract<Section, { technique: 'alternating' }>, { ends, cord: { diameterMm }, parts: { takes } }: Around): Taken {
  const [whole, between] = [Math.ceil(rows / 2), Math.floor(rows / 2)];
  const rise = takes.squareRise * diameterMm;
  const gaps = (rows - 1) * gapMm;
  const works = squareKnotCord(diameterMm, takes.squareKnot);
  return {
    heightMm: rows * rise + gaps,
    knots: whole * (ends / 4) + between * (ends / 4 - 1),
    workerMm: whole * works + between * rise + gaps,
    fillerMm: whole * rise + between * works + gaps,
  };
}

/** A slanted row falls by the width it crosses. */
function planHalfHitches({ rows, slant = 'level' }: Extract<Section, { technique: 'half-hitches' }>, { ends, cord: { diameterMm }, parts: { takes } }: Around): Taken {
  const widthMm = ends * END_SPACING * diameterMm;
  const fallMm = slant === 'level' ? 0 : widthMm;
  return {
    heightMm: rows * HITCH_ROW * diameterMm + fallMm,
    knots: rows * (ends - 1),
    workerMm: rows * takes.doubleHalfHitch * diameterMm + fallMm,
    fillerMm: rows * Math.hypot(widthMm, fallMm),
  };
}

function takenBy(section: Section, around: Around): Taken {
  const { ends, cord, parts } = around;
  switch (section.technique) {
    case 'square-knots':
      return planSquareKnots(section, around);
    case 'alternating':
      return planAlternating(section, around);
    case 'half-hitches':
      return planHalfHitches(section, around);
    case 'gathering': {
      const own = parts.cords.get(section.yarn ?? '') ?? cord;
      const heightMm = section.wraps * own.diameterMm;
      const cordMm = gatheringCord(section.wraps, bundleDiameter(ends, cord.diameterMm), own.diameterMm, GATHERING_TAIL_MM);
      return { heightMm, knots: 1, workerMm: heightMm, fillerMm: heightMm, cordMm };
    }
    default:
      return { heightMm: section.heightMm, workerMm: section.heightMm, fillerMm: section.heightMm };
  }
}

function planSection(section: Section, around: Around): SectionPlan {
  return { technique: section.technique, ...(section.name === undefined ? {} : { name: section.name }), ...takenBy(section, around) };
}

const sumOf = <T>(list: readonly T[], of: (item: T) => number): number => list.reduce((sum, item) => sum + of(item), 0);
const isKnotted = ({ technique }: SectionPlan): boolean => technique === 'square-knots' || technique === 'alternating' || technique === 'half-hitches';
const knottedMm = (sections: readonly SectionPlan[]): number => sumOf(sections.filter(isKnotted), ({ heightMm }) => heightMm);

interface Hung {
  readonly column: Column;
  readonly cord: KnownCord;
  readonly ends: number;
  readonly sections: readonly SectionPlan[];
  readonly heightMm: number;
}

function planColumn({ column, cord, ends, sections, heightMm }: Hung, index: number, below: { readonly longestMm: number; readonly footMm: number }, parts: PieceParts): ColumnPlan {
  // A shorter column hangs plain until the longest ends, where the foot goes on with all of them.
  const plainMm = below.footMm === 0 ? 0 : below.longestMm - heightMm + below.footMm;
  const endMm = Math.max(sumOf(sections, ({ workerMm }) => workerMm), sumOf(sections, ({ fillerMm }) => fillerMm)) + plainMm;
  const rodMm = parts.rod.kind === 'rod' ? parts.rod.diameterMm : (parts.rod.thickMm ?? 8);
  const knotted = knottedMm(sections);
  return {
    index,
    ...(column.name === undefined ? {} : { name: column.name }),
    ends,
    heightMm,
    cords: column.cords,
    cutMm: larksHead(rodMm, cord.diameterMm) + 2 * (endMm + parts.tailMm),
    ruleMm: sectionedCordLength(knotted, heightMm - knotted + plainMm),
    sections,
  };
}

function checkRule({ index, cutMm, ruleMm }: ColumnPlan, findings: Findings): void {
  const times = cutMm / ruleMm;
  if (times <= RULE_AGREES_WITHIN && times >= 1 / RULE_AGREES_WITHIN) return;
  findings.warn('W_RULE', below('/columns', index), `Knot by knot these cords come to ${findings.length(cutMm)}, by the old rule of four times the length to ${findings.length(ruleMm)}. Measure ten of your own knots before you cut.`);
}

/** All that is cut, the hanging cords first. */
function cutsOf(columns: readonly ColumnPlan[], foot: readonly SectionPlan[], { columns: described, foot: footDescribed }: PieceParts): CordCut[] {
  const cords = columns.map(({ index, name, cords: count, cutMm }): CordCut => ({ what: 'cord', where: name ?? `column ${String(index + 1)}`, yarn: described[index]?.yarn ?? '', count, lengthMm: cutMm }));
  const gathering = (sections: readonly SectionPlan[], of: readonly Section[], own: string): CordCut[] => sections.flatMap((section, index) => {
    const asked = of[index];
    if (section.cordMm === undefined || asked?.technique !== 'gathering') return [];
    return [{ what: 'gathering-cord', where: section.name ?? 'gathering knot', yarn: asked.yarn ?? own, count: 1, lengthMm: section.cordMm }];
  });
  return [
    ...cords,
    ...columns.flatMap(({ index, sections }) => gathering(sections, described[index]?.sections ?? [], described[index]?.yarn ?? '')),
    ...gathering(foot, footDescribed, described[0]?.yarn ?? ''),
  ];
}

function planYarns(cuts: readonly CordCut[], { cords, margin }: PieceParts, findings: Findings): Record<string, WarpPlan> {
  const plans: Record<string, WarpPlan> = {};
  for (const [role, { tex, ball }] of cords) {
    const netMm = sumOf(cuts.filter(({ yarn }) => yarn === role), ({ count, lengthMm }) => count * lengthMm);
    if (netMm === 0) findings.warn('W_UNUSED', below('/yarns', role), `Nothing is knotted with “${role}”.`);
    const withMarginMm = withMargin(netMm, margin);
    const plan = { netMm, withMarginMm, massG: massOf(netMm, tex) };
    const balls = ball === undefined ? undefined : ballsFor(withMarginMm, ball.metres);
    if (balls?.tight === true) findings.warn('W_TIGHT', `${below('/yarns', role)}/ball`, `Only ${findings.length(balls.leftOverMm)} would be left of the last one. One more of the same lot is safer.`);
    plans[role] = balls === undefined ? plan : { ...plan, balls: balls.count };
  }
  return plans;
}

function planHours(columns: readonly ColumnPlan[], foot: readonly SectionPlan[]): Hours {
  const sections = [...columns.flatMap((column) => column.sections), ...foot];
  const knots = (of: (section: SectionPlan) => boolean): number => sumOf(sections.filter(of), (section) => section.knots ?? 0);
  const likely =
    sumOf(columns, ({ cords }) => cords) / KNOTTING_PACE.cordsPerHour +
    knots(({ technique }) => technique === 'square-knots' || technique === 'alternating') / KNOTTING_PACE.knotsPerHour +
    knots(({ technique }) => technique === 'half-hitches') / KNOTTING_PACE.hitchesPerHour +
    knots(({ technique }) => technique === 'gathering') * KNOTTING_PACE.gatheringHours +
    KNOTTING_PACE.finishingHours;
  return { likely, low: likely * PACE.lowFactor, high: likely * PACE.highFactor };
}

function hang(column: Column, parts: PieceParts): Hung | undefined {
  const cord = parts.cords.get(column.yarn);
  if (cord === undefined) return undefined;
  const ends = 2 * column.cords;
  const sections = column.sections.map((section) => planSection(section, { ends, cord, parts }));
  return { column, cord, ends, sections, heightMm: sumOf(sections, ({ heightMm }) => heightMm) };
}

/** Columns side by side. */
function widthOf(hung: readonly Hung[]): number {
  const gapMm = COLUMN_GAP * Math.max(...hung.map(({ cord }) => cord.diameterMm));
  return sumOf(hung, ({ ends, cord }) => ends * END_SPACING * cord.diameterMm) + (hung.length - 1) * gapMm;
}

/** Reads a piece and reckons it; undefined, with a problem among the findings, if it cannot be knotted. */
export function planMacrame(fields: Fields): Omit<MacramePlan, 'warnings'> | undefined {
  const parts = readPiece(fields);
  return parts && reckonMacrame(parts, fields.findings);
}

/** The plan of a piece that has been read; undefined, with a problem among the findings, if it cannot be knotted. */
export function reckonMacrame(parts: PieceParts, findings: Findings): Omit<MacramePlan, 'warnings'> | undefined {
  const hung = parts.columns.flatMap((column) => hang(column, parts) ?? []);
  const [first] = hung;
  if (first === undefined) return undefined;
  const ends = sumOf(hung, (column) => column.ends);
  const foot = parts.foot.map((section) => planSection(section, { ends, cord: first.cord, parts }));
  const longestMm = Math.max(...hung.map(({ heightMm }) => heightMm));
  const footMm = sumOf(foot, ({ heightMm }) => heightMm);
  const heightMm = longestMm + footMm;
  if (heightMm > LONGEST_MM) findings.reject('E_RANGE', '/columns', `This piece would be ${findings.length(heightMm)} long. Up to ${findings.length(LONGEST_MM)} work.`);
  if (findings.count > 0) return undefined;
  const columns = hung.map((column, index) => planColumn(column, index, { longestMm, footMm }, parts));
  for (const column of columns) checkRule(column, findings);
  const cut = cutsOf(columns, foot, parts);
  const yarns = planYarns(cut, parts, findings);
  const massG = sumOf(Object.values(yarns), (yarn) => yarn.massG);
  const widthMm = widthOf(hung);
  return {
    craft: 'macrame',
    widthMm,
    heightMm,
    cords: ends / 2,
    ends,
    knots: sumOf([...columns.flatMap((column) => column.sections), ...foot], ({ knots }) => knots ?? 0),
    columns,
    foot,
    ...planRod(parts, widthMm, massG, findings),
    cut,
    yarns,
    massG,
    hours: planHours(columns, foot),
  };
}

function planRod({ rod }: PieceParts, widthMm: number, massG: number, findings: Findings): Pick<MacramePlan, 'rod'> {
  if (rod.kind === 'ring') return {};
  const lengthMm = rod.lengthMm ?? widthMm + 2 * HANGING.overhangMm;
  const minDiameterMm = leastDowelDiameter(massG, lengthMm);
  if (lengthMm < widthMm) findings.warn('W_DOWEL', '/rod/lengthMm', `This rod is shorter than the knots are wide. ${findings.length(widthMm + 2 * HANGING.overhangMm)} lets it stand out on both sides.`);
  if (rod.diameterMm < minDiameterMm) findings.warn('W_DOWEL', '/rod/diameterMm', `This rod will sag under the piece. ${findings.length(minDiameterMm, 'up')} and thicker holds.`);
  return { rod: { lengthMm, minDiameterMm } };
}

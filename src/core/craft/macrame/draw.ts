/** A knotted piece as strands and knots, laid from the top down as they are tied. */
import { chanceFrom } from '#core/craft/cloth/chance.ts';
import type { HungPiece, HungStrand, PlacedMotif } from '#core/craft/cloth/cloth-piece.ts';
import { yarnColour } from '#core/craft/cloth/colour.ts';
import type { MadeOf } from '#core/craft/craft.ts';
import { HITCH_ROW } from '#core/craft/macrame/cord.ts';
import { describeMacrame } from '#core/craft/macrame/describe.ts';
import { doubleHalfHitch, larksHead, squareKnot, wraps, type Yarned } from '#core/craft/macrame/motifs.ts';
import type { MacramePiece, MacramePlan, Section, SectionPlan } from '#core/craft/macrame/piece.ts';
import { COLUMN_GAP, END_SPACING } from '#core/craft/macrame/plan-macrame.ts';

/** No picture holds more knots than this; beyond it several stand as one. */
const MOST_KNOTS = 420;
const MOST_ROWS = 24;
/** A picture shows at most so many ends of a column; more of them are drawn together. */
const MOST_ENDS = 32;
const RING_MM = 8;
/** Ends hang this close where they come through a ring or a gathering knot, in their own thickness. */
const GATHERED = 0.42;

class Drawing {
  readonly motifs: (readonly HungStrand[])[] = [];
  readonly laid: (HungStrand | PlacedMotif | 'rod')[] = [];
  readonly #known = new Map<string, number>();
  readonly chance: () => number;
  /** How many real knots one drawn knot stands for. */
  readonly knotsTogether: number;

  constructor(seed: number, knots: number) {
    this.chance = chanceFrom(seed);
    this.knotsTogether = Math.max(1, Math.ceil(knots / MOST_KNOTS));
  }

  /** Places a knot that is drawn alike wherever its key is alike. */
  place(key: string, strands: () => readonly HungStrand[], xMm: number, yMm: number): void {
    let motif = this.#known.get(key);
    if (motif === undefined) {
      motif = this.motifs.length;
      this.motifs.push(strands());
      this.#known.set(key, motif);
    }
    this.laid.push({ motif, xMm, yMm });
  }
}

/** Where an end is: its next stretch begins there. */
interface End {
  x: number;
  y: number;
  /** Where it hangs when nothing draws it aside. */
  readonly home: number;
}

interface Bundle {
  readonly cord: Yarned;
  readonly ends: readonly End[];
}

/** What stands at the same place in both. */
function pairsOf<A, B>(ones: readonly A[], others: readonly B[]): [A, B][] {
  return ones.flatMap((one, index): [A, B][] => {
    const other = others[index];
    return other === undefined ? [] : [[one, other]];
  });
}

function lead(drawing: Drawing, { colour, dMm }: Yarned, end: End, x: number, y: number): void {
  if (y - end.y > 0.01) {
    const bend = (y - end.y) * 0.4;
    drawing.laid.push({ colour, widthMm: dMm, way: [end.x, end.y, end.x, end.y + bend, x, y - bend, x, y] });
  }
  end.x = x;
  end.y = y;
}

/** Four ends from `first` on, knotted together at their middle. */
function knotGroup(drawing: Drawing, { cord, ends }: Bundle, first: number, y: number, high: number, spiral: boolean): void {
  const group = ends.slice(first, first + 4);
  const middle = group.reduce((sum, { home }) => sum + home, 0) / group.length;
  group.forEach((end, index) => {
    lead(drawing, cord, end, middle + (index - 1.5) * cord.dMm, y);
    end.y = y + high;
  });
  drawing.place(`square ${cord.colour} ${String(cord.dMm)} ${high.toFixed(2)} ${String(spiral)}`, () => squareKnot(cord, high, spiral), middle, y);
}

function drawSquareKnots(drawing: Drawing, bundle: Bundle, section: Extract<Section, { technique: 'square-knots' }>, plan: SectionPlan, top: number): void {
  const each = (plan.knots ?? 0) / (bundle.ends.length / 4);
  const shown = Math.max(1, Math.round(each / drawing.knotsTogether));
  const gap = ((section.gapMm ?? 0) * (each - 1)) / Math.max(1, shown - 1);
  const high = (plan.heightMm - gap * (shown - 1)) / shown;
  for (let first = 0; first + 3 < bundle.ends.length; first += 4) {
    for (let knot = 0; knot < shown; knot++) knotGroup(drawing, bundle, first, top + knot * (high + gap), high, section.spiral === true);
  }
}

function drawAlternating(drawing: Drawing, bundle: Bundle, section: Extract<Section, { technique: 'alternating' }>, plan: SectionPlan, top: number): void {
  const shown = Math.min(section.rows, MOST_ROWS);
  const pitch = plan.heightMm / Math.max(1, shown);
  const high = Math.min(pitch, 3.5 * bundle.cord.dMm);
  for (let row = 0; row < shown; row++) {
    for (let first = row % 2 === 0 ? 0 : 2; first + 3 < bundle.ends.length; first += 4) knotGroup(drawing, bundle, first, top + row * pitch, high, false);
  }
}

function drawHalfHitches(drawing: Drawing, { cord, ends }: Bundle, section: Extract<Section, { technique: 'half-hitches' }>, plan: SectionPlan, top: number): void {
  const slant = section.slant ?? 'level';
  const shown = Math.min(section.rows, MOST_ROWS);
  const step = HITCH_ROW * cord.dMm;
  const fall = slant === 'level' ? 0 : Math.max(0, plan.heightMm - section.rows * step);
  const homes = ends.map(({ home }) => home);
  const [left, right] = [Math.min(...homes), Math.max(...homes)];
  const share = (x: number): number => (slant === 'right' ? (x - left) / (right - left) : (right - x) / (right - left));
  for (let row = 0; row < shown; row++) {
    const yAt = (x: number): number => top + row * step + fall * share(x);
    for (const end of ends) lead(drawing, cord, end, end.home, yAt(end.home));
    const middle = (yAt(left) + yAt(right)) / 2 + cord.dMm;
    drawing.laid.push({ colour: cord.colour, widthMm: cord.dMm, way: [left - cord.dMm, yAt(left) + cord.dMm, (left + right) / 2, middle, (left + right) / 2, middle, right + cord.dMm, yAt(right) + cord.dMm] });
    ends.forEach((end) => {
      drawing.place(`hitch ${cord.colour} ${String(cord.dMm)}`, () => doubleHalfHitch(cord), end.x, end.y);
      end.y += step;
    });
  }
}

function drawGathering(drawing: Drawing, { cord, ends }: Bundle, own: Yarned, turns: number, top: number): void {
  const middle = ends.reduce((sum, { x }) => sum + x, 0) / Math.max(1, ends.length);
  const wide = (ends.length - 1) * cord.dMm * GATHERED + cord.dMm;
  ends.forEach((end, index) => {
    lead(drawing, cord, end, middle + (index - (ends.length - 1) / 2) * cord.dMm * GATHERED, top);
    end.y = top + turns * own.dMm;
  });
  const shown = Math.min(turns, 40);
  const thick = { ...own, dMm: (own.dMm * turns) / shown };
  drawing.place(`wraps ${own.colour} ${String(thick.dMm)} ${String(shown)} ${wide.toFixed(1)}`, () => wraps(thick, shown, wide + own.dMm * 0.6), middle, top);
}

function drawFringe(drawing: Drawing, { cord, ends }: Bundle, top: number, high: number): void {
  ends.forEach((end, index) => {
    const spread = (index - (ends.length - 1) / 2) * cord.dMm * 0.28 + (drawing.chance() - 0.5) * cord.dMm;
    lead(drawing, cord, end, end.x + spread, top + high * (0.9 + drawing.chance() * 0.1));
  });
}

function drawSection(drawing: Drawing, bundle: Bundle, section: Section, plan: SectionPlan, top: number, cords: (role: string | undefined) => Yarned | undefined): void {
  switch (section.technique) {
    case 'square-knots':
      drawSquareKnots(drawing, bundle, section, plan, top);
      break;
    case 'alternating':
      drawAlternating(drawing, bundle, section, plan, top);
      break;
    case 'half-hitches':
      drawHalfHitches(drawing, bundle, section, plan, top);
      break;
    case 'gathering':
      drawGathering(drawing, bundle, cords(section.yarn) ?? bundle.cord, section.wraps, top);
      break;
    case 'fringe':
      drawFringe(drawing, bundle, top, plan.heightMm);
      break;
    case 'plain':
      // Where nothing follows, the ends hang straight; else they are led to their next place when it is known.
      for (const end of bundle.ends) lead(drawing, bundle.cord, end, end.home, top + plan.heightMm);
  }
}

function drawSections(drawing: Drawing, bundle: Bundle, sections: readonly [Section, SectionPlan][], from: number, cords: (role: string | undefined) => Yarned | undefined): void {
  let top = from;
  for (const [section, plan] of sections) {
    drawSection(drawing, bundle, section, plan, top, cords);
    top += plan.heightMm;
  }
}

/** Many ends are drawn as fewer, thicker ones, in whole fours. */
function drawnEnds(ends: number): number {
  if (ends <= MOST_ENDS) return ends;
  const fewer = Math.ceil(ends / Math.ceil(ends / MOST_ENDS));
  return fewer - (fewer % 4) || 4;
}

interface Strung {
  readonly bundle: Bundle;
  readonly sections: readonly [Section, SectionPlan][];
}

/** The columns side by side, every end under its lark's head. */
function string({ piece, plan }: MadeOf<MacramePiece, MacramePlan>, colourOf: (role: string) => string, totalMm: number): Strung[] {
  const unit = plan.widthMm / Math.max(1, plan.columns.reduce((sum, { ends }) => sum + ends * END_SPACING, 0) + (plan.columns.length - 1) * COLUMN_GAP);
  let left = (totalMm - plan.widthMm) / 2;
  return pairsOf(piece.columns, plan.columns).map(([described, column]) => {
    const wide = column.ends * END_SPACING * unit;
    const count = drawnEnds(column.ends);
    const pitch = wide / count;
    const from = left;
    const ends = Array.from({ length: count }, (_, index): End => ({ x: from + (index + 0.5) * pitch, y: 0, home: from + (index + 0.5) * pitch }));
    left += wide + COLUMN_GAP * unit;
    const cord = { colour: colourOf(described.yarn), dMm: pitch / END_SPACING };
    return { bundle: { cord, ends }, sections: pairsOf(described.sections, column.sections) };
  });
}

/** Through a ring all ends come close together; on a rod they hang where they are knotted. */
function mount(drawing: Drawing, strung: readonly Strung[], rod: MacramePiece['rod'], middle: number): void {
  const all = strung.flatMap(({ bundle }) => bundle.ends.map((end) => ({ end, cord: bundle.cord })));
  const reach = rod.kind === 'ring' ? (rod.thickMm ?? RING_MM) : rod.diameterMm;
  if (rod.kind === 'ring') {
    const room = Math.min(1, (rod.diameterMm * 0.8) / Math.max(1, all.reduce((sum, { cord }) => sum + cord.dMm, 0)));
    all.forEach(({ end, cord }, index) => { end.x = middle + (index - (all.length - 1) / 2) * cord.dMm * room; });
  }
  for (const { end, cord } of all) drawing.laid.push({ colour: cord.colour, widthMm: cord.dMm, way: [end.x, -reach * 0.4, end.x, 0, end.x, 0, end.x, cord.dMm] });
  drawing.laid.push('rod');
  for (const { bundle } of strung) {
    for (let first = 0; first + 1 < bundle.ends.length; first += 2) {
      const [one, two] = [bundle.ends[first], bundle.ends[first + 1]];
      if (one === undefined || two === undefined) continue;
      const near = Math.min(bundle.cord.dMm, Math.abs(two.x - one.x));
      drawing.place(`lark ${bundle.cord.colour} ${near.toFixed(2)}`, () => larksHead({ ...bundle.cord, dMm: near }, reach * 0.96), (one.x + two.x) / 2, 0);
    }
  }
}

export function drawMacrame(made: MadeOf<MacramePiece, MacramePlan>, title: string): HungPiece {
  const { piece, plan } = made;
  const colourOf = (role: string): string => yarnColour(piece.yarns[role]?.colour);
  const drawing = new Drawing(piece.seed ?? 7, plan.knots);
  const widthMm = Math.max(plan.widthMm * 1.06, plan.rod?.lengthMm ?? 0, piece.rod.kind === 'ring' ? piece.rod.diameterMm * 1.1 : 0);
  const strung = string(made, colourOf, widthMm);
  mount(drawing, strung, piece.rod, widthMm / 2);
  const own = (near: Yarned) => (role: string | undefined): Yarned | undefined => (role === undefined ? undefined : { colour: colourOf(role), dMm: near.dMm });
  const longest = Math.max(0, ...plan.columns.map(({ heightMm }) => heightMm));
  for (const { bundle, sections } of strung) drawSections(drawing, bundle, sections, 0, own(bundle.cord));
  drawFoot(drawing, strung, made, longest, own);
  return {
    kind: 'hung',
    title,
    thing: 'knotted hanging',
    widthMm,
    heightMm: plan.heightMm,
    rod: piece.rod.kind === 'ring' ? { kind: 'ring', diameterMm: piece.rod.diameterMm, thickMm: piece.rod.thickMm ?? RING_MM } : { kind: 'rod', diameterMm: piece.rod.diameterMm },
    words: describeMacrame(made),
    motifs: drawing.motifs,
    laid: drawing.laid,
  };
}

/** Below the columns all ends go on as one bundle, drawn together to a sheaf. */
function drawFoot(drawing: Drawing, strung: readonly Strung[], { piece, plan }: MadeOf<MacramePiece, MacramePlan>, longest: number, own: (near: Yarned) => (role: string | undefined) => Yarned | undefined): void {
  const [first] = strung;
  if (first === undefined || piece.foot === undefined) return;
  const all = strung.flatMap(({ bundle }) => bundle.ends);
  const middle = all.reduce((sum, { x }) => sum + x, 0) / all.length;
  const { cord } = first.bundle;
  const ends = all.map((end, index): End => ({ ...end, home: middle + (index - (all.length - 1) / 2) * cord.dMm * GATHERED }));
  drawSections(drawing, { cord, ends }, pairsOf(piece.foot, plan.foot), longest, own(cord));
}

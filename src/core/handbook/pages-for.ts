/**
 * Where the handbook tells more: the page of every technique, of every figure, and of every common fault. Lessons and
 * verdicts link by these; a test holds them to the pages that are there.
 */
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';
import type { TechniqueName } from '#core/craft/piece.ts';

/** A page of the handbook by its id, and a heading on it where it is not the whole page. */
export interface HandbookPart {
  readonly page: string;
  readonly heading?: string | undefined;
}

export const TECHNIQUE_PAGES: Readonly<Record<TechniqueName, string>> = {
  tabby: 'tabby',
  soumak: 'soumak',
  rya: 'rya',
  roving: 'weaving-with-roving',
  'hem-stitch': 'hem-stitch-and-finishing-off',
  'loop-pile': 'loop-pile',
  twining: 'twining',
};

/** The page that shows a figure and says most about it. */
export const FIGURE_PAGES: Readonly<Record<FigureKind, string>> = {
  warping: 'winding-a-warp',
  'doubled-ends': 'spacing-and-sett',
  'spacer-card': 'winding-a-warp',
  tabby: 'tabby',
  selvedge: 'selvedges-and-draw-in',
  'hem-stitch': 'hem-stitch-and-finishing-off',
  'rya-knot': 'rya',
  wedge: 'wedges-slits-and-joins',
  slit: 'slits-and-sewing-them',
  'sewn-slit': 'slits-and-sewing-them',
  columns: 'stripes-and-hachures',
  soumak: 'soumak',
  roving: 'weaving-with-roving',
  'shed-stick': 'tabby',
  butterfly: 'joining-yarn',
  'cutting-off': 'hem-stitch-and-finishing-off',
  'overhand-knot': 'hem-stitch-and-finishing-off',
  hanging: 'hanging-and-mounting',
  'weave-in': 'joining-yarn',
  'measure-wraps': 'wraps-per-inch',
  'card-width': 'rya',
  'join-in-row': 'joining-yarn',
  basket: 'twill-and-basket',
  twill: 'twill-and-basket',
  'doubled-weft': 'twill-and-basket',
  'loop-pile': 'loop-pile',
  twining: 'twining',
  dovetail: 'dovetail-and-interlock',
  interlock: 'dovetail-and-interlock',
  'fringe-knot': 'fringes',
  'twisted-fringe': 'fringes',
  'braided-fringe': 'fringes',
  'larks-head': 'basic-knots',
  'square-knot': 'basic-knots',
  'half-hitch': 'basic-knots',
  'double-half-hitch': 'basic-knots',
  'gathering-knot': 'basic-knots',
};

export interface CommonFault {
  /** As it is said to a person: what is seen, in few words. */
  readonly says: string;
  readonly at: HandbookPart;
}

const warp = (says: string, heading: string): CommonFault => ({ says, at: { page: 'mending-the-warp', heading } });
const rows = (says: string, heading: string): CommonFault => ({ says, at: { page: 'mending-rows', heading } });
const shape = (says: string, heading: string): CommonFault => ({ says, at: { page: 'mending-shape-and-edges', heading } });

/** What most often has to be mended, in the order in which it happens; each with the heading that says how. */
export const COMMON_FAULTS = {
  'crossed-ends': warp('Two ends have changed places', 'crossed-ends'),
  'slack-end': warp('An end is slack', 'a-slack-end'),
  'slack-warp': warp('The whole warp is slack', 'a-slack-warp'),
  'uneven-spacing': warp('The ends stand unevenly', 'uneven-spacing'),
  'missed-nail': warp('A nail was missed, or taken twice', 'a-nail-missed'),
  'frayed-end': warp('An end has frayed', 'a-frayed-end'),
  'broken-end': warp('An end has broken', 'a-broken-end'),
  float: rows('A float: the weft has missed an end', 'a-float'),
  'double-row': rows('Two rows lie in one shed', 'two-rows-in-one-shed'),
  loop: rows('A loop stands up from the row', 'a-loop-that-stands-up'),
  'warp-shows': rows('The warp shows between the rows', 'warp-shows-through'),
  'loose-tail': rows('A tail comes out at the front', 'a-tail-at-the-front'),
  'knot-in-weft': rows('There is a knot in the weft', 'a-knot-in-the-yarn'),
  'rya-knot-out': rows('A rya knot has come out', 'a-rya-knot-has-come-out'),
  'ridge-gapes': rows('A ridge of soumak gapes', 'a-ridge-gapes'),
  'drawn-in': shape('The cloth has narrowed', 'the-cloth-has-narrowed'),
  'loops-at-edge': shape('Loops stand out at the edge', 'loops-at-the-edge'),
  'uneven-fell': shape('The fell is not level', 'the-fell-is-not-level'),
  'toothed-slope': shape('A slope has teeth', 'a-slope-has-teeth'),
  'gaping-slit': shape('A slit gapes', 'a-slit-gapes'),
  flare: shape('The foot flares or waves', 'the-foot-flares'),
  'curled-edge': shape('The edges curl', 'the-edges-curl'),
  askew: shape('It hangs askew', 'it-hangs-askew'),
} as const satisfies Record<string, CommonFault>;

export type CommonFaultName = keyof typeof COMMON_FAULTS;

export function isCommonFault(name: string): name is CommonFaultName {
  return Object.hasOwn(COMMON_FAULTS, name);
}

/** The address of a page, or of a heading on it. */
export function handbookAddress({ page, heading }: HandbookPart): string {
  return `/handbook/${page}${heading === undefined ? '' : `#${heading}`}`;
}

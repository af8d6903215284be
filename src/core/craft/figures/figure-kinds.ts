/** The technique figures a lesson can ask for by name. */

export const FIGURE_KINDS = [
  'warping',
  'doubled-ends',
  'spacer-card',
  'tabby',
  'selvedge',
  'hem-stitch',
  'rya-knot',
  'wedge',
  'slit',
  'soumak',
  'roving',
  'shed-stick',
  'butterfly',
  'cutting-off',
  'overhand-knot',
  'hanging',
  'weave-in',
  'measure-wraps',
  'card-width',
  'basket',
  'doubled-weft',
  'loop-pile',
  'twining',
  'dovetail',
  'interlock',
  'fringe-knot',
  'twisted-fringe',
] as const;

export type FigureKind = (typeof FIGURE_KINDS)[number];

export function isFigureKind(name: string): name is FigureKind {
  return FIGURE_KINDS.some((kind) => kind === name);
}

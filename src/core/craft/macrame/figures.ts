/** The figures of knotting by name; a further one is a further line here. */
import { DOUBLE_HALF_HITCH, HALF_HITCH } from '#core/craft/macrame/figures/half-hitch.ts';
import { GATHERING_KNOT } from '#core/craft/macrame/figures/gathering-knot.ts';
import { LARKS_HEAD } from '#core/craft/macrame/figures/larks-head.ts';
import { SQUARE_KNOT } from '#core/craft/macrame/figures/square-knot.ts';

export const FIGURES = {
  'larks-head': LARKS_HEAD,
  'square-knot': SQUARE_KNOT,
  'half-hitch': HALF_HITCH,
  'double-half-hitch': DOUBLE_HALF_HITCH,
  'gathering-knot': GATHERING_KNOT,
} as const;

/**
 * Techniques as the shop speaks of them. Teachers name them in their own words; what this house has drawn and written of
 * some is found by the same words.
 */
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';

/** `Square knots` and `square-knot` are one technique: small letters, hyphens, one of it. Empty where no letter is left. */
export function techniqueKey(name: string): string {
  const plain = name.normalize('NFD').replace(/\p{M}|['’]/gu, '').toLowerCase();
  const key = plain.replace(/[^\p{L}\p{N}]+/gu, '-').replace(/^-+|-+$/g, '');
  return ONE_OF[key] ?? key;
}

export interface TechniqueGuide {
  readonly title: string;
  /** Page of the handbook. */
  readonly page: string;
  readonly figure: FigureKind;
  /** What the figure shows. */
  readonly caption: string;
}

/** Other words for the same. */
const ONE_OF: Readonly<Record<string, string>> = {
  'plain-weave': 'tabby', 'rya-knot': 'rya', 'rya-knots': 'rya', wedge: 'wedges', slope: 'slopes', curves: 'slopes', slit: 'slits', hemstitch: 'hem-stitch', 'hem-stitching': 'hem-stitch', loops: 'loop-pile',
  'basket-weave': 'basket', fringe: 'fringes', 'square-knots': 'square-knot', 'half-hitches': 'half-hitch', 'double-half-hitches': 'double-half-hitch', 'larks-heads': 'larks-head', 'larks-head-knot': 'larks-head', 'gathering-knots': 'gathering-knot',
};

const GUIDE: Readonly<Record<string, TechniqueGuide>> = {
  tabby: { title: 'Tabby', page: 'tabby', figure: 'tabby', caption: 'Over one end, under the next; the row after it the other way round.' },
  soumak: { title: 'Soumak', page: 'soumak', figure: 'soumak', caption: 'Over four, back two. Each stitch gains two ends.' },
  rya: { title: 'Rya', page: 'rya', figure: 'rya-knot', caption: 'Each strand goes round two ends and comes out between them.' },
  roving: { title: 'Roving', page: 'weaving-with-roving', figure: 'roving', caption: 'Unspun wool laid in, held by plain rows.' },
  'loop-pile': { title: 'Loop pile', page: 'loop-pile', figure: 'loop-pile', caption: 'The weft is drawn up between the ends and stands as loops.' },
  twining: { title: 'Twining', page: 'twining', figure: 'twining', caption: 'Two wefts turn about each other between the ends.' },
  'hem-stitch': { title: 'Hem-stitch', page: 'hem-stitch-and-finishing-off', figure: 'hem-stitch', caption: 'The needle takes a bundle of ends and goes into the cloth beside it.' },
  wedges: { title: 'Wedges', page: 'wedges-slits-and-joins', figure: 'wedge', caption: 'Rows that turn earlier and earlier make a slope.' },
  slopes: { title: 'Slopes and curves', page: 'slopes-and-curves', figure: 'wedge', caption: 'How many ends each row turns earlier decides how steep it is.' },
  slits: { title: 'Slits', page: 'slits-and-sewing-them', figure: 'slit', caption: 'Two wefts turn at neighbouring ends, and the cloth stays open between them.' },
  dovetail: { title: 'Dovetail', page: 'dovetail-and-interlock', figure: 'dovetail', caption: 'Two wefts turn round the same end, one after the other.' },
  interlock: { title: 'Interlock', page: 'dovetail-and-interlock', figure: 'interlock', caption: 'Two wefts link with each other between two ends.' },
  basket: { title: 'Basket weave', page: 'twill-and-basket', figure: 'basket', caption: 'Over two, under two, and the same again.' },
  warping: { title: 'Warping', page: 'winding-a-warp', figure: 'warping', caption: 'Up and down, from nail to nail, always with the same pull.' },
  fringes: { title: 'Fringes', page: 'fringes', figure: 'twisted-fringe', caption: 'Two strands twisted one way lie together the other way.' },
  'square-knot': { title: 'Square knot', page: 'basic-knots', figure: 'square-knot', caption: 'Left over right, then right over left, round the cords in the middle.' },
  'half-hitch': { title: 'Half hitch', page: 'basic-knots', figure: 'half-hitch', caption: 'One turn round the cord, and through.' },
  'double-half-hitch': { title: 'Double half hitch', page: 'basic-knots', figure: 'double-half-hitch', caption: 'Two turns round the leading cord make a ridge.' },
  'larks-head': { title: 'Lark’s head', page: 'basic-knots', figure: 'larks-head', caption: 'How a cord is hung on the rod.' },
  'gathering-knot': { title: 'Gathering knot', page: 'basic-knots', figure: 'gathering-knot', caption: 'A cord wound round a bundle, its end drawn in under the turns.' },
};

/** Null where this house has written nothing of it. */
export function techniqueGuide(key: string): TechniqueGuide | null {
  return Object.hasOwn(GUIDE, key) ? (GUIDE[key] ?? null) : null;
}

export const GUIDED_TECHNIQUES: readonly string[] = Object.keys(GUIDE);

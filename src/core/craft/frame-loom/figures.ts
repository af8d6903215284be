/** The figures of weaving on a frame by name; a further one is a further line here. */
import { BRAIDED_FRINGE } from '#core/craft/figures/kinds/braided-fringe.ts';
import { BUTTERFLY } from '#core/craft/figures/kinds/butterfly.ts';
import { CARD_WIDTH } from '#core/craft/figures/kinds/card-width.ts';
import { COLUMNS } from '#core/craft/figures/kinds/columns.ts';
import { CUTTING_OFF } from '#core/craft/figures/kinds/cutting-off.ts';
import { DOUBLED_ENDS } from '#core/craft/figures/kinds/doubled-ends.ts';
import { DOVETAIL } from '#core/craft/figures/kinds/dovetail.ts';
import { FRINGE_KNOT } from '#core/craft/figures/kinds/fringe-knot.ts';
import { HANGING } from '#core/craft/figures/kinds/hanging.ts';
import { HEM_STITCH } from '#core/craft/figures/kinds/hem-stitch.ts';
import { INTERLOCK } from '#core/craft/figures/kinds/interlock.ts';
import { JOIN_IN_ROW } from '#core/craft/figures/kinds/join-in-row.ts';
import { LOOP_PILE } from '#core/craft/figures/kinds/loop-pile.ts';
import { MEASURE_WRAPS } from '#core/craft/figures/kinds/measure-wraps.ts';
import { OVERHAND_KNOT } from '#core/craft/figures/kinds/overhand-knot.ts';
import { BASKET, DOUBLED_WEFT } from '#core/craft/figures/kinds/pairs.ts';
import { ROVING } from '#core/craft/figures/kinds/roving.ts';
import { RYA_KNOT } from '#core/craft/figures/kinds/rya-knot.ts';
import { SELVEDGE } from '#core/craft/figures/kinds/selvedge.ts';
import { SEWN_SLIT } from '#core/craft/figures/kinds/sewn-slit.ts';
import { SHED_STICK } from '#core/craft/figures/kinds/shed-stick.ts';
import { SLIT } from '#core/craft/figures/kinds/slit.ts';
import { SOUMAK } from '#core/craft/figures/kinds/soumak.ts';
import { SPACER_CARD } from '#core/craft/figures/kinds/spacer-card.ts';
import { TABBY } from '#core/craft/figures/kinds/tabby.ts';
import { TWILL } from '#core/craft/figures/kinds/twill.ts';
import { TWINING } from '#core/craft/figures/kinds/twining.ts';
import { TWISTED_FRINGE } from '#core/craft/figures/kinds/twisted-fringe.ts';
import { WARPING } from '#core/craft/figures/kinds/warping.ts';
import { WEAVE_IN } from '#core/craft/figures/kinds/weave-in.ts';
import { WEDGE } from '#core/craft/figures/kinds/wedge.ts';

export const FIGURES = {
  warping: WARPING,
  'doubled-ends': DOUBLED_ENDS,
  'spacer-card': SPACER_CARD,
  tabby: TABBY,
  selvedge: SELVEDGE,
  'hem-stitch': HEM_STITCH,
  'rya-knot': RYA_KNOT,
  wedge: WEDGE,
  slit: SLIT,
  'sewn-slit': SEWN_SLIT,
  columns: COLUMNS,
  soumak: SOUMAK,
  roving: ROVING,
  'shed-stick': SHED_STICK,
  butterfly: BUTTERFLY,
  'cutting-off': CUTTING_OFF,
  'overhand-knot': OVERHAND_KNOT,
  hanging: HANGING,
  'weave-in': WEAVE_IN,
  'measure-wraps': MEASURE_WRAPS,
  'card-width': CARD_WIDTH,
  'join-in-row': JOIN_IN_ROW,
  basket: BASKET,
  twill: TWILL,
  'doubled-weft': DOUBLED_WEFT,
  'loop-pile': LOOP_PILE,
  twining: TWINING,
  dovetail: DOVETAIL,
  interlock: INTERLOCK,
  'fringe-knot': FRINGE_KNOT,
  'twisted-fringe': TWISTED_FRINGE,
  'braided-fringe': BRAIDED_FRINGE,
} as const;

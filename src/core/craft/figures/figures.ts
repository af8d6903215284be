/** All figures by name; a further one is a further line here. */
import type { Figure } from './figure.ts';
import type { FigureKind } from './figure-kinds.ts';
import { BUTTERFLY } from './kinds/butterfly.ts';
import { CARD_WIDTH } from './kinds/card-width.ts';
import { CUTTING_OFF } from './kinds/cutting-off.ts';
import { DOUBLED_ENDS } from './kinds/doubled-ends.ts';
import { HANGING } from './kinds/hanging.ts';
import { HEM_STITCH } from './kinds/hem-stitch.ts';
import { MEASURE_WRAPS } from './kinds/measure-wraps.ts';
import { OVERHAND_KNOT } from './kinds/overhand-knot.ts';
import { ROVING } from './kinds/roving.ts';
import { RYA_KNOT } from './kinds/rya-knot.ts';
import { SELVEDGE } from './kinds/selvedge.ts';
import { SHED_STICK } from './kinds/shed-stick.ts';
import { SLIT } from './kinds/slit.ts';
import { SOUMAK } from './kinds/soumak.ts';
import { SPACER_CARD } from './kinds/spacer-card.ts';
import { TABBY } from './kinds/tabby.ts';
import { WARPING } from './kinds/warping.ts';
import { WEAVE_IN } from './kinds/weave-in.ts';
import { WEDGE } from './kinds/wedge.ts';

export const FIGURES: Readonly<Record<FigureKind, Figure>> = {
  warping: WARPING,
  'doubled-ends': DOUBLED_ENDS,
  'spacer-card': SPACER_CARD,
  tabby: TABBY,
  selvedge: SELVEDGE,
  'hem-stitch': HEM_STITCH,
  'rya-knot': RYA_KNOT,
  wedge: WEDGE,
  slit: SLIT,
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
};

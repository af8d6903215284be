/** What goes with everything woven on a heddle. General information. */
import type { Caution } from '#core/craft/craft.ts';

export const HEDDLE_CAUTIONS: readonly Caution[] = [{
  title: 'Hands, back, and long ends',
  says: 'Warp with somebody beside you or in short stretches, sit so that the fell is at the height of your elbows, rest every half hour, and stop when something hurts or tingles. Long ends and loops stay out of reach of small children. This is general information: follow your local rules and the loom maker’s word, and ask a qualified person where you are not sure.',
}];

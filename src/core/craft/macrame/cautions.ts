/** What goes with every knotted piece. General information; the sources differ by country and change. */
import type { Caution } from '#core/craft/craft.ts';

export const CORD_CAUTIONS: readonly Caution[] = [
  {
    title: 'Cords and small children',
    says: 'A cord, a loop or a loose fringe can strangle a small child, silently and in under a minute. Knot, hang and store cords out of reach of cots and small children, trim what is left over, and keep rings and beads from children under three. This is general information: follow your local rules and the maker’s label, and ask a qualified person where you are not sure.',
  },
  {
    title: 'Hands, shoulders, and what it hangs from',
    says: 'Rest for a few minutes every half hour, keep the knot at the height of your elbows, and stop when something hurts or tingles. What you knot on must bear a steady pull, and its fixing in the wall at least four times what hangs from it. This is general information: follow your local rules and the maker’s word for hook and fixing, and ask a qualified person about your wall.',
  },
];

/** What goes with every dyeing. General information; limits and rules differ by country and change. */
import type { Caution } from '#core/craft/craft.ts';

const RULES = 'This is general information: follow your local rules, the maker’s label and safety data sheet, and a qualified person’s advice.';

export const DYE_CAUTIONS: readonly Caution[] = [
  {
    title: 'Mordants are chemicals',
    says: `Wear gloves, let no powder rise, put powder into water and not water onto powder. Keep pots, spoons and scales that never touch food again; cook with the lid on and the window open. Iron sulphate harms when swallowed and irritates skin and eyes; lock it away, above all from toddlers. We give alum, aluminium acetate, tannin and weak iron only, never copper, chrome or tin. ${RULES}`,
  },
  {
    title: 'Grown-ups prepare the baths',
    says: `Children of twelve and younger do not mordant, and powders are mixed while they are elsewhere. Hot baths stand where nobody knocks them over. ${RULES}`,
  },
];

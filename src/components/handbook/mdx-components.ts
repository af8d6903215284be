/** What the handbook's pages may use besides plain Markdown. */
import Converter from '#components/handbook/Converter.astro';
import Figure from '#components/handbook/Figure.astro';
import InLowTide from '#components/handbook/InLowTide.astro';
import ProseTable from '#components/handbook/ProseTable.astro';
import Reckoned from '#components/handbook/Reckoned.astro';
import Caution from '#components/ui/Caution.astro';
import Tip from '#components/ui/Tip.astro';

export const handbookComponents = { Caution, Converter, Figure, InLowTide, Reckoned, Tip, table: ProseTable } as const;

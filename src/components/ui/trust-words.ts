import type { Trust } from '#core/craft/trust.ts';

/** How sure an amount is, by the least certain thing it was made of. */
export const trustWords: Readonly<Record<Trust, string>> = {
  counted: 'Exact: counted, or given as it is.',
  measured: 'As good as the measuring behind it.',
  label: 'As good as the label it was read from.',
  formula: 'Reckoned; the cloth may differ by a few per cent.',
  class: 'From a table of common yarns. Take it as a guide, and measure when you can.',
  practice: 'Rests on what is commonly done. Take it as a guide, and measure or count your own when you can.',
};

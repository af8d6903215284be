import type { Trust } from '#core/craft/amounts.ts';

/** How sure an amount is, by the least certain thing it was made of. */
export const trustWords: Readonly<Record<Trust, string>> = {
  measured: 'From what you measured.',
  label: 'From the label of the yarn.',
  formula: 'Reckoned from your loom and yarn.',
  class: 'From a table of usual yarns, so about a fifth more or less.',
};

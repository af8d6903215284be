export interface ComboOption {
  readonly value: string;
  readonly label: string;
}

const plain = (text: string): string => text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();

/** Options that hold what was typed, those that begin with it first; accents and capitals do not matter. */
export function comboMatches(options: readonly ComboOption[], typed: string): readonly ComboOption[] {
  const sought = plain(typed.trim());
  if (sought === '') return options;
  const found = options.map((option) => ({ option, place: plain(option.label).indexOf(sought) })).filter(({ place }) => place >= 0);
  return [...found.filter(({ place }) => place === 0), ...found.filter(({ place }) => place > 0)].map(({ option }) => option);
}

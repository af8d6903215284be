/**
 * Words by which people ask for what the handbook calls otherwise: other spellings, other trades' words, everyday words.
 * Each row is one thing; the handbook's own word stands first.
 */
const ALIKE: readonly (readonly string[])[] = [
  ['tabby', 'plain'],
  ['weft', 'woof', 'filling'],
  ['row', 'pick'],
  ['spacing', 'sett', 'epi', 'pitch', 'density'],
  ['rya', 'ghiordes', 'shag', 'tassel'],
  ['fringe', 'tassel'],
  ['loop', 'boucle'],
  ['roving', 'fleece', 'unspun'],
  ['rod', 'dowel', 'branch', 'pole'],
  ['hanging', 'mounting', 'display'],
  ['mend', 'repair', 'fix', 'rescue'],
  ['fault', 'mistake', 'error', 'problem', 'wrong'],
  ['broken', 'snapped', 'torn'],
  ['narrow', 'waist', 'shrunk'],
  ['wash', 'launder', 'laundry', 'clean'],
  ['blocking', 'stretching', 'wet'],
  ['child', 'children', 'kid', 'baby', 'toddler'],
  ['posture', 'ergonomic', 'sitting'],
  ['hurt', 'pain', 'ache', 'injury', 'sore'],
  ['colour', 'color', 'hue', 'shade'],
  ['fibre', 'fiber', 'material'],
  ['grey', 'gray'],
  ['linen', 'flax'],
  ['moth', 'grub', 'insect', 'pest'],
  ['knot', 'macrame', 'knotting'],
  ['cord', 'rope', 'string'],
  ['join', 'splice', 'attach', 'connect'],
  ['count', 'grist'],
  ['wraps', 'wpi'],
  ['hour', 'time', 'duration'],
  ['measure', 'unit', 'conversion', 'inch', 'centimetre', 'centimeter'],
  ['slope', 'diagonal', 'wedge', 'triangle'],
  ['curve', 'circle', 'round'],
  ['safety', 'danger', 'hazard'],
  ['dye', 'dyeing', 'mordant', 'alum'],
  ['photo', 'photograph', 'picture', 'camera'],
  ['label', 'symbol'],
  ['word', 'glossary', 'term', 'vocabulary'],
  ['drawing', 'cartoon', 'chart', 'pattern'],
  ['needle', 'tool', 'bodkin'],
  ['beat', 'press', 'fork'],
  ['hill', 'bubble'],
  ['selvedge', 'selvage', 'edge'],
  ['heddle', 'reed'],
];

/** What a stem may lack of its word, and a word may have beyond it. */
const LONGEST_ENDING = 3;

export const isFormOf = (word: string, stem: string): boolean => word.startsWith(stem) && word.length - stem.length <= LONGEST_ENDING;

/** Other words for the one that begins so; without itself. */
export function wordsAlike(stem: string): string[] {
  return [...new Set(ALIKE.filter((row) => row.some((word) => isFormOf(word, stem))).flat())].filter((word) => !word.startsWith(stem));
}

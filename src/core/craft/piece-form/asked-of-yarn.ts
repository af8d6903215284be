/** What is asked of a yarn. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import type { CountSystem } from '#core/craft/piece.ts';
import { classOf } from '#core/craft/yarn/classes.ts';
import { option, type Asked } from './asked.ts';

export const ROLE: Asked = { key: 'role', kind: 'text', label: 'Role', called: 'The role', maxLength: 40, needed: true };

export const LABEL: Asked = { key: 'label', kind: 'text', label: 'Name on the label', maxLength: 120 };
export const COLOUR: Asked = { key: 'colour', kind: 'text', label: 'Colour', maxLength: 7, otherwise: 'undyed' };

/** Ways of saying how thick a yarn is that are no count. `wraps` is the way out when there is no label: tex is reckoned from them. */
export type GristWay = 'tex' | 'metresPer100g' | 'wraps' | 'class' | CountSystem;

export const BY: Asked = {
  key: 'by', kind: 'choice', label: 'How thick, by', needed: true,
  options: [
    option('metresPer100g', 'Metres in 100 g'),
    option('tex', 'Tex'),
    option('nm', 'Nm, as 2/16'),
    option('ne-cotton', 'Cotton count, as 8/2'),
    option('spun-silk', 'Spun silk, as 40/2'),
    option('ne-worsted', 'Worsted count'),
    option('lea', 'Linen lea'),
    option('run', 'Woollen run'),
    option('yorkshire', 'Yorkshire skein'),
    option('denier', 'Denier'),
    option('dtex', 'Decitex'),
    option('jute', 'Jute count'),
    option('grain', 'American grain'),
    option('wraps', 'Measured wraps alone'),
    option('class', 'Weight class alone'),
  ],
};

const GRIST_LABELS: Readonly<Record<string, string>> = { metresPer100g: 'Metres in 100 g', tex: 'Tex' };

const CLASS: Asked = {
  key: 'grist', kind: 'number', label: 'Class, 0 to 7', called: 'The class', needed: true,
  hint: `As shops print it, from ${classOf(0).name} to ${classOf(7).name}. A rough guess: a label or wraps tell more.`,
};

/** The field beside the way; a count is text, since it may be written `8/2`. */
export function gristAsked(by: string): Asked {
  if (by === 'class') return CLASS;
  const label = GRIST_LABELS[by] ?? 'Count';
  return label === 'Count'
    ? { key: 'grist', kind: 'text', label, called: 'The count', maxLength: 20, needed: true }
    : { key: 'grist', kind: 'number', label, ...(by === 'tex' ? { unit: 'tex' } : { unit: 'm' }), needed: true };
}

export const WRAPS: Asked = {
  key: 'wrapsPerInch', kind: 'number', label: 'Wraps in an inch', hint: 'Wound snugly round a ruler, without pulling, and counted.', otherwise: 'reckoned',
};
export const FREE_DIAMETER: Asked = {
  key: 'freeDiameterMm', kind: 'fine', label: 'Or lies', called: 'Thickness, lying free', hint: 'Measured with a ruler, for roving that cannot be wrapped.', otherwise: 'reckoned',
};
export const STRANDS: Asked = { key: 'strands', kind: 'number', label: 'Strands as one', called: 'Strands together', otherwise: 'one' };
export const BALL: readonly Asked[] = [
  { key: 'ball.metres', kind: 'number', label: 'In a ball', called: 'Metres in a ball', unit: 'm', otherwise: 'balls are not counted' },
  { key: 'ball.grams', kind: 'number', label: 'It weighs', called: 'Grams of a ball', unit: 'g' },
];
export const FIBRE: Asked = { key: 'fibre', kind: 'text', label: 'Fibre', maxLength: 60 };
export const ASHENHURST: Asked = { key: 'ashenhurstK', kind: 'number', label: 'Ashenhurst’s K' };
/** The same with what is usual for warp or weft. */
export const ashenhurstOf = (use: keyof typeof ASHENHURST_K): Asked => ({ ...ASHENHURST, standard: () => ASHENHURST_K[use] });

/** What is written into the piece as it stands; role and grist have rules of their own. */
export const YARN_TRAITS: readonly Asked[] = [LABEL, COLOUR, STRANDS, ASHENHURST, WRAPS, FREE_DIAMETER, ...BALL, FIBRE];
/** Keys of all texts of a yarn. */
export const YARN_KEYS: readonly string[] = ['role', 'by', 'grist', ...YARN_TRAITS.map(({ key }) => key)];

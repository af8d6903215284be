/** What is asked of a band: its technique, and what that technique wants to know. */
import type { TechniqueName } from '#core/craft/piece.ts';
import { TECHNIQUE_NAMES } from '#core/craft/techniques/registry.ts';
import { TECHNIQUE_WORDS } from '#core/craft/techniques/technique-words.ts';
import { option, type Asked, type Option } from './asked.ts';

const [firstName, ...otherNames] = TECHNIQUE_NAMES;
const techniqueOption = (name: TechniqueName): Option => option(name, TECHNIQUE_WORDS[name].label);
export const TECHNIQUE: Asked = {
  key: 'technique', kind: 'choice', label: 'Technique', needed: true,
  options: [techniqueOption(firstName), ...otherNames.map(techniqueOption)],
};

export const BAND_NAME: Asked = { key: 'name', kind: 'text', label: 'Name in texts', maxLength: 40, hint: 'As lessons ask for its amounts: dunes, sky-2.', otherwise: 'no amounts of its own' };

/** Ticked: the band takes what the others leave of the height. */
export const FILL_KEY = 'fill';

const yarn: Asked = { key: 'yarn', kind: 'role', label: 'Yarn', needed: true };
const rows = (starter: number): Asked => ({ key: 'rows', kind: 'number', label: 'Rows', needed: true, starter });
const height = (starter?: number): Asked => ({ key: 'heightMm', kind: 'length', label: 'Height', needed: true, ...(starter === undefined ? {} : { starter }) });
const over = (): Asked => ({ key: 'over', kind: 'number', label: 'Over', called: 'Ends passed over', unit: 'ends', needed: true, starter: 4 });

export const BAND_FIELDS: Readonly<Record<TechniqueName, readonly Asked[]>> = {
  tabby: [
    yarn,
    height(),
    { key: 'strands', kind: 'number', label: 'Strands in a row', otherwise: 'as the yarn is taken' },
    { key: 'basket', kind: 'choice', label: 'Weave', options: [{ text: '', value: false, label: 'Plain' }, { text: 'yes', value: true, label: 'Basket, two ends as one' }] },
  ],
  soumak: [
    yarn,
    over(),
    { key: 'back', kind: 'number', label: 'Back under', called: 'Ends gone back under', unit: 'ends', needed: true, starter: 2 },
    rows(4),
    { key: 'tabbyBetween', kind: 'number', label: 'Tabby between', called: 'Picks of tabby between rows', unit: 'rows', needed: true, starter: 2 },
    { key: 'tabbyYarn', kind: 'role', label: 'Yarn of that tabby', called: 'Yarn of the tabby', needed: true },
  ],
  rya: [
    yarn,
    { key: 'strands', kind: 'number', label: 'Strands in a knot', needed: true, starter: 3 },
    { key: 'legEnds', kind: 'number', label: 'Ends in a leg', called: 'Ends in each leg', unit: 'ends', needed: true, starter: 1 },
    { key: 'edgeEnds', kind: 'number', label: 'Plain at each edge', called: 'Plain ends at each selvedge', unit: 'ends', otherwise: 'none' },
    { key: 'pileMm', kind: 'length', label: 'Pile', called: 'Length of the pile', needed: true, starter: 100 },
    { key: 'trimMm', kind: 'fine', label: 'To trim away', called: 'Length to trim away', needed: true, starter: 10 },
    rows(1),
    height(6),
  ],
  roving: [
    yarn,
    over(),
    { key: 'bulgeMm', kind: 'fine', label: 'Bulge', needed: true, starter: 12 },
    height(40),
    { key: 'passes', kind: 'number', label: 'Passes', otherwise: 'one' },
  ],
  'hem-stitch': [
    yarn,
    { key: 'bundleEnds', kind: 'number', label: 'Ends in a bundle', unit: 'ends', needed: true, starter: 2 },
    { key: 'reachPicks', kind: 'number', label: 'Reaches up', called: 'Rows the stitch reaches up', unit: 'rows', needed: true, starter: 2 },
  ],
  'loop-pile': [
    yarn,
    { key: 'rodMm', kind: 'fine', label: 'Rod', called: 'Thickness of the rod', starter: 10, otherwise: 'drawn by hand' },
    { key: 'loopMm', kind: 'fine', label: 'Or loops of', called: 'Height of a loop', otherwise: 'over the rod' },
    rows(4),
    height(20),
  ],
  twining: [yarn, rows(2), { key: 'endsPerTwist', kind: 'number', label: 'Crossed every', called: 'Ends between two crossings', unit: 'ends', otherwise: 'end' }],
};

export const isTechnique = (text: string): text is TechniqueName => Object.hasOwn(BAND_FIELDS, text);
export const bandFields = (technique: string): readonly Asked[] => (isTechnique(technique) ? BAND_FIELDS[technique] : []);

/** Keys of all texts of a band, whatever its technique. */
export const BAND_KEYS: readonly string[] = [
  ...new Set(['technique', 'name', FILL_KEY, ...TECHNIQUE_NAMES.flatMap((name) => BAND_FIELDS[name].map(({ key }) => key))]),
];

export const SHAPE: Asked = {
  key: 'shape', kind: 'choice', label: 'Shape', needed: true,
  options: [option('triangle', 'Triangle'), option('rectangle', 'Rectangle'), option('circle', 'Circle'), option('points', 'Drawn by points')],
};
export const JOIN: Asked = {
  key: 'join', kind: 'choice', label: 'Colours meet',
  options: [option('slit', 'With a slit'), option('dovetail', 'Dovetailed'), option('interlock', 'Interlocked')],
};
/** Without a choice, steps are alike unless the shape leans; so an untouched field must not send one. */
export const SYMMETRIC: Asked = {
  key: 'symmetric', kind: 'choice', label: 'Both sides alike',
  options: [{ text: '', value: '', label: 'Unless it leans' }, { text: 'yes', value: true, label: 'Yes' }, { text: 'no', value: false, label: 'No' }],
};

const PLACING: readonly Asked[] = [
  { key: 'centreMm', kind: 'length', label: 'Middle at', called: 'Middle of the shape', otherwise: 'middle' },
  { key: 'bottomMm', kind: 'length', label: 'Foot at', called: 'Foot of the shape', otherwise: '0' },
];
const LEAN: Asked = { key: 'leanMm', kind: 'lean', label: 'Lean', otherwise: '0' };
const UPRIGHT: readonly Asked[] = [
  { key: 'baseMm', kind: 'length', label: 'Base', called: 'Base of the shape', needed: true },
  { key: 'heightMm', kind: 'length', label: 'Height', called: 'Height of the shape', needed: true },
];
const ROUND: readonly Asked[] = [{ key: 'radiusMm', kind: 'length', label: 'Radius', called: 'Radius of the circle', needed: true }];

const CORNERS: readonly Asked[] = [
  {
    key: 'points', kind: 'points', label: 'Points', called: 'Points of the shape', needed: true,
    hint: 'Corner after corner, how far across and how far up: 0 : 0; 12 : 0; 6 : 9.',
  },
];

export const SHAPE_HINT = 'Its middle counts from the left selvedge, its foot from the band’s first row. A lean of 2 puts the top to the right, of −2 to the left.';

/** Measures and place of a shape of this kind. */
export const shapeFields = (kind: string): readonly Asked[] =>
  kind === 'points' ? [yarn, ...CORNERS, ...PLACING, LEAN, JOIN] : [yarn, ...(kind === 'circle' ? ROUND : UPRIGHT), ...PLACING, LEAN, SYMMETRIC, JOIN];

export const SHAPE_KEYS: readonly string[] = [...new Set(['shape', ...['triangle', 'circle', 'points'].flatMap((kind) => shapeFields(kind).map(({ key }) => key))])];

/** What is asked once for the whole piece, group by group as the form shows it. */
import { DEFAULT_ALLOWANCES, FRINGE_BUNDLE_ENDS, NAIL_DIAMETER_MM, TAKE_UP_UNKNOWN, TIE_MM } from '#core/craft/defaults.ts';
import { LOOM_WORDS } from '#core/craft/looms/loom-words.ts';
import { LOOM_KIND_NAMES, LOOM_KINDS } from '#core/craft/looms/looms.ts';
import type { LoomKindName } from '#core/craft/piece.ts';
import { option, type Asked, type Option } from './asked.ts';
import { textOf, type Texts } from './typed-piece.ts';

export const SIZE: readonly Asked[] = [
  { key: 'size.widthMm', kind: 'length', label: 'Width', needed: true },
  { key: 'size.heightMm', kind: 'length', label: 'Height', needed: true },
];

export const LOOM: readonly Asked[] = [
  { key: 'loom.insideWidthMm', kind: 'length', label: 'Inside width', otherwise: 'not checked' },
  { key: 'loom.insideHeightMm', kind: 'length', label: 'Nail to nail, upright', needed: true },
  { key: 'loom.nailPitchMm', kind: 'fine', label: 'Nail to nail, along', called: 'From nail to nail', needed: true },
  { key: 'loom.everyNthNail', kind: 'number', label: 'Use every … nail', otherwise: 'every one' },
  { key: 'loom.nailDiameterMm', kind: 'fine', label: 'Nails', called: 'Thickness of a nail', standard: () => NAIL_DIAMETER_MM },
];

const [firstKind, ...otherKinds] = LOOM_KIND_NAMES;
const kindOption = (name: LoomKindName): Option => option(name, LOOM_WORDS[name].label);
export const LOOM_KIND: Asked = { key: 'loom.kind', kind: 'choice', label: 'The loom has', options: [kindOption(firstKind), ...otherKinds.map(kindOption)] };

export const NAIL_ROWS: Asked = {
  key: 'loom.nailRows', kind: 'choice', label: 'The warp goes round',
  options: [option('both', 'Inner and outer nails by turns'), option('inner', 'The inner nails only')],
};

/** Whether the loom of this form has rows of nails to choose from. */
export const hasTwoRows = (texts: Texts): boolean => LOOM_KIND_NAMES.some((name) => name === textOf(texts, LOOM_KIND.key) && LOOM_KINDS[name].rows === 2);

export const WARPING: Asked = {
  key: 'loom.warping', kind: 'choice', label: 'Warping', needed: true,
  options: [option('zigzag', 'Zigzag: two ends from each nail'), option('two-nail', 'Along two nails: one end from each')],
};

export const ENDS_TOGETHER: Asked = {
  key: 'warp.endsTogether', kind: 'choice', label: 'Ends worked as one',
  options: [{ text: '1', value: 1, label: 'Single' }, { text: '2', value: 2, label: 'In pairs' }],
};

export const PARITY: Asked = {
  key: 'warp.parity', kind: 'choice', label: 'Working ends',
  options: [option('any', 'Any number'), option('even', 'Even'), option('odd', 'Odd')],
};

export const WARP: readonly Asked[] = [
  { key: 'warp.endCount', kind: 'number', label: 'Ends, pinned', unit: 'ends', otherwise: 'as the width asks' },
  { key: 'warp.tieMm', kind: 'length', label: 'For a tie', called: 'Yarn for a tie', standard: () => TIE_MM },
];

/** How firmly rows are beaten, by a word for the hand or by a count. The numbers are picks in one thickness of the weft. */
export const FIRMNESS = { comb: 0.7, firm: 1.1, rug: 1.45 } as const;

export const BEAT_BY: Asked = {
  key: 'beat.by', kind: 'choice', label: 'How closely the rows lie', needed: true,
  options: [
    option('comb', 'Packed with a comb'),
    option('firm', 'Beaten firmly'),
    option('rug', 'Beaten like a rug'),
    option('own', 'By a number of my own'),
    option('swatch', 'As counted on a swatch'),
    option('ends', 'As close as the ends, in balanced cloth'),
  ],
};
export const OWN_BEAT: Asked = {
  key: 'beat.picksPerWeftDiameter', kind: 'number', label: 'Picks in one weft thickness', needed: true,
  hint: 'A comb packs about 0.7, a rug beater 1.45.',
};
export const SWATCH_BEAT: Asked = {
  key: 'beat.picksPerCm', kind: 'number', label: 'Picks in a centimetre', unit: 'a cm', needed: true,
  hint: 'Count the rows over 5 cm of your swatch and divide by 5.',
};

export const MODE: Asked = {
  key: 'mode', kind: 'choice', label: 'The cloth is',
  options: [option('straight-warp', 'Weft-faced: the warp runs straight'), option('balanced', 'Balanced: both bend alike'), option('given', 'Bent as high as I say'), option('measured', 'As I measured its take-up')],
};
export const WAVE: readonly Asked[] = [
  { key: 'weftWaveMm', kind: 'fine', label: 'Wave of the weft', called: 'Height of the weft’s wave', needed: true, hint: 'From its lowest place to its highest, in the middle of the yarn.' },
];
export const TAKE_UP: readonly Asked[] = [
  { key: 'takeUp', kind: 'share', label: 'Take-up of the weft', hint: 'What a pick drawn out straight is longer than the swatch is wide.', standard: () => TAKE_UP_UNKNOWN.likely },
  { key: 'warpTakeUp', kind: 'share', label: 'Take-up of the warp', hint: 'The same of an end.', otherwise: 'none' },
];
/** Numbers of every mode that has some. */
export const OF_MODE: readonly Asked[] = [...WAVE, ...TAKE_UP];
/** What the chosen mode has of these. */
export function askedOfMode(texts: Texts): readonly Asked[] {
  const mode = textOf(texts, MODE.key);
  return mode === 'given' ? WAVE : mode === 'measured' ? TAKE_UP : [];
}

export const HANGING: readonly Asked[] = [
  { key: 'dowel.diameterMm', kind: 'fine', label: 'Dowel', called: 'Thickness of the dowel', otherwise: 'no dowel' },
  { key: 'dowel.lengthMm', kind: 'length', label: 'Its length', called: 'Length of the dowel', otherwise: 'reckoned from the width' },
];

export const FIXING: Asked = {
  key: 'dowel.fixing', kind: 'choice', label: 'Held to the dowel',
  options: [option('slipped', 'Warp loops slipped on'), option('tied', 'Warp loops tied to it'), option('lashed', 'Lashed on with yarn')],
};

/** What becomes of the lower warp ends; nothing chosen leaves it open. */
export const FINISH: Asked = {
  key: 'finish.bottom', kind: 'choice', label: 'Lower warp ends',
  options: [
    { text: '', value: '', label: 'Left open here' },
    option('knotted', 'Knotted in bundles'),
    option('twisted', 'Twisted into cords'),
    option('tucked', 'Tucked back into the cloth'),
    option('plain', 'Left as they are, or cut'),
  ],
};
export const FRINGE: readonly Asked[] = [
  { key: 'finish.fringeMm', kind: 'length', label: 'Fringe', called: 'Length of the fringe', otherwise: 'none' },
  { key: 'finish.bundleEnds', kind: 'number', label: 'Ends in a bundle', unit: 'ends', standard: () => FRINGE_BUNDLE_ENDS },
];
/** What the chosen finish has of these. */
export function fringeAsked(texts: Texts): readonly Asked[] {
  const bottom = textOf(texts, FINISH.key);
  if (bottom === '' || bottom === 'tucked') return [];
  return bottom === 'plain' ? FRINGE.slice(0, 1) : FRINGE;
}

export const HANGS: Asked = {
  key: 'hangs', kind: 'choice', label: 'It hangs',
  options: [option('as-woven', 'As it was woven'), option('turned', 'Turned, first rows at the top')],
};

export const SEED: Asked = { key: 'seed', kind: 'number', label: 'Chance of the drawing', hint: 'Another whole number lets the yarn fall another way.', otherwise: 'our own' };

const modeOf = (texts: Texts): 'balanced' | 'straight-warp' => (textOf(texts, 'mode') === 'balanced' ? 'balanced' : 'straight-warp');
const marginOf = (texts: Texts): number => DEFAULT_ALLOWANCES.marginWeft[textOf(texts, 'beat.by') === 'swatch' ? 'swatch' : 'unmeasured'];

export const ALLOWANCES: readonly Asked[] = [
  { key: 'allowances.drawIn', kind: 'share', label: 'Draw-in', hint: 'How much narrower the cloth is than the warp on the loom.', standard: (texts) => DEFAULT_ALLOWANCES.drawIn[modeOf(texts)] },
  { key: 'allowances.relaxation', kind: 'share', label: 'Relaxation', hint: 'How much shorter it gets when the warp is cut.', standard: () => DEFAULT_ALLOWANCES.relaxation },
  { key: 'allowances.wetShrinkage', kind: 'share', label: 'Wet shrinkage', hint: 'How much it shrinks in water, if it is washed.', standard: () => DEFAULT_ALLOWANCES.wetShrinkage },
  { key: 'allowances.topMm', kind: 'length', label: 'Bare warp above', hint: 'Where no needle passes any more, at least.', standard: () => DEFAULT_ALLOWANCES.topMm },
  { key: 'allowances.bottomMm', kind: 'length', label: 'Bare warp below', hint: 'Enough to knot or tuck the ends.', standard: () => DEFAULT_ALLOWANCES.bottomMm },
  { key: 'allowances.tailMm', kind: 'length', label: 'Tail', hint: 'Left hanging where a weft begins or ends.', standard: () => DEFAULT_ALLOWANCES.tailMm },
  { key: 'allowances.loadMm', kind: 'yarn', label: 'One load', hint: 'Yarn on a shuttle or butterfly.', standard: () => DEFAULT_ALLOWANCES.loadMm },
  { key: 'allowances.marginWeft', kind: 'share', label: 'Weft to spare', hint: 'Bought beyond what is reckoned. Less is enough after a swatch.', standard: marginOf },
  { key: 'allowances.marginWarp', kind: 'share', label: 'Warp to spare', hint: 'Bought beyond what is reckoned.', standard: () => DEFAULT_ALLOWANCES.marginWarp },
];

/** All of them but the beat, which is two values of which one is given. */
export const ASKED_ONCE: readonly Asked[] = [
  ...SIZE, LOOM_KIND, ...LOOM, NAIL_ROWS, WARPING, ENDS_TOGETHER, PARITY, ...WARP, MODE, ...OF_MODE, ...HANGING, FIXING, FINISH, ...FRINGE, HANGS, SEED, ...ALLOWANCES,
];
export const BEAT_FIELDS: readonly Asked[] = [BEAT_BY, OWN_BEAT, SWATCH_BEAT];

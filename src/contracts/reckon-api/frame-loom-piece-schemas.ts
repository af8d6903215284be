/** A piece woven on a frame as it is asked about: loom, warp, beat, yarns by role, and the bands in the order they are woven. */
import { byRole, choice, closed, exactlyOne, flag, lengthMm, list, LONGEST_MM, number, partName, ref, role, toldBy, whole, type Schema } from '#contracts/reckon-api/schema.ts';

const allowanceMm = (description: string): Schema => number(description, { min: 0, max: LONGEST_MM });
const rows = whole('Rows.', { min: 1, max: 10_000 });
const bandHeight = lengthMm('Height of the band in the finished piece, mm.');

/** A band of one technique; every band may have a name. */
function band(description: string, technique: string, properties: Readonly<Record<string, Schema>>, optional: readonly string[] = [], more: Schema = {}): Schema {
  const named = { technique: { const: technique }, name: partName('How lessons call the band; once in a piece.'), yarn: role('Yarn role.') };
  return closed(description, { ...named, ...properties }, ['name', ...optional], more);
}

export const MEASURES = {
  shape: choice('A triangle’s base is its first row.', 'triangle', 'rectangle', 'circle', 'points'),
  baseMm: lengthMm('Of a triangle or rectangle.'),
  heightMm: lengthMm('Of a triangle or rectangle.'),
  radiusMm: lengthMm('Of a circle.', LONGEST_MM / 2),
  points: list('Corners of a closed line, one after the other; what it goes round an even number of times lies outside. The box round them is placed.', ref('ShapePoint'), { minItems: 3, maxItems: 200 }),
} as const;

const across = { min: -LONGEST_MM, max: LONGEST_MM };
const ShapePoint = closed('A corner, counted from anywhere.', { xMm: number('To the right.', across), yMm: number('Upwards, as it is woven.', across) });

/** The measures a shape may be given by; each kind has its own. */
export const MEASURE_KEYS = ['baseMm', 'heightMm', 'radiusMm', 'points'] as const;

/** Which measures belong to which shape. Points say themselves how alike their sides are: `symmetric` can only be what `asDrawn` takes. */
export const measuresOfShape = (asDrawn: Schema | false, needed: readonly string[] = []): Schema => ({
  oneOf: [
    { properties: { shape: { enum: ['triangle', 'rectangle'] }, radiusMm: false, points: false }, required: ['baseMm', 'heightMm', ...needed] },
    { properties: { shape: { const: 'circle' }, baseMm: false, heightMm: false, points: false }, required: ['radiusMm', ...needed] },
    { properties: { shape: { const: 'points' }, baseMm: false, heightMm: false, radiusMm: false, symmetric: asDrawn }, required: ['points'] },
  ],
});

const BANDS: Readonly<Record<string, Schema>> = {
  TabbyBand: band(
    'Over one, under one, with shapes in other yarns if wished.',
    'tabby',
    {
      heightMm: number('Height of the band, mm.', { min: 0, max: LONGEST_MM }),
      strands: whole('Strands in a row, instead of the yarn’s own number; 2 is doubled weft.', { min: 1, max: 100 }),
      basket: flag('Two ends as one, and two strands in a row unless `strands` says otherwise. Needs an even number of working ends.'),
      fill: { const: true, description: 'The band takes what height is left; one in a piece.' },
      shapes: list('Shapes woven into the ground.', ref('Shape'), { maxItems: 24 }),
    },
    ['strands', 'basket', 'heightMm', 'fill', 'shapes'],
    exactlyOne(['heightMm'], ['fill']),
  ),
  SoumakBand: band('Weft wrapped round the ends, over some and back under fewer.', 'soumak', {
    over: whole('Ends passed over.', { min: 2, max: 100 }),
    back: whole('Ends gone back under, fewer than `over`.', { min: 1, max: 99 }),
    rows,
    tabbyBetween: whole('Picks of tabby between two rows.', { min: 0, max: 100 }),
    tabbyYarn: role('Yarn role of the tabby between.'),
  }),
  RyaBand: band('Cut strands knotted round two legs of ends.', 'rya', {
    edgeEnds: whole('Plain ends at each selvedge; 0 when missing.', { min: 0, max: 100 }),
    strands: whole('Strands in a knot.', { min: 1, max: 100 }),
    legEnds: whole('Ends in each leg.', { min: 1, max: 100 }),
    pileMm: lengthMm('How far the pile hangs, mm.'),
    trimMm: number('To be trimmed away, mm.', { min: 0, max: 1000 }),
    rows,
    heightMm: bandHeight,
  }, ['edgeEnds']),
  RovingBand: band(
    'Unspun fibre laid over and under groups of ends, puffed up on the face.',
    'roving',
    {
      over: whole('Ends passed over, then under.', { min: 1, max: 200 }),
      bulgeMm: number('How far it is puffed up, mm.', { min: 0, max: 1000 }),
      heightMm: bandHeight,
      passes: whole('Passes; 1 when missing.', { min: 1, max: 1000 }),
    },
    ['passes'],
  ),
  HemStitchBand: band('A row of stitches round bundles of ends, reaching into the cloth.', 'hem-stitch', {
    bundleEnds: whole('Ends in a bundle.', { min: 1, max: 100 }),
    reachPicks: whole('Rows the stitch reaches into the cloth.', { min: 1, max: 100 }),
  }),
  LoopPileBand: band(
    'Loops over a rod, or drawn up to a height.',
    'loop-pile',
    { rodMm: lengthMm('Thickness of the rod, mm.', 500), loopMm: lengthMm('Height of a loop, mm.', 1000), rows, heightMm: bandHeight },
    ['rodMm', 'loopMm'],
    exactlyOne(['rodMm'], ['loopMm']),
  ),
  TwiningBand: band('Two wefts crossing between the ends.', 'twining', { rows, endsPerTwist: whole('Ends between two crossings; 1 when missing.', { min: 1, max: 100 }) }, ['endsPerTwist']),
};

const BAND_OF: Readonly<Record<string, string>> = {
  tabby: 'TabbyBand',
  soumak: 'SoumakBand',
  rya: 'RyaBand',
  roving: 'RovingBand',
  'hem-stitch': 'HemStitchBand',
  'loop-pile': 'LoopPileBand',
  twining: 'TwiningBand',
};

const Shape = closed(
  'A figure in the ground of a tabby band.',
  {
    ...MEASURES,
    yarn: role('Yarn role.'),
    centreMm: number('Middle of its base from the left selvedge, mm; the middle of the piece when missing.', { min: 0, max: LONGEST_MM }),
    bottomMm: number('From the band’s first row, mm; 0 when missing.', { min: 0, max: LONGEST_MM }),
    leanMm: number('How far its top stands to the right of the base’s middle; negative: to the left.', { min: -LONGEST_MM, max: LONGEST_MM }),
    symmetric: flag('Steps alike on both sides; true when missing, unless it leans.'),
    join: choice('How colours meet; `slit` when missing.', 'slit', 'dovetail', 'interlock'),
  },
  [...MEASURE_KEYS, 'centreMm', 'bottomMm', 'leanMm', 'symmetric', 'join'],
  measuresOfShape(false),
);

const Loom = closed(
  'A frame with nails or notches along two rails.',
  {
    kind: choice('`nailed-frame` when missing. Notches take one end each, so they are warped `two-nail`.', 'nailed-frame', 'notched-frame', 'two-row-frame'),
    nailRows: choice('Which rows of a two-row frame the warp goes round; `both` when missing. For that kind only.', 'both', 'inner'),
    nailPitchMm: number('From nail to nail, centre to centre.', { min: 1, max: 100 }),
    warping: choice('Round every nail, or along two neighbouring ones.', 'zigzag', 'two-nail'),
    everyNthNail: whole('1 uses every nail, 2 every second one; 1 when missing.', { min: 1, max: 50 }),
    nailDiameterMm: lengthMm('1.6 when missing.', 50),
    insideHeightMm: lengthMm('From the nails of one rail to those of the other.'),
    insideWidthMm: lengthMm('Clear rail. Not looked at when missing.'),
  },
  ['kind', 'nailRows', 'everyNthNail', 'nailDiameterMm', 'insideWidthMm'],
  {
    allOf: [
      { if: { properties: { kind: { const: 'notched-frame' } }, required: ['kind'] }, then: { properties: { warping: { const: 'two-nail' } } } },
      { if: { not: { properties: { kind: { const: 'two-row-frame' } }, required: ['kind'] } }, then: { properties: { nailRows: false } } },
    ],
  },
);

const Warp = closed(
  'The warp.',
  {
    yarn: ref('Yarn'),
    endsTogether: whole('2 weaves every two neighbours as one; 1 when missing.', { min: 1, max: 2 }),
    parity: choice('What the pattern asks of the number of working ends; `any` when missing.', 'any', 'even', 'odd'),
    endCount: whole('The number of ends where it is fixed; else it follows from the width.', { min: 4, max: 2000 }),
    tieMm: lengthMm('For tying at the first and the last nail, each; 150 when missing.'),
  },
  ['endsTogether', 'parity', 'endCount', 'tieMm'],
);

const Finish = closed(
  'What becomes of the warp ends below the cloth.',
  {
    bottom: choice('`plain` leaves or cuts them as they are.', 'knotted', 'twisted', 'tucked', 'plain'),
    fringeMm: number('Fringe left to see; none when missing. Ends that are tucked in leave none.', { min: 0, max: 2000 }),
    bundleEnds: whole('Ends in a knot or a twisted cord; 4 when missing.', { min: 1, max: 100 }),
  },
  ['fringeMm', 'bundleEnds'],
  {
    oneOf: [
      { properties: { bottom: { enum: ['knotted', 'twisted'] } } },
      { properties: { bottom: { const: 'tucked' }, fringeMm: false, bundleEnds: false } },
      { properties: { bottom: { const: 'plain' }, bundleEnds: false } },
    ],
  },
);

const ALLOWANCES: Readonly<Record<string, Schema>> = {
  drawIn: number('Share by which the cloth draws in; 0.02, in balanced cloth 0.08.', { min: 0, below: 0.4 }),
  relaxation: number('Share by which it shortens when cut off; 0.02.', { min: 0, max: 0.2 }),
  wetShrinkage: number('Share by which washing shrinks it; 0.', { min: 0, max: 0.2 }),
  topMm: allowanceMm('Warp left unwoven at the top; 40.'),
  bottomMm: allowanceMm('Warp left unwoven at the bottom; 60.'),
  tailMm: lengthMm('Yarn left hanging where a weft begins or ends; 50.', 1000),
  loadMm: lengthMm('Yarn on one shuttle; 8000.', 1_000_000),
  marginWeft: number('Share bought on top; 0.15, with a counted swatch 0.1.', { min: 0, max: 1 }),
  marginWarp: number('Share bought on top; 0.1.', { min: 0, max: 1 }),
};

/** Which numbers belong to which mode, and whose rows may go without a beat. */
const NUMBERS_OF_MODE: Schema = {
  oneOf: [
    { properties: { mode: { const: 'straight-warp' }, weftWaveMm: false, takeUp: false, warpTakeUp: false }, required: ['beat'] },
    { properties: { mode: { const: 'balanced' }, weftWaveMm: false, takeUp: false, warpTakeUp: false }, required: ['mode'] },
    { properties: { mode: { const: 'given' }, takeUp: false, warpTakeUp: false }, required: ['mode', 'weftWaveMm', 'beat'] },
    { properties: { mode: { const: 'measured' }, weftWaveMm: false }, required: ['mode', 'beat'] },
  ],
};

export const FRAME_LOOM_PIECE_SCHEMAS: Readonly<Record<string, Schema>> = {
  ...BANDS,
  Band: toldBy('technique', BAND_OF),
  Shape,
  ShapePoint,
  Loom,
  Finish,
  Warp,
  FrameLoomPiece: closed(
    'A piece woven on a frame, in millimetres. Shares are fractions: 0.02 is two per cent.',
    {
      craft: { const: 'frame-loom' },
      size: closed('Finished size of the woven cloth, without fringe.', { widthMm: lengthMm('Width.'), heightMm: lengthMm('Height.') }),
      loom: ref('Loom'),
      warp: ref('Warp'),
      beat: closed(
        'How closely rows lie: by the yarn’s thickness (hanging 0.7, tapestry 1.1, rug 1.45), or as counted on a swatch. Balanced cloth without it has rows as far apart as its ends.',
        { picksPerWeftDiameter: number('Rows in one compressed weft thickness.', { min: 0.2, max: 2 }), picksPerCm: number('Rows in a centimetre.', { above: 0, max: 200 }) },
        ['picksPerWeftDiameter', 'picksPerCm'],
        exactlyOne(['picksPerWeftDiameter'], ['picksPerCm']),
      ),
      mode: choice('Which yarn bends: the weft round a straight warp, both alike, the weft as high as is given, or as it was measured; `straight-warp` when missing.', 'straight-warp', 'balanced', 'given', 'measured'),
      weftWaveMm: allowanceMm('Height of the weft’s wave, at most warp and weft together; of `given` only.'),
      takeUp: number('What a pick drawn out straight is longer than its cloth; 0.1, with a warning, when missing. Of `measured` only.', { min: 0, max: 0.6 }),
      warpTakeUp: number('The same of the warp; 0 when missing, 0.1 beside a missing `takeUp`. Of `measured` only.', { min: 0, max: 0.6 }),
      allowances: closed('Each with its default.', ALLOWANCES, Object.keys(ALLOWANCES)),
      dowel: closed('The rod it hangs from.', { fixing: choice('How the cloth is held to it; `slipped` when missing.', 'slipped', 'tied', 'lashed'), diameterMm: lengthMm('Thickness.', 200), lengthMm: number('Length; the width and 40 mm on each side when missing.', { min: 60, max: LONGEST_MM }) }, ['fixing', 'lengthMm']),
      finish: ref('Finish'),
      hangs: choice('`turned` hangs with the end that was woven first at the top.', 'as-woven', 'turned'),
      seed: whole('Of the drawing’s chance.', { min: 0, max: Number.MAX_SAFE_INTEGER }),
      yarns: byRole(ref('Yarn'), { maxProperties: 60 }),
      bands: list('In the order they are woven.', ref('Band'), { minItems: 1, maxItems: 200 }),
    },
    ['beat', 'mode', 'weftWaveMm', 'takeUp', 'warpTakeUp', 'allowances', 'dowel', 'finish', 'hangs', 'seed'],
    NUMBERS_OF_MODE,
  ),
};

/** A knotted piece as it is asked about, and its plan. */
import { byRole, choice, closed, count, exactlyOne, flag, lengthMm, list, LONGEST_MM, mm, number, partName, ref, role, text, toldBy, whole, type Schema } from '#contracts/reckon-api/schema.ts';
import { CAUTIONS, EVERY_PLAN } from '#contracts/reckon-api/shared-schemas.ts';
import { YARN_TRAITS } from '#contracts/reckon-api/yarn-schemas.ts';

const TECHNIQUES = ['square-knots', 'alternating', 'half-hitches', 'plain', 'gathering', 'fringe'] as const;
type Technique = (typeof TECHNIQUES)[number];

function section(technique: Technique, description: string, properties: Readonly<Record<string, Schema>>, optional: readonly string[] = [], more: Schema = {}): Schema {
  return closed(description, { technique: { const: technique }, name: partName('How lessons call it; once in a piece.'), ...properties }, ['name', ...optional], more);
}

const gapMm = number('Bare cord between two knots; 0 when missing.', { min: 0, max: 1000 });
const rows = (max: number): Schema => whole('Rows.', { min: 1, max });

const SECTIONS: Readonly<Record<Technique, { readonly name: string; readonly schema: Schema }>> = {
  'square-knots': {
    name: 'SquareKnots',
    schema: section('square-knots', 'Square knots under each other, four ends to a knot.', {
      knots: whole('How many, or `heightMm`.', { min: 1, max: 10_000 }),
      heightMm: lengthMm('Height they are to fill, or `knots`.'),
      gapMm,
      spiral: flag('Only the first half, again and again: the column turns.'),
    }, ['knots', 'heightMm', 'gapMm', 'spiral'], exactlyOne(['knots'], ['heightMm'])),
  },
  alternating: { name: 'AlternatingKnots', schema: section('alternating', 'Rows of square knots, each half a knot to the side.', { rows: rows(10_000), gapMm }, ['gapMm']) },
  'half-hitches': {
    name: 'HalfHitches',
    schema: section('half-hitches', 'Double half hitches of every end over one that is held.', { rows: rows(1000), slant: choice('`level` when missing.', 'level', 'left', 'right') }, ['slant']),
  },
  plain: { name: 'PlainCord', schema: section('plain', 'Cord that hangs.', { heightMm: lengthMm('Height of the plain stretch.') }) },
  gathering: {
    name: 'GatheringKnot',
    schema: section('gathering', 'All ends wrapped by a cord of its own.', { wraps: whole('Turns.', { min: 1, max: 200 }), yarn: role('Role of that cord; that of the column when missing.') }, ['yarn']),
  },
  fringe: { name: 'Fringe', schema: section('fringe', 'The loose ends; nothing follows it.', { heightMm: lengthMm('Length of the fringe.') }) },
};

const sectionsOf = (...techniques: readonly Technique[]): Schema => toldBy('technique', Object.fromEntries(techniques.map((technique) => [technique, SECTIONS[technique].name])));

const Rod: Schema = {
  description: 'What it hangs from.',
  oneOf: [
    closed('A rod.', { kind: { const: 'rod' }, diameterMm: lengthMm('Thickness.', 2000), lengthMm: lengthMm('As wide as the knots with something to stand out when missing.') }, ['lengthMm']),
    closed('A ring.', { kind: { const: 'ring' }, diameterMm: lengthMm('From outer edge to outer edge.', 2000), thickMm: lengthMm('What it is made of; 8 when missing.', 200) }, ['thickMm']),
  ],
};

const { label, colour, ball, fibre } = YARN_TRAITS;
const ThickCord = closed('A cord told by its thickness.', {
  diameterMm: number('Thickness.', { min: 0.5, max: 60 }),
  tex: number('Grams in a kilometre, where a scale has told it; else that of twisted cotton so thick.', { min: 1, max: 200_000 }),
  label, colour, ball, fibre,
}, ['tex', 'label', 'colour', 'ball', 'fibre']);

const SECTION_PLAN = closed('One section.', {
  technique: choice('How it is made.', ...TECHNIQUES),
  name: text('As it was told.'),
  heightMm: mm('Height.'),
  knots: count('Knots.'),
  workerMm: mm('What an end takes that works.'),
  fillerMm: mm('What an end takes that is only knotted round or held.'),
  cordMm: mm('The gathering knot’s own cord, to cut.'),
}, ['name', 'knots', 'cordMm']);

export const MACRAME_SCHEMAS: Readonly<Record<string, Schema>> = {
  ...Object.fromEntries(Object.values(SECTIONS).map(({ name, schema }) => [name, schema])),
  KnottedSection: sectionsOf(...TECHNIQUES),
  FootSection: sectionsOf('plain', 'gathering', 'fringe'),
  ThickCord,
  Cord: { description: 'A cord by its thickness, or any yarn by its grist.', oneOf: [ref('ThickCord'), ref('Yarn')] },
  KnottedColumn: closed('Cords side by side, each folded over the rod.', {
    name: partName('How lessons call it; once in a piece.'),
    yarn: role('Role of its cord.'),
    cords: whole('Folded cords; twice as many ends. Even where square knots are tied.', { min: 1, max: 200 }),
    sections: list('From the rod down.', ref('KnottedSection'), { minItems: 1, maxItems: 60 }),
  }, ['name']),
  MacramePiece: closed('A knotted piece, in millimetres; what knots take is told in cord diameters.', {
    craft: { const: 'macrame' },
    rod: Rod,
    yarns: byRole(ref('Cord'), { maxProperties: 60 }),
    columns: list('From the left to the right.', ref('KnottedColumn'), { minItems: 1, maxItems: 60 }),
    foot: list('All ends together, below the columns.', ref('FootSection'), { minItems: 1, maxItems: 60 }),
    takes: closed('As measured on ten knots, in cord diameters.', {
      squareKnot: number('Of a working end in a square knot; 16.', { min: 11.5, max: 20 }),
      squareRise: number('How high a square knot stands; 3.5.', { min: 2, max: 6 }),
      doubleHalfHitch: number('Of a working end in a double half hitch; 15.', { min: 12.5, max: 25 }),
    }, ['squareKnot', 'squareRise', 'doubleHalfHitch']),
    allowances: closed('Each with its default.', {
      margin: number('Share bought on top; 0.1.', { min: 0, max: 1 }),
      tailMm: number('To hold at every end; 50.', { min: 0, max: 2000 }),
    }, ['margin', 'tailMm']),
    seed: whole('Of the drawing’s chance.', { min: 0, max: Number.MAX_SAFE_INTEGER }),
  }, ['foot', 'takes', 'allowances', 'seed']),
  SectionPlan: SECTION_PLAN,
  MacramePlan: closed('Everything a knotted piece takes.', {
    craft: { const: 'macrame' },
    widthMm: mm('Where it is knotted.'),
    heightMm: number('From the rod to the tips.', { min: 0, max: LONGEST_MM }),
    cords: count('Folded cords.'),
    ends: count('Ends.'),
    knots: count('Knots.'),
    columns: list('As they were asked.', closed('One column.', {
      index: count('Its place, from 0.'),
      name: text('As it was told.'),
      ends: count('Ends.'),
      heightMm: mm('Height, without the foot.'),
      cords: count('Cords to cut, all alike.'),
      cutMm: mm('Length to cut each.'),
      ruleMm: mm('What the rule of four times the length would cut, for comparison.'),
      sections: list('From the rod down.', ref('SectionPlan')),
    }, ['name'])),
    foot: list('As it was asked.', ref('SectionPlan')),
    rod: closed('Of a rod; a ring is bought as it is.', { lengthMm: mm('Length.'), minDiameterMm: mm('The least that does not sag.') }),
    cut: list('What to cut.', closed('One line of it.', {
      what: choice('What it is for.', 'cord', 'gathering-cord'),
      where: text('Column or section.'),
      yarn: text('Role.'),
      count: count('How many.'),
      lengthMm: mm('Length of each.'),
    })),
    yarns: byRole(ref('WarpPlan')),
    cautions: CAUTIONS,
    ...EVERY_PLAN,
  }, ['rod']),
};

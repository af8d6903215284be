/** The workings of one section: how high it is, its knots, and what it takes of an end that works and of one that does not. */
import type { Section, SectionPlan } from '#core/craft/macrame/piece.ts';
import { END_SPACING, GATHERING_TAIL_MM } from '#core/craft/macrame/plan-macrame.ts';
import { bundleDiameter } from '#core/craft/hanging.ts';
import { HITCH_ROW, type KNOT_TAKES } from '#core/craft/macrame/cord.ts';
import type { PieceParts } from '#core/craft/macrame/read-piece.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { from, given, standing, type Notebook, type Standing } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

export const PRACTICE: Standing = { source: 'common practice; measure ten of your own knots', trust: 'practice' };
const PATH: Standing = { source: 'the path of the cord, worked out here: no published derivation, so measure ten of your own knots', trust: 'formula' };
const NO_GAP: Standing = { source: 'none, unless the section says otherwise', trust: 'counted' };

/** The piece whose workings are written down. */
export interface Knotted {
  readonly book: Notebook;
  readonly fields: Fields;
  readonly parts: PieceParts;
  /** Thickness of the cord of each role. */
  readonly diameters: ReadonlyMap<string, Working>;
}

/** Where a section stands: its ends, and the thickness of the cord they are of. */
export interface SectionAt {
  /** Of the ids: `columns.0.sections.1.` */
  readonly prefix: string;
  /** As a JSON pointer. */
  readonly path: string;
  readonly ends: Working;
  readonly diameter: Working;
}

export interface NotedSection {
  readonly technique: Section['technique'];
  readonly height: Working;
  readonly worker: Working;
  readonly filler: Working;
  readonly knots?: Working;
  /** The gathering knot's own cord. */
  readonly cord?: Working;
}

const TAKES: Readonly<Record<keyof typeof KNOT_TAKES, string>> = {
  squareKnot: 'cord of a working end in a square knot, in diameters', squareRise: 'height of a square knot, in diameters', doubleHalfHitch: 'cord of a working end in a double half hitch, in diameters',
};

function takes({ fields, parts }: Knotted, symbol: string, key: keyof typeof KNOT_TAKES): WorkingInput {
  const number = { symbol, name: TAKES[key], value: parts.takes[key], unit: 'ratio' } as const;
  return fields.optionalGroup('takes', 'What knots take')?.has(key) === true ? given(number, `/takes/${key}`, 'measured') : standing(number, PRACTICE);
}

const gapOf = ({ gapMm }: { readonly gapMm?: number }, path: string): WorkingInput => {
  const number = { symbol: 'g', name: 'bare cord between two knots', value: gapMm ?? 0, unit: 'mm' } as const;
  return gapMm === undefined ? standing(number, NO_GAP) : given(number, `${path}/gapMm`, 'counted');
};

type Formulas = Readonly<Record<'height' | 'worker' | 'filler', string>> & { readonly knots?: string };

/** Height, knots and both lengths, each with the inputs that stand in its formula. */
function noteTaken({ book }: Knotted, { prefix }: SectionAt, plan: SectionPlan, formulas: Formulas, inputs: readonly WorkingInput[]): NotedSection {
  const used = (formula: string): WorkingInput[] => inputs.filter(({ symbol }) => new RegExp(`\\b${symbol}\\b`, 'u').test(formula));
  const note = (key: 'heightMm' | 'workerMm' | 'fillerMm', name: string, formula: string, value: number): Working => book.note({ id: `${prefix}${key}`, name, formula, inputs: used(formula), value, unit: 'mm', ...PATH });
  const { knots } = formulas;
  return {
    technique: plan.technique,
    height: note('heightMm', 'height of the section', formulas.height, plan.heightMm),
    worker: note('workerMm', 'cord a working end takes', formulas.worker, plan.workerMm),
    filler: note('fillerMm', 'cord an end takes that is only knotted round', formulas.filler, plan.fillerMm),
    ...(knots === undefined || plan.knots === undefined ? {} : { knots: book.note({ id: `${prefix}knots`, name: 'knots', formula: knots, inputs: used(knots), value: plan.knots, unit: 'count', ...RULES.count }) }),
  };
}

type Of<T extends Section['technique']> = Extract<Section, { readonly technique: T }>;

function noteSquareKnots(on: Knotted, at: SectionAt, section: Of<'square-knots'>, plan: SectionPlan): NotedSection {
  const [d, r, g, E] = [from('d', at.diameter), takes(on, 'r', 'squareRise'), gapOf(section, at.path), from('E', at.ends)];
  const each = { id: `${at.prefix}each`, name: 'square knots under each other', unit: 'count' } as const;
  const n = section.knots === undefined
    ? on.book.note({
      ...each, formula: 'max(1, floor((H + g) / (r * d + g) + 0.5 + 1e-9))', inputs: [given({ symbol: 'H', name: 'height to fill', value: section.heightMm, unit: 'mm' }, `${at.path}/heightMm`, 'counted'), g, r, d], value: (plan.knots ?? 0) / (at.ends.value / 4), ...PRACTICE,
    })
    : on.book.note({ ...each, formula: 'n', inputs: [given({ symbol: 'n', name: 'knots asked for', value: section.knots, unit: 'count' }, `${at.path}/knots`, 'counted')], value: section.knots, ...RULES.asGiven });
  const height = 'n * r * d + (n - 1) * g';
  return noteTaken(on, at, plan, { height, knots: 'n * E / 4', worker: 'n * k * d + (n - 1) * g', filler: height }, [from('n', n), takes(on, 'k', 'squareKnot'), d, r, g, E]);
}

function noteAlternating(on: Knotted, at: SectionAt, section: Of<'alternating'>, plan: SectionPlan): NotedSection {
  const rows = given({ symbol: 'R', name: 'rows', value: section.rows, unit: 'count' }, `${at.path}/rows`, 'counted');
  const gaps = '(R - 1) * g';
  return noteTaken(on, at, plan, {
    height: `R * r * d + ${gaps}`,
    knots: 'ceil(R / 2) * E / 4 + floor(R / 2) * (E / 4 - 1)',
    worker: `ceil(R / 2) * k * d + floor(R / 2) * r * d + ${gaps}`,
    filler: `ceil(R / 2) * r * d + floor(R / 2) * k * d + ${gaps}`,
  }, [rows, takes(on, 'k', 'squareKnot'), takes(on, 'r', 'squareRise'), from('d', at.diameter), gapOf(section, at.path), from('E', at.ends)]);
}

function noteHalfHitches(on: Knotted, at: SectionAt, { rows, slant = 'level' }: Of<'half-hitches'>, plan: SectionPlan): NotedSection {
  const [d, E] = [from('d', at.diameter), from('E', at.ends)];
  const width = on.book.note({
    id: `${at.prefix}widthMm`, name: 'ends side by side', formula: 'E * s * d', inputs: [E, standing({ symbol: 's', name: 'from end to end, in diameters', value: END_SPACING, unit: 'ratio' }, PRACTICE), d], value: at.ends.value * END_SPACING * at.diameter.value, unit: 'mm', ...RULES.euclid,
  });
  const fall = slant === 'level' ? '' : ' + w';
  const held = slant === 'level' ? 'w' : 'hypot(w, w)';
  return noteTaken(on, at, plan, { height: `R * q * d${fall}`, knots: 'R * (E - 1)', worker: `R * t * d${fall}`, filler: `R * ${held}` }, [
    given({ symbol: 'R', name: 'rows', value: rows, unit: 'count' }, `${at.path}/rows`, 'counted'),
    standing({ symbol: 'q', name: 'height of a row, in diameters', value: HITCH_ROW, unit: 'ratio' }, PRACTICE), takes(on, 't', 'doubleHalfHitch'), from('w', width), d, E,
  ]);
}

function noteGathering(on: Knotted, at: SectionAt, section: Of<'gathering'>, plan: SectionPlan): NotedSection {
  const own = on.diameters.get(section.yarn ?? '') ?? at.diameter;
  const turns = given({ symbol: 'W', name: 'turns', value: section.wraps, unit: 'count' }, `${at.path}/wraps`, 'counted');
  const bundle = on.book.note({ id: `${at.prefix}bundleMm`, name: 'thickness of all ends together', formula: 'sqrt(E) * d', inputs: [from('E', at.ends), from('d', at.diameter)], value: bundleDiameter(at.ends.value, at.diameter.value), unit: 'mm', ...RULES.together });
  const c = from('c', own);
  const taken = noteTaken(on, at, plan, { height: 'W * c', worker: 'W * c', filler: 'W * c', knots: '1' }, [turns, c]);
  const tail = standing({ symbol: 't', name: 'one tail', value: GATHERING_TAIL_MM, unit: 'mm' }, PRACTICE);
  return { ...taken, cord: on.book.note({ id: `${at.prefix}cordMm`, name: 'cord of the gathering knot, to cut', formula: 'W * pi * (b + c) + 2 * W * c + 2 * t', inputs: [turns, from('b', bundle), c, tail], value: plan.cordMm ?? 0, unit: 'mm', ...PATH }) };
}

export function noteSection(on: Knotted, at: SectionAt, section: Section, plan: SectionPlan): NotedSection {
  switch (section.technique) {
    case 'square-knots':
      return noteSquareKnots(on, at, section, plan);
    case 'alternating':
      return noteAlternating(on, at, section, plan);
    case 'half-hitches':
      return noteHalfHitches(on, at, section, plan);
    case 'gathering':
      return noteGathering(on, at, section, plan);
    default:
      return noteTaken(on, at, plan, { height: 'H', worker: 'H', filler: 'H' }, [given({ symbol: 'H', name: 'height of the plain stretch', value: section.heightMm, unit: 'mm' }, `${at.path}/heightMm`, 'counted')]);
  }
}

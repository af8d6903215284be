/** Reading a knotted piece. Everything that is wrong is told at once, each at its own place. */
import { KNOT_TAKES, texFromDiameter } from '#core/craft/macrame/cord.ts';
import type { Column, FootSection, MacramePiece, Rod, Section } from '#core/craft/macrame/piece.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { Fields, type NumberRule } from '#core/craft/reading/fields.ts';
import { below, type Findings } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import { LONGEST_MM } from '#core/craft/techniques/read-rules.ts';
import { readBall, readColour, readYarn } from '#core/craft/yarn/read-yarn.ts';
import { TEX_RANGE } from '#core/craft/yarn/count.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { ASHENHURST_K, DEFAULT_ALLOWANCES } from '#core/craft/defaults.ts';

/** A cord with all that is reckoned from it. */
export interface KnownCord {
  readonly label?: string;
  readonly colour?: string;
  readonly diameterMm: number;
  readonly tex: number;
  readonly ball?: Yarn['ball'];
  /** Where it was told by its grist. */
  readonly yarn?: Yarn;
}

export interface PieceParts {
  readonly rod: Rod;
  readonly cords: ReadonlyMap<string, KnownCord>;
  readonly columns: readonly Column[];
  readonly foot: readonly FootSection[];
  readonly takes: Required<NonNullable<MacramePiece['takes']>>;
  readonly margin: number;
  readonly tailMm: number;
}

const MOST = { columns: 60, sections: 60, ends: 400, knots: 10_000 } as const;
const ROLE = /^[a-z][a-z0-9-]{0,39}$/i;
const NAME = /^[a-z0-9-]{1,40}$/;
export const TAIL_MM = 50;
const length = (name: string, max: number = LONGEST_MM): NumberRule => ({ name, min: 'over-zero', max, unit: 'mm' });
const count = (name: string, max: number): NumberRule => ({ name, min: 1, max, whole: true });
const GAP: NumberRule = { name: 'Bare cord between knots', min: 0, max: 1000, unit: 'mm' };
const FOOT = ['plain', 'gathering', 'fringe'] as const;
const TECHNIQUES = ['square-knots', 'alternating', 'half-hitches', ...FOOT] as const;

function readRod(fields: Fields): Rod {
  const group = fields.group('rod', 'What it hangs from');
  const kind = group.choice('kind', 'What it hangs from', ['rod', 'ring']);
  const diameterMm = group.number('diameterMm', length(kind === 'rod' ? 'Thickness of the rod' : 'Width of the ring', 2000));
  const rod: Rod = kind === 'rod'
    ? { kind, diameterMm, ...present({ lengthMm: group.optionalNumber('lengthMm', length('Length of the rod')) }) }
    : { kind, diameterMm, ...present({ thickMm: group.optionalNumber('thickMm', length('Thickness of the ring', 200)) }) };
  group.end();
  if (rod.kind === 'ring' && (rod.thickMm ?? 8) * 2 >= rod.diameterMm) group.reject('E_FIT', 'thickMm', 'A ring this thick has no hole. Measure across it from outer edge to outer edge.');
  return rod;
}

/** Told by its thickness, or as any yarn by its grist. */
function readCord(fields: Fields): KnownCord | undefined {
  if (!fields.has('diameterMm')) {
    const yarn = readYarn(fields);
    if (yarn === undefined) return undefined;
    const { tex, compressedMm, strands } = threadOf(yarn, ASHENHURST_K.warp);
    return { yarn, diameterMm: compressedMm, tex: tex * strands, ...present({ label: yarn.label, colour: yarn.colour, ball: yarn.ball }) };
  }
  return fields.findings.soundly(() => {
    const diameterMm = fields.number('diameterMm', { name: 'Thickness of the cord', min: 0.5, max: 60, unit: 'mm' });
    const tex = fields.optionalNumber('tex', { name: 'Tex', ...TEX_RANGE, unit: 'tex' });
    const traits = present({ label: fields.optionalText('label', { name: 'Label', maxLength: 120 }), colour: readColour(fields), ball: readBall(fields) });
    fields.optionalText('fibre', { name: 'Fibre', maxLength: 60 });
    fields.end();
    return { ...traits, diameterMm, tex: tex ?? texFromDiameter(diameterMm) };
  });
}

function readCords(fields: Fields): ReadonlyMap<string, KnownCord> {
  const group = fields.group('yarns', 'The group of cords');
  const cords = new Map<string, KnownCord>();
  const entries = group.entries();
  if (entries.length > MOST.columns) {
    fields.reject('E_RANGE', 'yarns', `${String(entries.length)} kinds of cord are too many. Up to ${String(MOST.columns)} work.`);
    return new Map();
  }
  for (const [role, value] of entries) {
    const path = group.pathOf(role);
    if (!ROLE.test(role)) fields.findings.reject('E_ENUM', path, 'A role begins with a letter and goes on with letters, figures or hyphens, 40 at most.');
    const cord = readCord(Fields.of(value, path, 'Cord', fields.findings));
    if (cord !== undefined) cords.set(role, cord);
  }
  return cords;
}

/** What the parts of a piece are held against as they are read: names go to one part each, roles must be there. */
class Roll {
  readonly #roles: ReadonlySet<string>;
  readonly #named = new Set<string>();

  constructor(roles: ReadonlySet<string>) {
    this.#roles = roles;
  }

  readName(fields: Fields, kind: 'column' | 'section'): { readonly name?: string } {
    const name = fields.optionalText('name', { name: 'Name', maxLength: 40 });
    if (name === undefined) return {};
    if (!NAME.test(name)) fields.reject('E_ENUM', 'name', 'A name is made of small letters, figures and hyphens, such as crown or cord-2.');
    else if (this.#named.has(`${kind} ${name}`)) fields.reject('E_ENUM', 'name', `Something else is called ${name} already.`);
    this.#named.add(`${kind} ${name}`);
    return { name };
  }

  /** The role as it was read. */
  known<T extends string | undefined>(fields: Fields, role: T): T {
    if (role !== undefined && !this.#roles.has(role)) fields.reject('E_ENUM', 'yarn', `The piece has no cord in the role “${role}”.`);
    return role;
  }
}

function readSquareKnots(fields: Fields, roll: Roll): Section {
  const named = { ...roll.readName(fields, 'section'), technique: 'square-knots' as const, ...present({ gapMm: fields.optionalNumber('gapMm', GAP), spiral: fields.optionalFlag('spiral', 'Turning') }) };
  const byCount = fields.has('knots');
  if (byCount && fields.has('heightMm')) {
    fields.take('heightMm');
    fields.reject('E_ENUM', 'heightMm', 'The number of knots stands already. Give one of the two.');
  }
  return byCount ? { ...named, knots: fields.number('knots', count('Knots', MOST.knots)) } : { ...named, heightMm: fields.number('heightMm', length('Height of the knotted stretch')) };
}

function readSection(value: unknown, path: string, among: readonly [Section['technique'], ...Section['technique'][]], roll: Roll, findings: Findings): Section | undefined {
  return findings.soundly(() => {
    const fields = Fields.of(value, path, 'A section', findings);
    const before = findings.count;
    const technique = fields.choice('technique', 'Technique', among);
    if (findings.count > before) return undefined;
    const section = readTechnique(technique, fields, roll);
    fields.end();
    return section;
  });
}

function readTechnique(technique: Section['technique'], fields: Fields, roll: Roll): Section {
  if (technique === 'square-knots') return readSquareKnots(fields, roll);
  const named = roll.readName(fields, 'section');
  switch (technique) {
    case 'alternating':
      return { ...named, technique, rows: fields.number('rows', count('Rows', MOST.knots)), ...present({ gapMm: fields.optionalNumber('gapMm', GAP) }) };
    case 'half-hitches':
      return { ...named, technique, rows: fields.number('rows', count('Rows', 1000)), ...present({ slant: fields.optionalChoice('slant', 'Slant', ['level', 'left', 'right']) }) };
    case 'gathering':
      return { ...named, technique, wraps: fields.number('wraps', count('Turns', 200)), ...present({ yarn: roll.known(fields, fields.optionalText('yarn', { name: 'Role of the cord', maxLength: 40 })) }) };
    default:
      return { ...named, technique, heightMm: fields.number('heightMm', length(technique === 'fringe' ? 'Length of the fringe' : 'Height of the plain stretch')) };
  }
}

function readSections(list: readonly unknown[], path: string, among: readonly [Section['technique'], ...Section['technique'][]], roll: Roll, findings: Findings): Section[] {
  const sections = list.map((value, index) => readSection(value, below(path, index), among, roll, findings));
  sections.forEach((section, index) => {
    if (section?.technique === 'fringe' && index < sections.length - 1) findings.reject('E_FIT', below(path, index), 'A fringe is where the cords end: nothing can follow it. Make it the last section.');
  });
  return sections.flatMap((section) => (section === undefined ? [] : [section]));
}

function readColumn(value: unknown, path: string, hasFoot: boolean, roll: Roll, findings: Findings): Column | undefined {
  return findings.soundly(() => {
    const fields = Fields.of(value, path, 'A column', findings);
    const column = {
      ...roll.readName(fields, 'column'),
      yarn: roll.known(fields, fields.text('yarn', { name: 'Role of the cord', maxLength: 40 })),
      cords: fields.number('cords', count('Folded cords', MOST.ends / 2)),
      sections: readSections(fields.list('sections', 'Sections', MOST.sections), fields.pathOf('sections'), TECHNIQUES, roll, findings),
    };
    fields.end();
    const inFours = column.sections.some(({ technique }) => technique === 'square-knots' || technique === 'alternating');
    if (inFours && column.cords % 2 === 1) fields.reject('E_PARITY', 'cords', `Square knots are tied with four ends, so folded cords go in pairs. ${String(column.cords + 1)} works.`);
    if (hasFoot && column.sections.at(-1)?.technique === 'fringe') fields.reject('E_FIT', 'sections', 'A fringe is where the cords end, and the foot goes on with all of them. Make the fringe the last section of the foot.');
    return column;
  });
}

function readTakes(fields: Fields): PieceParts['takes'] {
  const group = fields.optionalGroup('takes', 'What knots take');
  if (group === undefined) return KNOT_TAKES;
  const given = present({
    squareKnot: group.optionalNumber('squareKnot', { name: 'Cord in a square knot', min: 11.5, max: 20 }),
    squareRise: group.optionalNumber('squareRise', { name: 'Height of a square knot', min: 2, max: 6 }),
    doubleHalfHitch: group.optionalNumber('doubleHalfHitch', { name: 'Cord in a double half hitch', min: 12.5, max: 25 }),
  });
  group.end();
  return { ...KNOT_TAKES, ...given };
}

function readAllowances(fields: Fields): { readonly margin: number; readonly tailMm: number } {
  const group = fields.optionalGroup('allowances', 'Allowances');
  const margin = group?.optionalNumber('margin', { name: 'Margin', min: 0, max: 1, unit: 'share' });
  const tailMm = group?.optionalNumber('tailMm', { name: 'Cord to hold at every end', min: 0, max: 2000, unit: 'mm' });
  group?.end();
  return { margin: margin ?? DEFAULT_ALLOWANCES.marginWarp, tailMm: tailMm ?? TAIL_MM };
}

/** Undefined if anything was refused. Refuses keys it does not know. */
export function readPiece(fields: Fields): PieceParts | undefined {
  const { findings } = fields;
  fields.take('craft');
  return findings.soundly(() => {
    const rod = readRod(fields);
    const cords = readCords(fields);
    const roll = new Roll(new Set(fields.group('yarns', 'The group of cords').entries().map(([role]) => role)));
    const columns = fields.list('columns', 'Columns', MOST.columns).flatMap((value, index) => readColumn(value, `/columns/${String(index)}`, fields.has('foot'), roll, findings) ?? []);
    const foot = fields.has('foot') ? readSections(fields.list('foot', 'Foot', MOST.sections), '/foot', FOOT, roll, findings) : [];
    fields.take('foot');
    const parts = { rod, cords, columns, foot: foot as readonly FootSection[], takes: readTakes(fields), ...readAllowances(fields) };
    fields.optionalNumber('seed', { name: 'Seed of the drawing', min: 0, max: Number.MAX_SAFE_INTEGER, whole: true });
    fields.end();
    const ends = columns.reduce((sum, column) => sum + 2 * column.cords, 0);
    if (ends > MOST.ends) findings.reject('E_RANGE', '/columns', `${String(ends)} ends are too many to knot. Up to ${String(MOST.ends)} work.`);
    return parts;
  });
}

/** The workings of a knotted piece; ids are paths in its plan: `columns.0.cutMm`, `yarns.main.netMm`, `rod.lengthMm` … */
import { ASHENHURST_K, DEFAULT_ALLOWANCES, HANGING } from '#core/craft/defaults.ts';
import { CORD_VOLUME, larksHead } from '#core/craft/macrame/cord.ts';
import { noteSection, PRACTICE, type Knotted, type NotedSection, type SectionAt } from '#core/craft/macrame/explain-section.ts';
import type { MacramePlan, Section, SectionPlan } from '#core/craft/macrame/piece.ts';
import { COLUMN_GAP, END_SPACING, KNOTTING_PACE, reckonMacrame } from '#core/craft/macrame/plan-macrame.ts';
import { readPiece, TAIL_MM } from '#core/craft/macrame/read-piece.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { below } from '#core/craft/reading/findings.ts';
import { noteThread } from '#core/craft/show-how/explain-thread.ts';
import { noteBought } from '#core/craft/show-how/note-bought.ts';
import { noteHoursInAll, pace } from '#core/craft/show-how/note-hours.ts';
import { noteLeastRod } from '#core/craft/show-how/note-rod.ts';
import { from, given, standing, sumOf, type Notebook } from '#core/craft/show-how/notebook.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

type Plan = Omit<MacramePlan, 'warnings'>;

interface Explained extends Knotted {
  readonly plan: Plan;
  readonly texes: ReadonlyMap<string, Working>;
}

interface NotedColumn {
  readonly role: string;
  readonly ends: Working;
  readonly cords: Working;
  readonly diameter: Working;
  readonly height: Working;
  readonly sections: readonly NotedSection[];
}

const all = (symbol: string, workings: readonly Working[]): WorkingInput[] => workings.map((working, at) => from(`${symbol}${String(at)}`, working));
const total = (inputs: readonly WorkingInput[]): number => inputs.reduce((sum, { value }) => sum + Number(value), 0);

/** @throws if it is not there, which planning the piece has ruled out */
function known<T>(value: T | undefined): T {
  if (value === undefined) throw new Error('a plan without its piece');
  return value;
}

/** Thickness and tex of every cord: told by its thickness, or by its grist as any yarn. */
function noteCords(book: Notebook, fields: Fields, parts: Knotted['parts']): Pick<Explained, 'diameters' | 'texes'> {
  const diameters = new Map<string, Working>();
  const texes = new Map<string, Working>();
  for (const [role, cord] of parts.cords) {
    const [prefix, path] = [`yarns.${role}.`, below('/yarns', role)];
    const tex = { id: `${prefix}cordTex`, name: 'grams in a kilometre of the cord', value: cord.tex, unit: 'tex' } as const;
    if (cord.yarn !== undefined) {
      const thread = noteThread(book, { prefix, path, yarn: cord.yarn, defaultK: ASHENHURST_K.warp });
      diameters.set(role, thread.compressed);
      texes.set(role, book.note({ ...tex, formula: 'T * m', inputs: [from('T', thread.tex), thread.strands], ...RULES.arithmetic }));
      continue;
    }
    const thick = given({ symbol: 'd', name: 'thickness of the cord', value: cord.diameterMm, unit: 'mm' }, `${path}/diameterMm`, 'measured');
    diameters.set(role, book.note({ id: `${prefix}diameterMm`, name: 'thickness of the cord', formula: 'd', inputs: [thick], value: cord.diameterMm, unit: 'mm', ...RULES.asGiven }));
    const weighed = fields.group('yarns', 'Cords').optionalGroup(role, 'Cord')?.has('tex') === true;
    texes.set(role, weighed
      ? book.note({ ...tex, formula: 'T', inputs: [given({ symbol: 'T', name: 'tex', value: cord.tex, unit: 'tex' }, `${path}/tex`, 'label')], ...RULES.asGiven })
      : book.note({
        ...tex, formula: '250 * pi * d^2 / v', inputs: [thick, standing({ symbol: 'v', name: 'room a gram of twisted cotton takes', value: CORD_VOLUME, unit: 'cm3-per-g' }, { source: 'cotton cord of 4 mm, which weighs about 9 g a metre', trust: 'practice' })], ...RULES.euclid,
      }));
  }
  return { diameters, texes };
}

const noteSections = (on: Explained, place: string, at: Pick<SectionAt, 'ends' | 'diameter'>, asked: readonly Section[], planned: readonly SectionPlan[]): readonly NotedSection[] =>
  asked.map((section, index) => noteSection(on, { ...at, prefix: `${place}.${String(index)}.`, path: `/${place.replaceAll('.', '/')}/${String(index)}` }, section, known(planned[index])));

function noteColumns(on: Explained): readonly NotedColumn[] {
  const { book, parts, plan } = on;
  return parts.columns.map((column, index) => {
    const [id, own] = [`columns.${String(index)}`, known(plan.columns[index])];
    const cords = book.note({ id: `${id}.cords`, name: 'folded cords', formula: 'c', inputs: [given({ symbol: 'c', name: 'folded cords', value: column.cords, unit: 'count' }, `/columns/${String(index)}/cords`, 'counted')], value: own.cords, unit: 'count', ...RULES.asGiven });
    const ends = book.note({ id: `${id}.ends`, name: 'ends, two of every folded cord', formula: '2 * c', inputs: [from('c', cords)], value: own.ends, unit: 'count', ...RULES.count });
    const diameter = known(on.diameters.get(column.yarn));
    const sections = noteSections(on, `${id}.sections`, { ends, diameter }, column.sections, own.sections);
    const heights = all('h', sections.map(({ height }) => height));
    const height = book.note({ id: `${id}.heightMm`, name: 'height of the column, without the foot', formula: sumOf(heights), inputs: heights, value: own.heightMm, unit: 'mm', ...RULES.arithmetic });
    return { role: column.yarn, ends, cords, diameter, height, sections };
  });
}

/** Height, ends and knots of the whole piece; answers the foot, and the height that is knotted above it. */
function noteWhole(on: Explained, columns: readonly NotedColumn[]): { readonly foot: readonly NotedSection[]; readonly longest: Working; readonly footHeight?: Working } {
  const { book, parts, plan } = on;
  const eachEnds = all('e', columns.map(({ ends }) => ends));
  const ends = book.note({ id: 'ends', name: 'ends in all', formula: sumOf(eachEnds), inputs: eachEnds, value: plan.ends, unit: 'count', ...RULES.count });
  book.note({ id: 'cords', name: 'folded cords in all', formula: 'E / 2', inputs: [from('E', ends)], value: plan.cords, unit: 'count', ...RULES.count });
  const foot = noteSections(on, 'foot', { ends, diameter: known(columns[0]).diameter }, parts.foot, plan.foot);
  const heights = all('h', columns.map(({ height }) => height));
  const longest = book.note({ id: 'longestMm', name: 'height of the longest column', formula: `max(${heights.map(({ symbol }) => symbol).join(', ')})`, inputs: heights, value: Math.max(...heights.map(({ value }) => Number(value))), unit: 'mm', ...RULES.arithmetic });
  const own = all('h', foot.map(({ height }) => height));
  const footHeight = own.length === 0 ? undefined : book.note({ id: 'footMm', name: 'height of the foot', formula: sumOf(own), inputs: own, value: total(own), unit: 'mm', ...RULES.arithmetic });
  const stacked = footHeight === undefined ? [from('h', longest)] : [from('h', longest), from('f', footHeight)];
  book.note({ id: 'heightMm', name: 'from the rod to the tips', formula: sumOf(stacked), inputs: stacked, value: plan.heightMm, unit: 'mm', ...RULES.arithmetic });
  const knots = all('n', [...columns.flatMap(({ sections }) => sections), ...foot].flatMap((section) => section.knots ?? []));
  book.note({ id: 'knots', name: 'knots in all', formula: sumOf(knots), inputs: knots, value: plan.knots, unit: 'count', ...RULES.arithmetic });
  const wide = columns.map(({ ends: hanging, diameter }, at) => ({ formula: `e${String(at)} * s * d${String(at)}`, inputs: [from(`e${String(at)}`, hanging), from(`d${String(at)}`, diameter)] }));
  const gaps = wide.length === 1 ? '' : ` + ${String(wide.length - 1)} * g * max(${wide.map((_, at) => `d${String(at)}`).join(', ')})`;
  book.note({
    id: 'widthMm', name: 'width where it is knotted', formula: `${wide.map(({ formula }) => formula).join(' + ')}${gaps}`,
    inputs: [...wide.flatMap(({ inputs }) => inputs), standing({ symbol: 's', name: 'from end to end, in diameters', value: END_SPACING, unit: 'ratio' }, PRACTICE), ...(gaps === '' ? [] : [standing({ symbol: 'g', name: 'between two columns, in diameters', value: COLUMN_GAP, unit: 'ratio' }, PRACTICE)])],
    value: plan.widthMm, unit: 'mm', ...RULES.euclid,
  });
  return { foot, longest, ...(footHeight === undefined ? {} : { footHeight }) };
}

function rodThickness({ parts: { rod }, fields }: Explained): WorkingInput {
  const number = { symbol: 'r', name: 'thickness of what it hangs from', unit: 'mm' } as const;
  if (rod.kind === 'rod') return given({ ...number, value: rod.diameterMm }, '/rod/diameterMm', 'measured');
  if (fields.group('rod', 'Rod').has('thickMm') && rod.thickMm !== undefined) return given({ ...number, value: rod.thickMm }, '/rod/thickMm', 'measured');
  return standing({ ...number, value: 8 }, { source: 'common practice: a ring of wood', trust: 'practice' });
}

const isKnotted = ({ technique }: NotedSection): boolean => technique === 'square-knots' || technique === 'alternating' || technique === 'half-hitches';

/** What to cut for each cord of a column, and what the rule of practice would cut; answers the first. */
function noteCut(on: Explained, { diameter, height, sections }: NotedColumn, index: number, { longest, footHeight }: ReturnType<typeof noteWhole>): Working {
  const { book, fields, parts, plan } = on;
  const [id, own] = [`columns.${String(index)}`, known(plan.columns[index])];
  const plain = footHeight && book.note({
    id: `${id}.plainMm`, name: 'cord that hangs plain below the column', formula: 'L - h + f', inputs: [from('L', longest), from('h', height), from('f', footHeight)], value: longest.value - height.value + footHeight.value, unit: 'mm', ...RULES.arithmetic,
  });
  const [works, fills, hangs] = [all('w', sections.map(({ worker }) => worker)), all('f', sections.map(({ filler }) => filler)), plain === undefined ? [] : [from('p', plain)]];
  const more = plain === undefined ? '' : ' + p';
  const end = book.note({ id: `${id}.endMm`, name: 'the longer of a working end and one that is knotted round', formula: `max(${sumOf(works)}, ${sumOf(fills)})${more}`, inputs: [...works, ...fills, ...hangs], value: Math.max(total(works), total(fills)) + total(hangs), unit: 'mm', ...RULES.arithmetic });
  const thick = rodThickness(on);
  const head = book.note({ id: `${id}.larksHeadMm`, name: 'cord of the lark’s head', formula: '2 * pi * (r + 2 * d)', inputs: [thick, from('d', diameter)], value: larksHead(Number(thick.value), diameter.value), unit: 'mm', ...RULES.euclid });
  const tail = { symbol: 't', name: 'to hold at every end', value: parts.tailMm, unit: 'mm' } as const;
  const held = fields.optionalGroup('allowances', 'Allowances')?.has('tailMm') === true ? given(tail, '/allowances/tailMm', 'measured') : standing({ ...tail, value: TAIL_MM }, DEFAULTS.tailMm);
  const heights = all('h', sections.map((section) => section.height));
  const sumWhere = (knotted: boolean): string => heights.filter((_, at) => sections[at] !== undefined && isKnotted(sections[at]) === knotted).map(({ symbol }) => symbol).join(' + ') || '0';
  book.note({ id: `${id}.ruleMm`, name: 'the same by the rule of four times the knotted length', formula: `2 * (4 * (${sumWhere(true)}) + ${sumWhere(false)}${more})`, inputs: [...heights, ...hangs], value: own.ruleMm, unit: 'mm', ...PRACTICE });
  return book.note({ id: `${id}.cutMm`, name: 'length to cut each cord', formula: 'k + 2 * (l + t)', inputs: [from('k', head), from('l', end), held], value: own.cutMm, unit: 'mm', ...RULES.arithmetic });
}

/** The cords of gathering knots, each with its role: `own` where the knot says none. */
function gatheringCords(sections: readonly NotedSection[], asked: readonly Section[], own: string): { readonly role: string; readonly cord: Working }[] {
  return sections.flatMap(({ cord }, at) => {
    const section = asked[at];
    return cord === undefined || section?.technique !== 'gathering' ? [] : [{ role: section.yarn ?? own, cord }];
  });
}

/** Every cord of a role: those that hang, and those of its gathering knots. */
function noteYarns(on: Explained, columns: readonly NotedColumn[], cuts: readonly Working[], foot: readonly NotedSection[]): readonly Working[] {
  const { book, fields, parts, plan } = on;
  const margin = { symbol: 'M', name: 'margin', value: parts.margin, unit: 'share' } as const;
  const bought = fields.optionalGroup('allowances', 'Allowances')?.has('margin') === true ? given(margin, '/allowances/margin', 'measured') : standing({ ...margin, value: DEFAULT_ALLOWANCES.marginWarp }, PRACTICE);
  const gathering = [...columns.flatMap(({ sections, role }, at) => gatheringCords(sections, known(parts.columns[at]).sections, role)), ...gatheringCords(foot, parts.foot, known(columns[0]).role)];
  return [...parts.cords].map(([role, cord]) => {
    const own = known(plan.yarns[role]);
    const hung = columns.flatMap(({ role: of, cords }, at) => (of === role ? [{ formula: `n${String(at)} * l${String(at)}`, inputs: [from(`n${String(at)}`, cords), from(`l${String(at)}`, known(cuts[at]))] }] : []));
    const wrapped = all('g', gathering.filter((one) => one.role === role).map((one) => one.cord));
    const terms = [...hung.map(({ formula }) => formula), ...wrapped.map(({ symbol }) => symbol)];
    const net = book.note({ id: `yarns.${role}.netMm`, name: 'cord of the piece, without margin', formula: terms.join(' + ') || '0', inputs: [...hung.flatMap(({ inputs }) => inputs), ...wrapped], value: own.netMm, unit: 'mm', ...RULES.arithmetic });
    return noteBought(book, { id: `yarns.${role}`, path: below('/yarns', role), ball: cord.ball, net, tex: known(on.texes.get(role)), margin: bought, plan: own });
  });
}

function noteRod({ book, parts: { rod }, plan }: Explained, mass: Working): void {
  if (rod.kind !== 'rod' || plan.rod === undefined) return;
  const width = known(book.workings.find(({ id }) => id === 'widthMm'));
  const length = book.note({
    id: 'rod.lengthMm', name: 'length of the rod', value: plan.rod.lengthMm, unit: 'mm', ...RULES.arithmetic,
    ...(rod.lengthMm === undefined
      ? { formula: 'w + 2 * o', inputs: [from('w', width), standing({ symbol: 'o', name: 'rod beyond the knots', value: HANGING.overhangMm, unit: 'mm' }, DEFAULTS.overhang)] }
      : { formula: 'l', inputs: [given({ symbol: 'l', name: 'length of the rod', value: rod.lengthMm, unit: 'mm' }, '/rod/lengthMm', 'measured')] }),
  });
  noteLeastRod(book, 'rod.minDiameterMm', 'thinnest rod that does not sag', from('m', mass), from('s', length), plan.rod.minDiameterMm);
}

function noteWork({ book, plan }: Explained, columns: readonly NotedColumn[], foot: readonly NotedSection[]): void {
  const sections = [...columns.flatMap((column) => column.sections), ...foot];
  const work = (id: string, name: string, ...techniques: readonly Section['technique'][]): Working => {
    const knots = all('n', sections.flatMap(({ technique, knots: own }) => (own !== undefined && techniques.includes(technique) ? [own] : [])));
    return book.note({ id: `work.${id}`, name, formula: sumOf(knots), inputs: knots, value: total(knots), unit: 'count', ...RULES.arithmetic });
  };
  const cords = known(book.workings.find(({ id }) => id === 'cords'));
  noteHoursInAll(book, plan.hours, 'c / u + s / v + h / w + g * a + f', [
    from('c', cords), pace('u', 'cords cut and hung in an hour', KNOTTING_PACE.cordsPerHour),
    from('s', work('squareKnots', 'square knots', 'square-knots', 'alternating')), pace('v', 'square knots in an hour', KNOTTING_PACE.knotsPerHour),
    from('h', work('hitches', 'double half hitches', 'half-hitches')), pace('w', 'double half hitches in an hour', KNOTTING_PACE.hitchesPerHour),
    from('g', work('gathering', 'gathering knots', 'gathering')), pace('a', 'hours of a gathering knot', KNOTTING_PACE.gatheringHours, 'h'),
    pace('f', 'hours of drawing level and finishing', KNOTTING_PACE.finishingHours, 'h'),
  ]);
}

export function noteMacrame(book: Notebook, fields: Fields): boolean {
  const parts = readPiece(fields);
  const plan = parts && reckonMacrame(parts, fields.findings);
  if (parts === undefined || plan === undefined) return false;
  const on: Explained = { book, fields, parts, plan, ...noteCords(book, fields, parts) };
  const columns = noteColumns(on);
  const whole = noteWhole(on, columns);
  const cuts = columns.map((column, index) => noteCut(on, column, index, whole));
  const masses = all('m', noteYarns(on, columns, cuts, whole.foot));
  const mass = book.note({ id: 'massG', name: 'mass of the finished piece', formula: sumOf(masses), inputs: masses, value: plan.massG, unit: 'g', ...RULES.arithmetic });
  noteRod(on, mass);
  noteWork(on, columns, whole.foot);
  return true;
}

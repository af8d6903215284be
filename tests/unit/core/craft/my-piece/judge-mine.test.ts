import { describe, expect, test } from 'vitest';
import { chosenLoom, judgeMine, placed, waysOf, type MineJudgement } from '#core/craft/my-piece/judge-mine.ts';
import { asPattern, inOtherUnits, leftOutBy, mineOfFields, typeMine, wayOf } from '#core/craft/my-piece/typed-mine.ts';
import { lowTide } from '../../../../support/low-tide.ts';

const pattern = await lowTide();
type Fields = Readonly<Record<string, string>>;
const typed = (fields: Fields) => mineOfFields((name) => fields[name], pattern);
const judge = (fields: Fields, of = pattern): MineJudgement => judgeMine(typed(fields), of);
/** What she has of her own; throws where something stands in the way. */
const mineOf = (fields: Fields, of = pattern) => {
  const judged = judge(fields, of);
  if (!judged.ok) throw new Error(JSON.stringify(judged.problems));
  return judged.mine;
};
/** Field and sentence of every problem, each as often as it is told. */
const told = (fields: Fields): string[] => {
  const judged = judge(fields);
  return judged.ok ? [] : judged.problems.map(({ field, says: sentence }) => `${field}: ${sentence.replaceAll('\u00a0', ' ')}`);
};
const says = (fields: Fields): Readonly<Record<string, string>> => {
  const judged = judge(fields);
  return judged.ok ? {} : Object.fromEntries(judged.problems.map(({ field, says: sentence }) => [field, sentence]));
};

describe('lengths as people type them', () => {
  test.each([
    ['36', 'cm', 360], ['36,5', 'cm', 365], ['36.5', 'cm', 365], ['14 7/8', 'in', 377.825], ['360 mm', 'in', 360],
  ])('%s in %s', (text, units, mm) => {
    const judged = judge({ insideWidthMm: text, units, shown: units, widthMm: '20 cm' });
    expect(judged).toMatchObject({ ok: true, mine: { loom: { insideWidthMm: mm } } });
  });

  test('what stays empty is as in the pattern', () => {
    expect(mineOf({ endsTogether: '1', warping: 'zigzag', kind: 'nailed-frame', insideWidthMm: '  ', 'woven.rows': ' ' })).toEqual({});
    expect(mineOf({ endsTogether: 'three', warping: 'round and round' })).toEqual({});
  });
});

describe('impossible looms are told at the field, with what works', () => {
  test.each([
    ['insideWidthMm', '3 mm', 'Too narrow for a frame. Between 5\u00a0cm and 300\u00a0cm works.'],
    ['insideWidthMm', '30 m', 'Too wide for a frame. Between 5\u00a0cm and 300\u00a0cm works.'],
    ['insideHeightMm', '2', 'Too low for a frame. Between 10\u00a0cm and 300\u00a0cm works.'],
    ['nailPitchMm', '40', 'Too far apart to weave on. Between 2\u00a0mm and 25\u00a0mm works.'],
    ['insideWidthMm', 'as wide as my arm', 'Write one length, like 12.5 or 4 7/8.'],
    ['nailPitchMm', '-8', 'A length cannot be below 0.'],
  ])('%s %s', (field, text, sentence) => {
    expect(says({ [field]: text })).toEqual({ [field]: sentence });
  });

  test.each([['insideHeightMm', '300', 'cm'], ['insideHeightMm', '120', 'in'], ['insideWidthMm', '300', 'cm'], ['nailPitchMm', '2', 'cm']])('%s of %s %s is the last that may be', (field, text, units) => {
    expect(judge({ [field]: text, units, shown: units }).ok).toBe(true);
  });

  test('the narrowest frame there may be is only too narrow for this piece', () => {
    expect(told({ insideWidthMm: '5' })).toEqual(['insideWidthMm: The loom is 50 mm inside. The piece needs 45 cm. No width fits at this spacing.']);
  });

  test('what else she typed is made up all the same', () => {
    expect(judge({ nailPitchMm: 'y' })).toMatchObject({ ok: false, fitted: { piece: { size: { widthMm: 400 } } } });
    expect(judge({ insideWidthMm: '28' })).not.toHaveProperty('fitted');
  });

  test('a loom too narrow for the piece says how wide it may be', () => {
    expect(says({ insideWidthMm: '28' })['insideWidthMm']).toMatch(/^The loom is 28\scm inside\. .* up to [\d.]+\scm fit\.$/);
  });

  test('several slips are told at once', () => {
    expect(Object.keys(says({ insideWidthMm: 'x', nailPitchMm: 'y', 'yarns.shore.by': 'tex' })).sort()).toEqual(['insideWidthMm', 'nailPitchMm', 'yarns.shore.grist']);
  });
});

describe('her own yarn', () => {
  const yarn = (by: string, grist: string, more: Fields = {}) => judge({ 'yarns.water.by': by, 'yarns.water.grist': grist, ...more });

  test.each([
    ['metresPer100g', '300', { metresPer100g: 300 }],
    ['tex', '333,5', { tex: 333.5 }],
    ['nm', '2/6', { count: { text: '2/6', system: 'nm' } }],
    ['ne-cotton', '8/2', { count: { text: '8/2', system: 'ne-cotton' } }],
  ])('by %s', (by, grist, expected) => {
    expect(yarn(by, grist)).toMatchObject({ ok: true, mine: { yarns: { water: expected } } });
  });

  // 300 tex: grams in a kilometre, a tenth of them in 100 m, nine and ten times as many in nine and ten kilometres; and
  // 590.541, 885.811, 1653.515, 310.034 and 1937.7 over it, as the hanks of 840, 560, 300, 1600 and 256 yards in a pound.
  test.each([
    ['tex', '300'], ['metresPer100g', '333.333'], ['nm', '3.33333'], ['denier', '2700'], ['dtex', '3000'], ['ne-cotton', '1.96847'], ['ne-worsted', '2.95270'],
    ['lea', '5.51172'], ['run', '1.03345'], ['yorkshire', '6.45900'], ['jute', '8.70766'],
  ])('of one thickness takes one length and weight, also by %s', (by, grist) => {
    const [mine, asTex] = [yarn(by, grist), yarn('tex', '300')];
    const of = (judged: typeof mine) => (judged.ok ? judged.fitted.plan.yarns['water'] : undefined);
    expect(of(mine)?.netMm).toBeCloseTo(of(asTex)?.netMm ?? 0, -1);
    expect(of(mine)?.massG).toBeCloseTo(of(asTex)?.massG ?? 0, 1);
  });

  test('may be the warp, which no other yarn’s amount but its own take-up follows', () => {
    const judged = judge({ 'warp.yarn.by': 'tex', 'warp.yarn.grist': '200', 'warp.yarn.label': 'Attic twine' });
    expect(judged).toMatchObject({ ok: true, mine: { warpYarn: { tex: 200, label: 'Attic twine' } } });
    expect(judged.ok && judged.fitted.plan.warp.massG / judged.fitted.plan.warp.netMm).toBeCloseTo(200 / 1e6, 12);
    expect(judged.ok && judged.fitted.changes).toContain('Attic twine is the warp.');
    expect(says({ 'warp.yarn.by': 'tex', 'warp.yarn.grist': '1e9' })['warp.yarn.grist']).toContain('works');
    expect(says({ 'warp.yarn.by': 'nm', 'warp.yarn.grist': '' })).toEqual({ 'warp.yarn.grist': expect.stringContaining('missing') });
  });

  test('with a ball of its own is rounded up to whole balls; half a ball’s label is asked for the other half', () => {
    const balls = { 'yarns.water.ball.metres': '50', 'yarns.water.ball.grams': '25' };
    const judged = yarn('tex', '300', balls);
    const of = judged.ok ? judged.fitted.plan.yarns['water'] : undefined;
    expect(of?.balls).toBe(Math.ceil((of?.withMarginMm ?? 0) / 50_000));
    expect(Object.keys(says({ 'yarns.water.by': 'tex', 'yarns.water.grist': '300', 'yarns.water.ball.metres': '50' }))).toEqual(['yarns.water.ball.grams']);
  });

  test('by wraps alone, where there is no label', () => {
    const judged = yarn('wraps', '', { 'yarns.water.wrapsPerInch': '16' });
    expect(judged).toMatchObject({ ok: true, mine: { yarns: { water: { wrapsPerInch: 16 } } } });
  });

  test('a count that is none, and a yarn that cannot be, are told at the field', () => {
    expect(says({ 'yarns.water.by': 'nm', 'yarns.water.grist': 'thick' })['yarns.water.grist']).toContain('is not a count');
    expect(says({ 'yarns.water.by': 'tex', 'yarns.water.grist': '0' })['yarns.water.grist']).toContain('works');
  });

  test('a slip is told once, in words for its own field', () => {
    expect(told({ 'yarns.sand.by': 'wraps', 'yarns.sand.wrapsPerInch': 'many', 'yarns.water.by': 'tex', 'yarns.green.by': 'tex', 'yarns.green.grist': '300', 'yarns.green.strands': 'two' })).toEqual([
      'yarns.water.grist: Tex is missing.',
      'yarns.sand.wrapsPerInch: “many” is no number. Write it like 12 or 12.5.',
      'yarns.green.strands: “two” is no number. Write it like 12 or 12.5.',
    ]);
  });

  test('a role the pattern does not have is not read', () => {
    expect(mineOf({ 'yarns.__proto__.by': 'tex', 'yarns.other.by': 'tex' })).toEqual({});
  });
});

describe('a loom of another size', () => {
  const LOW = { insideHeightMm: '42', units: 'cm', shown: 'cm' };

  test('is refused at its field until a way is chosen', () => {
    expect(Object.keys(says(LOW))).toEqual(['insideHeightMm']);
    expect(judge({ ...LOW, way: 'as-it-is' }).ok).toBe(false);
  });

  test.each(['leave-last', 'leave-first', 'scaled'])('is fitted by %s, which is kept with its measures and comes back the same', (way) => {
    const judged = judge({ ...LOW, way });
    if (!judged.ok) throw new Error(JSON.stringify(judged.problems));
    expect(judged.mine.way?.kind).toBe(way === 'scaled' ? 'scaled' : 'fewer-bands');
    expect(judged.fitted.plan.loom.heightNeededMm).toBeLessThanOrEqual(420);
    const again = judgeMine(typeMine(judged.mine, pattern, 'cm'), pattern);
    expect(again.ok && again.mine).toEqual(judged.mine);
  });

  test('leaves out the bands she ticks, and says so when that is not enough', () => {
    const judged = judge({ ...LOW, way: 'leave-chosen', 'leaveOut.dunes': 'yes' });
    expect(judged).toMatchObject({ ok: true, mine: { way: { kind: 'fewer-bands', leaveOut: ['dunes'] } } });
    expect(says({ ...LOW, way: 'leave-chosen' })['way']).toBe('Tick the bands you would rather do without.');
    expect(says({ ...LOW, insideHeightMm: '30', way: 'leave-chosen', 'leaveOut.foot': 'yes' })['insideHeightMm']).toContain('Choose other bands');
  });

  test('a way that does not help is refused with the reason', () => {
    expect(says({ ...LOW, way: 'doubled' })['insideHeightMm']).toContain('The loom is 42 cm high inside.');
  });

  test('shows every way there is, with what it comes to, and the bands that can be ticked', () => {
    const { mine, ways } = waysOf(typed({ ...LOW, way: 'leave-last' }), pattern);
    expect(mine).toEqual({ loom: { insideHeightMm: 420 } });
    expect(ways.map(({ id }) => id)).toEqual(expect.arrayContaining(['as-it-is', 'leave-last', 'leave-first', 'leave-chosen', 'scaled']));
    expect(leftOutBy(typed({ 'leaveOut.dunes': 'yes', 'leaveOut.foot': 'no', 'leaveOut.nothing': 'yes' }), pattern)).toEqual(['dunes']);
  });

  test('keeps the bands she ticked in her form, and forgets them with the rest where all is as the pattern', () => {
    const kept = typeMine({ way: { kind: 'fewer-bands', leaveOut: ['dunes'], heightMm: 300 } }, pattern, 'cm');
    expect(kept.texts).toMatchObject({ way: 'leave-chosen', 'leaveOut.dunes': 'yes' });
    // From an end, the reckoning says which: nothing is ticked.
    expect(Object.keys(typeMine({ way: { kind: 'fewer-bands', leaveOut: ['dunes'], from: 'last' } }, pattern, 'cm').texts)).not.toContain('leaveOut.dunes');
    expect(wayOf(asPattern(kept, pattern))).toBe('as-it-is');
    expect(wayOf({ ...kept, texts: { way: 'by-magic' } })).toBe('as-it-is');
  });

  test('a way that the loom does not call for any more falls away', () => {
    expect(judge({ way: 'narrower' })).toMatchObject({ ok: true, mine: {} });
  });

  test('narrower makes it as wide as the loom holds', () => {
    const judged = judge({ insideWidthMm: '28', nailPitchMm: '8', endsTogether: '2', way: 'narrower' });
    expect(judged.ok && judged.fitted.plan.loom.insideWidthNeededMm).toBeLessThanOrEqual(280);
  });
});

describe('a piece that is half woven', () => {
  const WOVEN = { 'woven.bandsDone': '7' };
  const rest = (fields: Fields) => {
    const judged = judge(fields);
    if (!judged.ok || judged.halfway === null) throw new Error('no rest was reckoned');
    return judged.halfway;
  };

  test('says nothing of a rest while nothing is said of what is woven', () => {
    expect(judge({ 'woven.bandsDone': '0' })).toMatchObject({ ok: true, halfway: null });
  });

  test('the rest has fewer rows with every row that is woven', () => {
    expect(rest({ ...WOVEN, 'woven.rows': '0' }).rest.rows - rest({ 'woven.bandsDone': '6', 'woven.rows': '40' }).rest.rows).toBeLessThan(0);
  });

  test('what she measured counts for more than the plan', () => {
    expect(rest(WOVEN).rest.trust).toBe('formula');
    const measured = rest({ ...WOVEN, 'woven.heightMm': '30' }).rest;
    expect(measured.trust).toBe('measured');
    expect(measured.picksPerCm).toBeLessThan(rest(WOVEN).rest.picksPerCm);
  });

  test('a height alone does not say what is woven, so she is asked', () => {
    const asked = 'woven.heightMm: Say above how far you are: which bands are finished, or how many rows are woven.';
    expect(told({ 'woven.heightMm': '10' })).toEqual([asked]);
    expect(told({ 'woven.heightMm': '10', 'woven.bandsDone': '1', 'woven.rows': '2' })).toEqual([]);
    expect(told({ 'woven.heightMm': '0' })).toEqual([]);
    expect(told({ 'woven.heightMm': '10', 'woven.rows': 'x' })).toEqual(['woven.rows: “x” is no number. Write it like 12 or 12.5.']);
  });

  test('more finished bands than there are is told at the field, beside the piece that stands', () => {
    const judged = judge({ 'woven.bandsDone': '15' });
    expect(judged).toMatchObject({ ok: false, problems: [{ field: 'woven.bandsDone', code: 'E_RANGE' }], fitted: { piece: { size: { widthMm: 400 } } } });
  });

  test('ounces and inches come out as grams and millimetres, and go back into the form as they were typed', () => {
    const fields = { ...WOVEN, 'woven.heightMm': '11 1/2', 'woven.left.water': '1.5', units: 'in', shown: 'in' };
    const { woven } = rest(fields);
    expect(woven.heightMm).toBeCloseTo(292.1, 6);
    expect(woven.leftG?.['water']).toBeCloseTo(42.524, 3);
    expect(typeMine({}, pattern, 'in', woven).texts).toMatchObject({ 'woven.heightMm': '11 1/2', 'woven.left.water': '1.5' });
    const inCm = inOtherUnits(typed(fields), 'cm');
    expect(inCm.texts['woven.heightMm']).toBe('11 1/2 in');
  });

  test('yarn that was weighed is judged even before the first row', () => {
    expect(rest({ 'woven.left.water': '1' }).warnings).toMatchObject([{ code: 'W_SHORT', path: '/leftG/water' }]);
  });
});

describe('what she chose of her loom', () => {
  const chosen = (texts: Fields) => chosenLoom({ texts });

  test('is heard where her kind of loom has it', () => {
    expect(chosen({ kind: 'two-row-frame', nailRows: 'inner', warping: 'zigzag' })).toEqual({ kind: 'two-row-frame', nailRows: 'inner', warping: 'zigzag' });
    expect(chosen({ kind: 'nailed-frame', nailRows: 'inner', warping: 'two-nail' })).toEqual({ kind: 'nailed-frame', warping: 'two-nail' });
    expect(chosen({ kind: 'backstrap', nailRows: 'outer', warping: 'round' })).toEqual({});
  });

  test('goes into her piece only where it is not the pattern’s own', () => {
    expect(mineOf({ kind: 'nailed-frame', endsTogether: '' })).toEqual({});
    const rows = { ...pattern, loom: { ...pattern.loom, kind: 'two-row-frame' as const, nailPitchMm: 20 } };
    expect(mineOf({ kind: 'two-row-frame', nailRows: 'both' }, rows)).toEqual({});
    expect(mineOf({ kind: 'two-row-frame', nailRows: 'both' }, { ...rows, loom: { ...rows.loom, nailRows: 'inner' } })).toEqual({ loom: { nailRows: 'both' } });
    const pairs = { ...pattern, loom: { ...pattern.loom, nailPitchMm: 5 }, warp: { ...pattern.warp, endsTogether: 2 as const } };
    expect([mineOf({}, pairs), mineOf({ endsTogether: '2' }, pairs), mineOf({ endsTogether: '1', nailPitchMm: '10' }, pairs)]).toEqual([{}, {}, { loom: { nailPitchMm: 10 }, endsTogether: 1 }]);
    const judged = judge({ kind: 'two-row-frame', nailRows: 'inner' });
    expect(judged.ok && judged.mine.loom).toEqual({ kind: 'two-row-frame', nailRows: 'inner' });
  });
});

test.each([
  ['/warp/endsTogether', 'endsTogether'], ['/warp/parity', 'endsTogether'], ['/warp/endCount', 'endsTogether'], ['/warp/yarn', 'warp.yarn.grist'],
  ['/yarns/water', 'yarns.water.grist'], ['/yarns/water/tex', 'yarns.water.grist'], ['/yarns/water/strands', 'yarns.water.strands'], ['/yarns/water/wrapsPerInch', 'yarns.water.wrapsPerInch'],
  ['/yarns/ash/tex', ''], ['/yarns', ''], ['/bands/water/strands', ''], ['/bands', 'way'], ['/loom', 'way'], ['/loom/kind', 'kind'], ['/size/widthMm', 'widthMm'], ['/size/heightMm', ''], ['/rows', 'woven.rows'],
])('what is said of %s stands at the field “%s”, once', (path, field) => {
  const problem = { code: 'E_RANGE', path, message: 'Too much.' };
  expect(placed([problem, problem], pattern)).toEqual([{ field, says: 'Too much.', code: 'E_RANGE' }]);
});

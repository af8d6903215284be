/** What a piece's form shows and says, field by field, as it was found right. That a piece comes back the same is for `round-trip.test.ts`. */
import { describe, expect, test } from 'vitest';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { askedOfMode, fringeAsked, MODE, FINISH, ALLOWANCES } from '#core/craft/piece-form/asked-of-piece.ts';
import { bandFields, shapeFields } from '#core/craft/piece-form/asked-of-band.ts';
import { ashenhurstOf, gristAsked } from '#core/craft/piece-form/asked-of-yarn.ts';
import { changeTyped, readAct, typeIn } from '#core/craft/piece-form/change-typed.ts';
import { fieldOfPlace, fieldsOfTyped, typedOfFields } from '#core/craft/piece-form/field-names.ts';
import { fieldText, fieldUnit, missingSays, readText } from '#core/craft/piece-form/field-text.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { emptyForm, typePiece } from '#core/craft/piece-form/type-piece.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { expectKept } from '../../../../support/kept.ts';
import { pieceOf, pieceWith, PLAIN_PIECE } from '../a-piece.ts';
import { loom, WOVEN_PIECES } from '../frame-loom/woven-pieces.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/piece-form/${name}.json`, import.meta.url);
const fieldLines = (typed: TypedPiece): string[] => [...fieldsOfTyped(typed)].filter(([, text]) => text !== '').map(([field, text]) => `${field}: ${text}`);

const SHAPES = [
  { shape: 'triangle', yarn: 'ground', baseMm: 80, heightMm: 60, centreMm: 60, leanMm: -12, join: 'dovetail' }, { shape: 'circle', yarn: 'sand', radiusMm: 30, centreMm: 150, bottomMm: 5, join: 'interlock' },
  { shape: 'rectangle', yarn: 'sand', baseMm: 40, heightMm: 30, centreMm: 250, symmetric: false }, { shape: 'points', yarn: 'sand', points: [{ xMm: -5, yMm: 0 }, { xMm: 60, yMm: 0 }, { xMm: 30, yMm: 25.4 }], leanMm: 0 },
] as const;
const BANDS: readonly Band[] = [
  { technique: 'tabby', name: 'hill', yarn: 'ground', heightMm: 100, strands: 2, shapes: SHAPES }, { technique: 'soumak', name: 'ridge', yarn: 'sand', over: 4, back: 2, rows: 3, tabbyBetween: 2, tabbyYarn: 'ground' },
  { technique: 'rya', name: 'fringe', yarn: 'sand', strands: 3, legEnds: 1, edgeEnds: 2, pileMm: 100, trimMm: 10, rows: 2, heightMm: 12 }, { technique: 'roving', yarn: 'sand', over: 4, bulgeMm: 12, heightMm: 40, passes: 2 },
  { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 }, { technique: 'loop-pile', yarn: 'sand', rodMm: 8, rows: 2, heightMm: 20 }, { technique: 'twining', yarn: 'sand', rows: 2, endsPerTwist: 2 },
];
/** Everything a form may ask. */
const RICH: FrameLoomPiece = {
  ...pieceOf(...BANDS), ...loom({ insideHeightMm: 800, insideWidthMm: 500, everyNthNail: 1, nailDiameterMm: 2, kind: 'two-row-frame', nailRows: 'inner' }), size: { widthMm: 300, heightMm: 500 },
  warp: { yarn: { tex: 400, label: 'Fenwool warp', ball: { metres: 250, grams: 100 } }, parity: 'even', endsTogether: 1, tieMm: 150 },
  yarns: { ground: { metresPer100g: 180, wrapsPerInch: 10, colour: '#2f5366' }, sand: { count: { text: '2/6', system: 'nm' }, strands: 2, ashenhurstK: 0.84, fibre: 'wool' } },
  dowel: { diameterMm: 12, lengthMm: 380, fixing: 'tied' }, finish: { bottom: 'knotted', fringeMm: 60, bundleEnds: 4 }, hangs: 'turned', seed: 7, beat: { picksPerCm: 6 },
  allowances: { drawIn: 0.02, relaxation: 0.025, wetShrinkage: 0, topMm: 60, bottomMm: 160, tailMm: 50, loadMm: 8000, marginWeft: 0.15, marginWarp: 0.1 },
};
const PIECES: Readonly<Record<string, FrameLoomPiece>> = {
  ...WOVEN_PIECES, 'everything a form may ask': RICH, 'bands of a class, a count and a beat of its own': pieceWith({ yarns: { ground: { class: 4 }, spare: { count: { text: '8/2', system: 'ne-cotton' } } }, beat: { picksPerWeftDiameter: 0.83 } }),
  'inches that come out even, and some that do not': pieceWith({ size: { widthMm: 12.5 * 25.4, heightMm: 400.1 }, ...loom({ nailPitchMm: 25.4 / 4, insideHeightMm: 520.123 }), allowances: { loadMm: 9144, drawIn: 0.0333, topMm: 50.8 } }),
};

describe('the fields of a piece', () => {
  const plain = { cm: new Set(fieldLines(typePiece(PLAIN_PIECE, 'cm'))), in: new Set(fieldLines(typePiece(PLAIN_PIECE, 'in'))) };
  test.each(['cm', 'in'] as const)('plain, in %s', (units) => {
    expectKept(file('fields'), `plain, ${units}`, [...plain[units]]);
  });

  test.each(Object.entries(PIECES).filter(([name]) => name !== 'plain'))('%s, where they differ from the plain one’s', (name, piece) => {
    for (const units of ['cm', 'in'] as const) expectKept(file('fields'), `${name}, ${units}`, fieldLines(typePiece(piece, units)).filter((line) => !plain[units].has(line)));
  });
});

describe('every field of a form', () => {
  const form = typePiece(RICH, 'cm');
  const said = (typed: TypedPiece): string[] => {
    const judged = judgeTyped(typed);
    return judged.ok ? judged.warnings.map(({ field, says, code = '' }) => `fits; ${code} ${field}: ${says}`) : judged.problems.map(({ field, says, kind }) => `${kind} ${field}: ${says}`);
  };
  const asItIs = new Set(said(form));

  test('together they are a piece, with what it is warned of', () => {
    expectKept(file('slips'), 'as it is', [...asItIs]);
    expect(judgeTyped(form).ok).toBe(true);
  });

  test.each(['', 'x', '-1', '0', '99999'])('with “%s” typed into it', (text) => {
    const told = [...fieldsOfTyped(form).keys()].filter((field) => field !== 'units' && !field.endsWith('.id')).flatMap((field) => said(typeIn(form, field, text)).filter((line) => !asItIs.has(line)).map((line) => `${field} → ${line}`));
    expectKept(file('slips'), `“${text}”`, told);
  });

  test('with blanks in it is as if nothing stood there', () => {
    for (const field of ['size.widthMm', 'beat.picksPerCm', 'warp.yarn.grist', 'warp.yarn.ball.grams', 'yarns.0.role', 'yarns.1.ball.metres', 'dowel.diameterMm', 'bands.0.heightMm', 'bands.0.shapes.1.radiusMm', 'bands.1.tabbyYarn']) {
      expect(said(typeIn(form, field, ' ')), field).toEqual(said(typeIn(form, field, '')));
    }
  });

  test('is read in inches where the form says so', () => {
    expectKept(file('slips'), 'the same numbers in inches', said({ ...form, units: 'in' }));
  });

  test('of an empty form, with every choice made by turns', () => {
    const choices = [['beat.by', 'swatch'], ['beat.by', 'own'], ['beat.by', 'ends'], ['yarns.0.by', 'class'], ['yarns.0.by', 'nm'], ['yarns.0.by', 'wraps'], ['bands.0.technique', 'loop-pile'], ['bands.0.technique', 'rya'], ['bands.0.technique', ''], ['yarns.0.role', ''], ['mode', 'given'], ['mode', 'measured'], ['dowel.lengthMm', '40'], ['finish.bottom', 'knotted'], ['warp.yarn.ball.grams', '100']] as const;
    expectKept(file('slips'), 'of an empty form', choices.map(([field, text]) => [`${field} = ${text}`, ...said(typeIn(emptyForm('in'), field, text))]));
  });

  test('two yarns of one role, a yarn without one, and a field of a choice that is not made', () => {
    const two = typeIn(changeTyped(form, { do: 'add-yarn' }), 'yarns.2.role', 'sand');
    expectKept(file('slips'), 'two of one role', said(typeIn(two, 'yarns.2.grist', '300')));
    expectKept(file('slips'), 'a yarn without a role', said(changeTyped(form, { do: 'add-yarn' })));
    expectKept(file('slips'), 'left over from other choices', said(['weftWaveMm', 'takeUp', 'warpTakeUp'].reduce((typed, field) => typeIn(typed, field, 'x'), typeIn(typeIn(typeIn(form, 'loom.kind', 'nailed-frame'), 'finish.bottom', 'tucked'), 'finish.fringeMm', 'x'))));
    expectKept(file('slips'), 'no dowel, but how it is held', said(typeIn(typeIn(form, 'dowel.diameterMm', ' '), 'dowel.lengthMm', '')));
    expectKept(file('slips'), 'wraps with a K that is none', ['0', 'x', '0.84', ''].map((k) => [k, ...said(typeIn(typeIn(typeIn(form, 'yarns.0.by', 'wraps'), 'yarns.0.grist', ''), 'yarns.0.ashenhurstK', k))]));
  });
});

describe('the place of a problem', () => {
  const form = typePiece(RICH, 'cm');
  test.each([
    ['', ''], ['/yarns', 'yarns'], ['/yarns/sand', 'yarns.1.role'], ['/yarns/sand/tex', 'yarns.1.grist'], ['/yarns/sand/count/text', 'yarns.1.grist'], ['/yarns/sand/class', 'yarns.1.grist'], ['/yarns/sand/ball', 'yarns.1.ball.metres'], ['/yarns/sand/ball/grams', 'yarns.1.ball.grams'],
    ['/yarns/ash/tex', 'yarns'], ['/warp', 'warp'], ['/warp/yarn', 'warp.yarn.grist'], ['/warp/yarn/metresPer100g', 'warp.yarn.grist'], ['/warp/yarn/strands', 'warp.yarn.strands'], ['/warp/endCount', 'warp.endCount'],
    ['/beat', 'beat.by'], ['/beat/picksPerCm', 'beat.picksPerCm'], ['/beat/picksPerWeftDiameter', 'beat.by'], ['/bands', 'bands'], ['/bands/0/heightMm', 'bands.0.heightMm'], ['/bands/7/fill', 'bands.7.heightMm'],
    ['/bands/0/shapes/3/points/2/xMm', 'bands.0.shapes.3.points'], ['/bands/0/shapes/3/points', 'bands.0.shapes.3.points'], ['/bands/0/shapes/0/baseMm', 'bands.0.shapes.0.baseMm'], ['/a~1b~0c', 'a/b~c'],
  ])('%s is the field “%s”', (pointer, field) => {
    expect(fieldOfPlace(pointer, form)).toBe(field);
  });

  test('of a beat of one’s own is where it is typed', () => {
    expect(fieldOfPlace('/beat/picksPerWeftDiameter', typeIn(form, 'beat.by', 'own'))).toBe('beat.picksPerWeftDiameter');
    expect(fieldOfPlace('/beat', typeIn(form, 'beat.by', 'own'))).toBe('beat.by');
  });
});

describe('a form that is sent', () => {
  const sent = (fields: Readonly<Record<string, string>>): TypedPiece => typedOfFields((name) => fields[name]);

  test('gives every yarn an id of its own, the one it had where it can', () => {
    const yarn = (...ids: string[]): number[] => sent(Object.fromEntries(ids.map((id, index) => [`yarns.${String(index)}.id`, id]))).yarns.map(({ id }) => id);
    expect(yarn('4', '2', '9')).toEqual([4, 2, 9]);
    expect(yarn('2', '2', '0', '-1', '1.5', 'x', '1e99')).toEqual([2, 3, 4, 5, 6, 7, 8]);
    expect(yarn()).toEqual([]);
  });

  test('holds as many rows as are told one after the other, and no more than a piece may have', () => {
    expect(sent({ 'bands.0.technique': 'tabby', 'bands.2.technique': 'tabby' }).bands).toHaveLength(1);
    const many = typedOfFields((name) => (/technique$|shape$|id$/u.test(name) ? '1' : undefined));
    expect([many.bands.length, many.bands[0]?.shapes.length, many.yarns.length]).toEqual([250, 50, 250]);
    expect([many.bands[249]?.id, many.bands[0]?.shapes[49]?.id]).toEqual([250, 50]);
  });

  test('begins fields of a technique that is new with what is usual, and leaves what was sent', () => {
    expect(sent({ 'bands.0.technique': 'soumak', 'bands.0.yarn': '3', 'bands.0.rows': '9' }).bands[0]?.texts).toEqual({ technique: 'soumak', yarn: '3', over: '4', back: '2', rows: '9', tabbyBetween: '2', tabbyYarn: '3' });
    expect(sent({ 'bands.0.technique': 'rya', units: 'in' }).bands[0]?.texts).toEqual({ technique: 'rya', yarn: '', strands: '3', legEnds: '1', pileMm: '10 cm', trimMm: '1 cm', rows: '1', heightMm: '0.6 cm' });
    expect([sent({ units: 'in' }).units, sent({ units: 'ell' }).units]).toEqual(['in', 'cm']);
  });
});

describe('a text of a field', () => {
  const asked = (kind: string) => ({ key: 'a', label: 'It', kind, options: [{ text: 'a', value: 1, label: 'A' }], maxLength: 9, unit: 'm' }) as unknown as Parameters<typeof fieldText>[1];
  const KINDS = ['length', 'fine', 'yarn', 'lean', 'mass', 'share', 'number', 'points', 'choice', 'text', 'role'] as const;

  test.each(KINDS)('for a %s', (kind) => {
    const values = [0, 1, 12, 12.5, -12, 25.4, 127, 914.4, 1000, 28.349523125, 0.0254, 1 / 3, true, 'x', [{ xMm: -10, yMm: 25.4 }], null];
    const texts = ['12', ' 12,5 ', '−3', '-3', '1 3/4', '12 in', '2 m', '5 oz', '2.5 %', '.5', '5e3', '1e', '0', '-0', '−0', 'x', 'a', '12:3', '-1:2;', '1:x', 'x:1'];
    const told = (['cm', 'in'] as const).map((units) => ({
      unit: fieldUnit(asked(kind), units), missing: missingSays(asked(kind), units), shown: values.map((value) => `${JSON.stringify(value)}: ${fieldText(value, asked(kind), units)}`),
      read: texts.map((text) => `${text}: ${JSON.stringify(readText(text, asked(kind), units)).replace(/^\{"ok":(?:true,"value"|false,"says"):/u, '').replace(/\}$/u, '')}`),
    }));
    expectKept(file('texts'), kind, told);
  });

  test('that is missing is called as sentences call it', () => {
    expect(missingSays({ key: 'a', label: 'Pile', called: 'Length of the pile', kind: 'length' }, 'in')).toBe('Length of the pile is missing. Type it in in.');
  });
});

test('what belongs to a choice is asked with it', () => {
  const form = emptyForm('cm');
  const keys = (asked: readonly { readonly key: string }[]): string[] => asked.map(({ key }) => key);
  expect(['straight-warp', 'balanced', 'given', 'measured'].map((mode) => keys(askedOfMode({ [MODE.key]: mode })))).toEqual([[], [], ['weftWaveMm'], ['takeUp', 'warpTakeUp']]);
  expect(['', 'knotted', 'twisted', 'tucked', 'plain'].map((bottom) => keys(fringeAsked({ [FINISH.key]: bottom })).length)).toEqual([0, 2, 2, 0, 1]);
  expect(['triangle', 'rectangle', 'circle', 'points', ''].map((shape) => keys(shapeFields(shape)).filter((key) => !/^(yarn|centreMm|bottomMm|leanMm|join)$/u.test(key)))).toEqual([['baseMm', 'heightMm', 'symmetric'], ['baseMm', 'heightMm', 'symmetric'], ['radiusMm', 'symmetric'], ['points'], ['baseMm', 'heightMm', 'symmetric']]);
  expect([bandFields('felting'), bandFields('toString')]).toEqual([[], []]);
  expect(['tex', 'metresPer100g', 'class', 'nm'].map((by) => gristAsked(by)).map(({ key, label, kind, called = '' }) => [key, label, kind, called])).toEqual([
    ['grist', 'Tex', 'number', ''], ['grist', 'Metres in 100 g', 'number', ''], ['grist', 'Class, 0 to 7', 'number', 'The class'], ['grist', 'Count', 'text', 'The count'],
  ]);
  expect(['tex', 'metresPer100g'].map((by) => fieldUnit(gristAsked(by), 'cm'))).toEqual(['tex', 'm']);
  expect((['warp', 'weft'] as const).map((use) => ashenhurstOf(use).standard?.(form.texts))).toEqual([ASHENHURST_K.warp, ASHENHURST_K.weft]);
  expect(ALLOWANCES.map(({ key, standard }) => [key.replace('allowances.', ''), standard?.(form.texts)])).toEqual([
    ['drawIn', 0.02], ['relaxation', 0.02], ['wetShrinkage', 0], ['topMm', 40], ['bottomMm', 60], ['tailMm', 50], ['loadMm', 8000], ['marginWeft', 0.15], ['marginWarp', 0.1],
  ]);
});

describe('what hands do', () => {
  test.each([
    ['look', { do: 'look' }], ['add-yarn:3', { do: 'add-yarn' }], ['later:999', { do: 'later', band: 999 }], ['sooner:0', { do: 'sooner', band: 0 }], ['take-out-band:2', { do: 'take-out-band', band: 2 }], ['add-shape:1', { do: 'add-shape', band: 1 }],
    ['later:1000', null], ['later:-2', null], ['take-out-shape:1:x', null], ['take-out-shape:x:1', null], ['take-out-shape:1:2:3', { do: 'take-out-shape', band: 1, shape: 2 }],
  ])('%s is %o', (text, act) => {
    expect(readAct(text)).toEqual(act);
  });

  const form = typePiece(RICH, 'cm');
  test('a shape is added beside those there are, and another is taken out', () => {
    const more = changeTyped(form, { do: 'add-shape', band: 0 });
    expect(more.bands[0]?.shapes.map(({ id, texts }) => [id, texts['shape'], texts['yarn']])).toEqual([[1, 'triangle', '1'], [2, 'circle', '2'], [3, 'rectangle', '2'], [4, 'points', '2'], [5, 'triangle', '2']]);
    expect(changeTyped(more, { do: 'take-out-shape', band: 0, shape: 1 }).bands[0]?.shapes.map(({ id }) => id)).toEqual([1, 3, 4, 5]);
    expect(more.bands.slice(1)).toEqual(form.bands.slice(1));
    expect(changeTyped(more, { do: 'take-out-band', band: 1 }).bands.map(({ id }) => id)).toEqual([1, 3, 4, 5, 6, 7, 8]);
  });

  test('what is typed changes its own field alone', () => {
    expect(typeIn(form, 'yarns.1.label', 'Sand').yarns.map(({ texts }) => texts['label'])).toEqual(['', 'Sand']);
    expect(typeIn(form, 'bands.0.shapes.1.radiusMm', '4').bands[0]?.shapes.map(({ texts }) => texts['radiusMm'])).toEqual([undefined, '4', undefined, undefined]);
    expect(typeIn(form, 'bands.1.rows', '7').bands.map(({ texts }) => texts['rows'])).toEqual([undefined, '7', '2', undefined, undefined, '2', '2', undefined]);
    expect(typeIn(form, 'warp.yarn.grist', '7').warpYarn).toEqual({ ...form.warpYarn, grist: '7' });
    // Only another technique begins anew.
    expect(typeIn(typeIn(form, 'bands.0.technique', 'twining'), 'bands.0.name', 'line').bands[0]?.texts).toMatchObject({ technique: 'twining', rows: '2', name: 'line', heightMm: '10' });
    expect(typeIn(form, 'bands.x.rows', '7').texts).toHaveProperty(['bands.x.rows'], '7');
  });

  test('dyes of new yarns go round', () => {
    const dyes = Array.from({ length: 7 }).reduce<TypedPiece>((typed) => changeTyped(typed, { do: 'add-yarn' }), emptyForm('cm')).yarns.map(({ texts }) => texts['colour']);
    expect(dyes).toEqual(['#93a8a6', '#2f5366', '#cdbb94', '#7d854f', '#e6e4d8', '#93a8a6', '#a4553f', '#2f5366']);
  });
});

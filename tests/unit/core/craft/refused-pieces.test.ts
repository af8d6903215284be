import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { planPiece } from '#core/craft/plan.ts';
import { reckon } from '#core/craft/reckon.ts';
import { cases } from '../../../support/random-cases.ts';
import { pieceOf, pieceWith, planOf, PLAIN_PIECE, problemsOf, refusals } from './a-piece.ts';

/** A deep copy with the value at a path such as `size.widthMm` replaced; undefined takes it out. */
function withValue(path: string, value: unknown, root: object = PLAIN_PIECE): unknown {
  const copy: unknown = structuredClone(root);
  const keys = path.split('.');
  const last = keys.pop() ?? '';
  const parent = keys.reduce<unknown>((node, key) => (node as Record<string, unknown>)[key], copy) as Record<string, unknown>;
  if (value === undefined) Reflect.deleteProperty(parent, last);
  else parent[last] = value;
  return copy;
}

describe('a number in a piece', () => {
  const RULES: readonly (readonly [string, readonly unknown[]])[] = [
    ['size.widthMm', [0, -300, 1e308, 20_001]],
    ['size.heightMm', [0, -0, -1, 1e9]],
    ['loom.nailPitchMm', [0, 0.5, 101]],
    ['loom.insideHeightMm', [0, -5, 1e308]],
    ['loom.insideWidthMm', [0, -5]],
    ['loom.nailDiameterMm', [0, -1, 51]],
    ['loom.everyNthNail', [0, -1, 51]],
    ['warp.tieMm', [0, -1]],
    ['warp.endCount', [3, 2001, -62]],
    ['warp.endsTogether', [0, 3, -1]],
    ['warp.yarn.tex', [0, -5, 0.5, 200_001]],
    ['beat.picksPerWeftDiameter', [0, 0.1, 2.1, -1]],
    ['yarns.ground.metresPer100g', [0, -180, 0.4]],
    ['seed', [-1]],
  ];

  test.each(RULES)('%s is refused outside its range, with one code at its own place', (path, values) => {
    for (const value of values) expect(refusals(withValue(path, value)), String(value)).toEqual([`E_RANGE /${path.replaceAll('.', '/')}`]);
  });

  test.each(RULES)('%s is refused as no number when it is text, true, nothing, a list or not finite', (path) => {
    for (const value of ['12', '', true, null, [], {}, Number.NaN, Number.POSITIVE_INFINITY]) {
      expect(refusals(withValue(path, value)), JSON.stringify(value)).toEqual([`E_NUM /${path.replaceAll('.', '/')}`]);
    }
  });

  test.each(['loom.everyNthNail', 'warp.endCount', 'warp.endsTogether', 'seed'])('%s must be whole', (path) => {
    const value = path === 'warp.endCount' ? 62.5 : 1.5;
    expect(refusals(withValue(path, value))).toEqual([`E_COUNT /${path.replaceAll('.', '/')}`]);
  });

  test.each([
    ['drawIn', 0.4], ['drawIn', -0.01], ['relaxation', 0.21], ['wetShrinkage', 0.5], ['marginWeft', 1.01], ['marginWarp', -1],
    ['topMm', -1], ['bottomMm', -0.1], ['tailMm', 0], ['loadMm', 0],
  ])('the allowance %s cannot be %f', (key, value) => {
    expect(refusals(pieceWith({ allowances: { [key]: value } }))).toEqual([`E_RANGE /allowances/${key}`]);
  });

  test.each([['drawIn', 0], ['relaxation', 0.2], ['wetShrinkage', 0], ['marginWeft', 1], ['topMm', 0], ['bottomMm', 0]])('the allowance %s may be %f', (key, value) => {
    expect(refusals({ ...PLAIN_PIECE, loom: { ...PLAIN_PIECE.loom, insideHeightMm: 900 }, allowances: { [key]: value } })).toEqual([]);
  });
});

describe('what is missing or not known', () => {
  test.each(['size', 'loom', 'warp', 'beat', 'yarns', 'bands'])('a piece without its %s is told so once', (part) => {
    expect(refusals(withValue(part, undefined))).toEqual([`E_ENUM /${part}`]);
  });

  test('a missing number is told by its name', () => {
    expect(problemsOf(withValue('size.widthMm', undefined))).toEqual([{ code: 'E_NUM', path: '/size/widthMm', message: 'Width is missing. Give it as a number.' }]);
  });

  test.each(['colour', 'size.depthMm', 'loom.rails', 'warp.colour', 'beat.strength', 'yarns.ground.weight'])('a key nobody knows is refused where it stands: %s', (path) => {
    expect(refusals(withValue(path, 1))).toEqual([`E_ENUM /${path.replaceAll('.', '/')}`]);
  });

  test('a key that would change what objects are is only one more unknown key', () => {
    const piece: unknown = JSON.parse(JSON.stringify(PLAIN_PIECE).replace('{"craft"', '{"__proto__":{"x":1},"craft"'));
    expect(refusals(piece)).toEqual(['E_ENUM /__proto__']);
    const yarns: unknown = JSON.parse('{"__proto__":{"tex":100},"ground":{"tex":400}}');
    expect(refusals({ ...PLAIN_PIECE, yarns })).toEqual(['E_ENUM /yarns/__proto__']);
  });

  test('a band that names what every object has is not taken for one that names a yarn', () => {
    expect(refusals(pieceWith({ bands: [{ technique: 'tabby', yarn: 'constructor', fill: true }] }))).toEqual(['E_ENUM /bands/0/yarn']);
  });

  test('pointers write the slash and the tilde as the standard says', () => {
    expect(refusals(withValue('a/b~c', 1))).toEqual(['E_ENUM /a~1b~0c']);
  });

  test.each([
    ['craft', 'knitting'], ['mode', 'loose'], ['hangs', 'sideways'], ['loom.warping', 'spiral'], ['warp.parity', 'both'], ['bands.0.technique', 'crochet'],
  ])('%s has choices, and %s is none of them', (path, value) => {
    expect(refusals(withValue(path, value))).toEqual([`E_ENUM /${path.replaceAll('.', '/')}`]);
  });

  test('beat and thickness are each said in one way', () => {
    expect(refusals({ ...PLAIN_PIECE, beat: { picksPerCm: 6, picksPerWeftDiameter: 0.7 } })).toEqual(['E_ENUM /beat/picksPerWeftDiameter']);
    expect(refusals({ ...PLAIN_PIECE, yarns: { ground: { tex: 400, metresPer100g: 250 } } })).toEqual(['E_ENUM /yarns/ground/metresPer100g']);
    expect(refusals({ ...PLAIN_PIECE, yarns: { ground: { label: 'Unsaid' } } })).toEqual(['E_NUM /yarns/ground']);
  });
});

describe('a yarn that cannot be', () => {
  test.each([
    [{ count: { text: '0.001', system: 'ne-cotton' } }, 'E_RANGE /yarns/ground/count/text'],
    [{ count: { text: '8/2', system: 'silk' } }, 'E_ENUM /yarns/ground/count/system'],
    [{ count: { text: 8, system: 'nm' } }, 'E_ENUM /yarns/ground/count/text'],
    [{ count: '8/2' }, 'E_ENUM /yarns/ground/count'],
    [{ tex: 400, ball: { metres: 1, grams: 100_000 } }, 'E_RANGE /yarns/ground/ball'],
    [{ tex: 400, ball: { metres: 100 } }, 'E_NUM /yarns/ground/ball/grams'],
    [{ tex: 400, ball: { metres: 0, grams: 100 } }, 'E_RANGE /yarns/ground/ball/metres'],
    [{ tex: 400, colour: 'blue' }, 'E_ENUM /yarns/ground/colour'],
    [{ tex: 400, colour: '#6d93bcff' }, 'E_RANGE /yarns/ground/colour'],
    [{ tex: 400, label: 'x'.repeat(121) }, 'E_RANGE /yarns/ground/label'],
    [{ tex: 400, label: 7 }, 'E_ENUM /yarns/ground/label'],
    [{ tex: 400, strands: 1.5 }, 'E_COUNT /yarns/ground/strands'],
    [{ tex: 400, ashenhurstK: 1.1 }, 'E_RANGE /yarns/ground/ashenhurstK'],
    [{ tex: 400, wrapsPerInch: 61 }, 'E_RANGE /yarns/ground/wrapsPerInch'],
    [{ tex: 400, wrapsPerInch: 10, freeDiameterMm: 2.5 }, 'E_ENUM /yarns/ground/freeDiameterMm'],
    [{ tex: 400, freeDiameterMm: 0 }, 'E_RANGE /yarns/ground/freeDiameterMm'],
    [{ class: 8 }, 'E_RANGE /yarns/ground/class'],
    [{ class: 2.5 }, 'E_COUNT /yarns/ground/class'],
    [{ class: 'medium' }, 'E_NUM /yarns/ground/class'],
    [{ tex: 400, class: 4 }, 'E_ENUM /yarns/ground/class'],
  ])('%j', (yarn, refusal) => {
    expect(refusals({ ...PLAIN_PIECE, yarns: { ground: yarn } })).toEqual([refusal]);
  });
});

describe('what does not fit', () => {
  test('a loom that is too low names what it needs and the largest cloth it holds', () => {
    const [problem] = problemsOf(withValue('loom.insideHeightMm', 400));
    expect(problem).toMatchObject({ code: 'E_FIT', path: '/loom/insideHeightMm' });
    expect(problem?.message).toBe('The loom is 40 cm high inside. The piece needs 50.9 cm. Up to 29.4 cm of cloth fit.');
  });

  test('a loom that is too narrow names the widest piece at its spacing, and that one fits', () => {
    const [problem] = problemsOf(withValue('loom.insideWidthMm', 200));
    expect(problem).toMatchObject({ code: 'E_FIT', path: '/loom/insideWidthMm' });
    expect(problem?.message).toBe('The loom is 20 cm inside. The piece needs 35 cm. At this spacing up to 15.6 cm fit.');
    const narrower = withValue('size.widthMm', 156, withValue('loom.insideWidthMm', 200) as object);
    expect(refusals(narrower)).toEqual([]);
  });

  test('a loom on which one steps along two nails holds half the ends', () => {
    const twoNail = { ...PLAIN_PIECE, loom: { ...PLAIN_PIECE.loom, warping: 'two-nail', insideWidthMm: 200 } };
    expect(problemsOf(twoNail)[0]?.message).toContain('At this spacing up to 15.6 cm fit.');
  });

  test('in inches it says so in inches', () => {
    const planned = planPiece(withValue('loom.insideHeightMm', 400), 'in');
    expect(planned.ok ? '' : planned.problems[0]?.message).toBe('The loom is 15 3/4 in high inside. The piece needs 20 1/16 in. Up to 11 9/16 in of cloth fit.');
  });

  test('a width of too few or too many ends', () => {
    expect(refusals(withValue('size.widthMm', 10))).toEqual(['E_RANGE /size/widthMm']);
    expect(refusals(withValue('size.widthMm', 15_000))).toEqual(['E_RANGE /size/widthMm']);
  });

  test('pinned ends that cannot be doubled, or are not what the pattern needs', () => {
    expect(refusals(withValue('warp.endCount', 61))).toEqual(['E_PARITY /warp/endCount']);
    expect(refusals({ ...PLAIN_PIECE, warp: { yarn: { tex: 400 }, endsTogether: 2, endCount: 61 } })).toEqual(['E_PARITY /warp/endCount']);
    expect(problemsOf({ ...PLAIN_PIECE, warp: { yarn: { tex: 400 }, endsTogether: 2, parity: 'odd', endCount: 64 } })[0]?.message).toBe(
      'This pattern needs an odd number of pairs of ends, and 64 is not. 66 works.',
    );
  });

  test('a yarn too thick for its ends, with what would work', () => {
    const [problem] = problemsOf({ ...PLAIN_PIECE, yarns: { ground: { tex: 25_000 } } });
    expect(problem).toMatchObject({ code: 'E_JAM', path: '/yarns/ground' });
    expect(problem?.message).toBe('This yarn is 6.8 mm thick. With ends 5 mm apart the rows cannot close. Use a thinner yarn, or ends at least 7.6 mm apart.');
  });

  test('a swatch counted closer than the yarn can lie', () => {
    expect(refusals({ ...PLAIN_PIECE, beat: { picksPerCm: 30 } })).toEqual(['E_RANGE /beat/picksPerCm']);
  });

  test('bands that are higher or lower than the piece', () => {
    const tall = { technique: 'tabby', yarn: 'ground', heightMm: 401 } as const;
    expect(refusals(pieceOf(tall))).toEqual(['E_FIT /bands/1/fill']);
    expect(refusals(pieceWith({ bands: [tall] }))).toEqual(['E_FIT /bands']);
    expect(problemsOf(pieceWith({ bands: [{ ...tall, heightMm: 390 }] }))[0]?.message).toBe(
      'The bands come to 39 cm, and the piece is 40 cm high. Add 10 mm, or let one band fill the rest.',
    );
    expect(refusals(pieceWith({ bands: [{ ...tall, heightMm: 400.4 }] }))).toEqual([]);
  });

  test('two bands that both want the rest', () => {
    expect(refusals(pieceOf({ technique: 'tabby', yarn: 'ground', fill: true }))).toEqual(['E_FIT /bands/1/fill']);
  });

  test('more rows than anybody weaves', () => {
    expect(refusals({ ...PLAIN_PIECE, size: { widthMm: 300, heightMm: 19_000 }, loom: { ...PLAIN_PIECE.loom, insideHeightMm: 20_000 }, yarns: { ground: { tex: 2 } } })).toEqual([
      'E_RANGE /bands/0/fill',
    ]);
  });
});

test('everything that is wrong is told at once, one code for each value', () => {
  const piece = {
    ...PLAIN_PIECE,
    size: { widthMm: -3, heightMm: 400 },
    loom: { ...PLAIN_PIECE.loom, insideHeightMm: '520' },
    warp: { yarn: { tex: 0 } },
    yarns: { ground: { count: { text: 'eight', system: 'nm' } } },
    bands: [{ technique: 'tabby', yarn: 'sky', heightMm: 20 }, { technique: 'soumak', yarn: 'ground', over: 2, back: 2, rows: 0, tabbyBetween: 0.5, tabbyYarn: 'ground' }],
    extra: true,
  };
  expect(refusals(piece)).toEqual([
    'E_RANGE /size/widthMm',
    'E_NUM /loom/insideHeightMm',
    'E_RANGE /warp/yarn/tex',
    'E_NUM /yarns/ground/count/text',
    'E_RANGE /bands/1/back',
    'E_RANGE /bands/1/rows',
    'E_COUNT /bands/1/tabbyBetween',
    'E_ENUM /extra',
    'E_ENUM /bands/0/yarn',
  ]);
});

test('what is sound is still checked where something else is wrong', () => {
  const piece = { ...PLAIN_PIECE, loom: { ...PLAIN_PIECE.loom, insideHeightMm: 400, insideWidthMm: 200 }, yarns: { ground: { tex: 25_000 } }, seed: 1.5 };
  expect(refusals(piece)).toEqual(['E_COUNT /seed', 'E_FIT /loom/insideHeightMm', 'E_FIT /loom/insideWidthMm', 'E_JAM /yarns/ground']);
});

describe('whatever is sent', () => {
  test('ten thousand bands or yarns are refused unread', () => {
    expect(refusals({ ...PLAIN_PIECE, bands: Array.from({ length: 10_000 }, () => PLAIN_PIECE.bands[0]) })).toEqual(['E_RANGE /bands']);
    expect(refusals({ ...PLAIN_PIECE, yarns: Object.fromEntries(Array.from({ length: 10_000 }, (_, n) => [`y${String(n)}`, { tex: 400 }])) })).toEqual(['E_RANGE /yarns']);
  });

  test('shapes of more rows than anyone weaves are refused before they are stepped out', () => {
    const shapes = Array.from({ length: 24 }, () => ({ shape: 'rectangle', yarn: 'ground', baseMm: 200, heightMm: 400 }) as const);
    const withBeat = (picksPerCm: number): unknown => ({
      ...PLAIN_PIECE, beat: { picksPerCm }, yarns: { ground: { tex: 4 } }, bands: [{ technique: 'tabby', yarn: 'ground', fill: true, shapes }],
    });
    expect(refusals(withBeat(31))).toEqual([]);
    expect(problemsOf(withBeat(32))).toEqual([
      { code: 'E_RANGE', path: '/bands', message: 'The shapes come to 30720 rows, and up to 30000 work. Check the heights, the yarns and the beat.' },
    ]);
  });

  test('JSON nested a hundred thousand deep is one more thing that is not known', () => {
    const deep: unknown = JSON.parse(`${'['.repeat(100_000)}${']'.repeat(100_000)}`);
    expect(refusals(deep)).toEqual(['E_ENUM ']);
    expect(refusals({ ...PLAIN_PIECE, warp: deep })).toEqual(['E_ENUM /warp']);
  });

  test('no JSON ever makes it throw, and every refusal has a code, a place and a sentence', () => {
    fc.assert(
      fc.property(fc.jsonValue({ maxDepth: 4 }), (value) => {
        const answers = [planPiece(value), reckon(value), reckon({ what: 'piece', piece: value }), reckon({ what: 'yarn', yarn: value })];
        return answers.every((answer) => answer.ok || (answer.problems.length > 0 && answer.problems.every(({ code, message }) => /^E_[A-Z]+$/.test(code) && message.length > 10)));
      }),
      { numRuns: cases(1000), seed: 7 },
    );
  });

  test('one broken value in a sound piece is one problem at that value', () => {
    const paths = ['size', 'size.widthMm', 'size.heightMm', 'loom', 'loom.warping', 'loom.insideHeightMm', 'warp.yarn', 'warp.yarn.tex', 'beat', 'bands', 'bands.0', 'bands.0.technique', 'bands.0.yarn', 'yarns.ground'];
    const broken = fc.constantFrom<unknown>(Number.NaN, -1, 1e308, -0, '400', null, [], 'x'.repeat(70_000));
    fc.assert(
      fc.property(fc.constantFrom(...paths), broken, (path, value) => {
        const found = problemsOf(withValue(path, value));
        return found.length === 1 && found[0]?.path.startsWith(`/${path.replaceAll('.', '/')}`) === true;
      }),
      { numRuns: cases(1000), seed: 11 },
    );
  });
});

test('nothing of the input is changed', () => {
  const piece = structuredClone(PLAIN_PIECE);
  planOf(Object.freeze(piece));
  expect(piece).toEqual(PLAIN_PIECE);
});

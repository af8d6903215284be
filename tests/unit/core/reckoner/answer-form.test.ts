import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { answerForm, type ReckonerAnswer } from '#core/reckoner/answer-form.ts';
import { fieldOfPath } from '#core/reckoner/field-of-path.ts';
import { changeUnits, RECKONER_DEFAULTS, RECKONER_FIELDS, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { amountText } from '#core/units/format-amount.ts';

const answerTo = (typed: Partial<ReckonerForm>): ReckonerAnswer => answerForm({ ...RECKONER_DEFAULTS, ...typed });

/** Value of a line in words, by its label. */
function told(answer: ReckonerAnswer, section: Exclude<keyof ReckonerAnswer, 'errors'>, label: string, units: 'cm' | 'in' = 'cm'): string {
  const line = answer[section].lines.find((one) => one.label === label);
  if (line === undefined) return `no line called ${label}`;
  return line.value.kind === 'words' ? line.value.words : amountText(line.value, units).replaceAll('\u00a0', ' ');
}

const PARTS = ['yarn', 'sett', 'cloth', 'soumak', 'rya', 'shape', 'rod', 'piece'] as const;

describe.each(['cm', 'in'] as const)('at first, in %s', (units) => {
  const answer = answerForm(changeUnits(RECKONER_DEFAULTS, units));

  test('nothing is wrong and every part is answered, with something loud', () => {
    expect(answer.errors).toEqual({});
    for (const part of PARTS) expect(answer[part].lines.some((line) => line.loud), part).toBe(true);
    expect(answer.piece.made).toBeDefined();
    expect(answer.shape.drawing).toBeDefined();
    expect(answer.sett.offered).not.toHaveLength(0);
  });

  test('every answer says how it was got', () => {
    for (const part of PARTS) for (const line of answer[part].lines) expect(line.how, line.label).not.toBe('');
  });

  test('no two lines of a part are called the same', () => {
    for (const part of PARTS) expect(new Set(answer[part].lines.map(({ label }) => label)).size).toBe(answer[part].lines.length);
  });

  test('a note is told once on the page', () => {
    const notes = PARTS.flatMap((part) => answer[part].notes.map(({ message }) => message));
    expect(new Set(notes).size).toBe(notes.length);
  });
});

describe('one yarn', () => {
  test.each([
    ['metres', '180', '555.56 tex'],
    ['tex', '400', '400 tex'],
    ['tex', '400,5', '400.5 tex'],
    ['yards', '100', '310.03 tex'],
    ['nm', '2/16', '125 tex'],
    ['ne-cotton', '8/2', '147.64 tex'],
    ['denier', '900', '100 tex'],
  ])('%s %s is %s', (way, yarn, tex) => {
    expect(told(answerTo({ 'yarn-by': way, yarn }), 'yarn', 'Tex')).toBe(tex);
  });

  test('a ball on the label overrides a count', () => {
    const answer = answerTo({ 'yarn-by': 'ne-cotton', yarn: '8/4', 'ball-length': '150', 'ball-weight': '50' });
    expect(told(answer, 'yarn', 'Metres in 100 g')).toBe('300 m');
  });

  test('wraps that were counted give the thickness and the class', () => {
    const answer = answerTo({ wraps: '10', strands: '2' });
    expect(told(answer, 'yarn', 'Wraps in an inch')).toBe('10');
    expect(told(answer, 'yarn', 'Thickness together, lying free')).toBe('3.59 mm');
    expect(told(answer, 'yarn', 'Shops’ class')).toBe('4 medium');
    expect(told(answerTo({ wraps: '4.5', 'yarn-by': 'tex', yarn: '2000' }), 'yarn', 'Shops’ class')).toBe('between two classes');
  });

  test('firm yarn lies thinner than soft yarn of the same weight', () => {
    expect(told(answerTo({ hand: 'firm' }), 'yarn', 'Thickness, beaten down')).toBe('0.94 mm');
    expect(told(answerTo({ hand: 'soft' }), 'yarn', 'Thickness, beaten down')).toBe('1.01 mm');
  });

  test('a doubtful count is answered with a note', () => {
    expect(answerTo({ 'yarn-by': 'ne-cotton', yarn: '2/8' }).yarn.notes).toHaveLength(1);
  });
});

describe('a count with two numbers', () => {
  test.each([
    ['ne-cotton', '8/2', '2 plies of 8'],
    ['nm', '2/16', '2 plies of 16'],
    ['nm', '16/1', '1 ply of 16'],
  ])('%s %s is read as %s', (way, yarn, words) => {
    expect(told(answerTo({ 'yarn-by': way, yarn }), 'yarn', `“${yarn}” is read as`)).toBe(words);
  });

  test('of spun silk names the yarn as it is', () => {
    expect(told(answerTo({ 'yarn-by': 'spun-silk', yarn: '40/2' }), 'yarn', '“40/2” is read as')).toBe('2 plies, counted together as 40');
  });
});

test('only a shop’s class will do, roughly', () => {
  const answer = answerTo({ 'yarn-by': 'class', yarn: '4' });
  expect(answer.errors).toEqual({});
  expect(told(answer, 'yarn', 'Metres in 100 g')).toBe('160 m');
  expect(answerTo({ 'yarn-by': 'class', yarn: '9' }).errors).toEqual({ yarn: 'Shops’ classes go from 0, lace, to 7, jumbo.' });
});

describe('ends and spacing', () => {
  test('in pairs the working ends are told, too', () => {
    expect(told(answerTo({ together: '2', parity: 'any' }), 'sett', 'Worked as')).toBe('31 ends');
    expect(told(answerTo({}), 'sett', 'Worked as')).toBe('no line called Worked as');
  });

  test('tells whether the yarn suits, and how many strands would', () => {
    expect(told(answerTo({ yarn: '60' }), 'sett', 'Your yarn between these ends')).toBe('Too thick for them');
    expect(told(answerTo({ yarn: '3000' }), 'sett', 'Your yarn between these ends')).toBe('Too thin by itself');
    expect(told(answerTo({}), 'sett', 'Your yarn between these ends')).toBe('It suits them');
    expect(told(answerTo({ yarn: '1000' }), 'sett', 'Strands to take together')).toBe('8 strands');
  });

  test('says nothing of strands where the warp alone fills the room', () => {
    expect(told(answerTo({ nails: '3', 'warp-tex': '900' }), 'sett', 'Strands to take together')).toContain('no line');
  });

  test('tells balanced ends in the person’s own unit', () => {
    const inches = answerForm(changeUnits({ ...RECKONER_DEFAULTS, wraps: '14' }, 'in'));
    expect(told(inches, 'sett', 'Ends for balanced cloth', 'in')).toBe('7 to the inch');
  });

  test('still answers when the yarn or the frame is wrong', () => {
    expect(told(answerTo({ yarn: 'thick' }), 'sett', 'Warp ends')).toBe('62 ends');
    expect(told(answerTo({ 'frame-height': '20' }), 'sett', 'Warp ends')).toBe('62 ends');
  });

  test('tells every spacing the loom has, and what the yarn does there', () => {
    const { offered = [] } = answerTo({}).sett;
    expect(offered.slice(0, 3).map(({ spacingMm, advice }) => [spacingMm, advice])).toEqual([[5, 'suits'], [10, 'too-thin'], [15, 'too-thin']]);
  });

  test('tells how uneven a zigzag stands near the rails, and that a two-nail step stands even', () => {
    expect(told(answerTo({}), 'sett', 'Gaps near the rails, by turns')).toBe('1 × 9 mm');
    expect(told(answerTo({ warping: 'two-nail', nails: '5' }), 'sett', 'Bare ends stand')).toBe('Even from rail to rail');
  });

  test('takes notches one end each, and every second nail', () => {
    expect(told(answerTo({ 'loom-kind': 'notched-frame', nails: '5' }), 'sett', 'Notches above')).toBe('62 notches');
    expect(told(answerTo({ every: '2', parity: 'any' }), 'sett', 'Warp ends')).toBe('31 ends');
    expect(told(answerTo({ 'loom-kind': 'two-row-frame', 'nail-rows': 'inner' }), 'sett', 'Warp ends')).toBe('62 ends');
  });
});

describe('how much yarn', () => {
  test('tells rows, take-up and yarn with its reserve', () => {
    const answer = answerTo({});
    expect(told(answer, 'cloth', 'Rows')).toBe('277 rows');
    expect(told(answer, 'cloth', 'Take-up of the weft')).toBe('6.7\u202f%');
    expect(told(answer, 'cloth', 'Take-up of the warp')).toBe('0\u202f%');
    expect(told(answer, 'cloth', 'Reserve on top')).toBe('15\u202f%');
  });

  test('counts balls where the ball is told', () => {
    expect(told(answerTo({ 'ball-length': '90', 'ball-weight': '50' }), 'cloth', 'Balls')).toBe('2 balls');
    expect(told(answerTo({}), 'cloth', 'Balls')).toContain('no line');
  });

  test('rows counted on a swatch replace the beat, in a centimetre or an inch, and need less reserve', () => {
    expect(told(answerTo({ beat: 'swatch', swatch: '6' }), 'cloth', 'Rows')).toBe('240 rows');
    expect(told(answerTo({ beat: 'swatch', swatch: '6' }), 'cloth', 'Reserve on top')).toBe('10\u202f%');
    const inches = answerForm({ ...changeUnits(RECKONER_DEFAULTS, 'in'), beat: 'swatch', swatch: '15.24', height: '15 3/4' });
    expect(told(inches, 'cloth', 'Rows')).toBe('240 rows');
  });

  test('both yarns bend in balanced cloth', () => {
    expect(told(answerTo({ weave: 'balanced', beat: 'swatch', swatch: '2', 'draw-in': '8' }), 'cloth', 'Take-up of the warp')).not.toBe('0\u202f%');
  });
});

describe('soumak', () => {
  test('tells stitches, yarn and how often it covers the width', () => {
    const answer = answerTo({ wraps: '7.5', yarn: '100' });
    expect(told(answer, 'soumak', 'Stitches in a row')).toBe('30 stitches');
    expect(told(answer, 'soumak', 'Yarn over width covered')).toBe('3.32 times');
  });
});

describe('rya', () => {
  test('tells what to cut, the card and the strands', () => {
    const answer = answerTo({ wraps: '7.5', yarn: '100' });
    expect(told(answer, 'rya', 'Cut each strand')).toBe('36.5 cm');
    expect(told(answer, 'rya', 'Winding card')).toBe('18.5 cm');
    expect(told(answer, 'rya', 'Strands')).toBe('93 strands');
    // 93 strands and 5 % are 97.65, so 98 of 36.43 cm.
    expect(answer.rya.lines.find(({ label }) => label === 'Yarn to have in hand')?.value).toMatchObject({ mm: expect.closeTo(98 * 364.3, -2) as number });
    expect(told(answerTo({ 'edge-ends': '2' }), 'rya', 'Knots in a row')).toBe('29 knots');
  });
});

describe('a shape', () => {
  test('is told row by row, from the foot', () => {
    const { shape } = answerTo({ wraps: '10.5' });
    expect(told(answerTo({ wraps: '10.5' }), 'shape', 'Rows')).toBe('69 rows');
    expect(shape.runs?.slice(0, 3)).toEqual([{ first: 1, last: 2, ends: 30 }, { first: 3, last: 7, ends: 28 }, { first: 8, last: 12, ends: 26 }]);
    expect(shape.drawing).toMatchObject({ widthMm: 180, heightMm: expect.closeTo(99.75, 1) as number });
  });

  test('can be a circle, a rectangle, or the slope of an edge', () => {
    expect(told(answerTo({ shape: 'circle' }), 'shape', 'Widest row')).toBe('24 ends');
    expect(told(answerTo({ shape: 'rectangle', sides: 'freely' }), 'shape', 'First row')).toBe('30 ends');
    expect(told(answerTo({ shape: 'slope' }), 'shape', 'The edge leans by')).toBe('66.55 °');
    expect(answerTo({ shape: 'slope', 'step-ends': '0' }).errors).toEqual({ 'step-ends': 'A step is a whole number from 1 to 100.' });
  });
});

describe('rod and cord', () => {
  test('tells the next rod that is sold, the cord and its pull', () => {
    const answer = answerTo({});
    expect(told(answer, 'rod', 'Take a rod of')).toBe('12 mm');
    expect(told(answer, 'rod', 'The cord pulls with')).toBe('6.8 N');
    expect(told(answer, 'rod', 'The nail or hook must hold')).toBe('2.4 kg');
    expect(told(answerForm(changeUnits(RECKONER_DEFAULTS, 'in')), 'rod', 'Take a rod of', 'in')).toBe('1/2 in');
  });

  test.each<[Partial<ReckonerForm>, string]>([[{ 'rod-load': '0' }, 'rod-load'], [{ 'rod-length': '4' }, 'rod-length'], [{ rise: '0' }, 'rise'], [{ 'rod-load': 'heavy' }, 'rod-load'], [{ rise: '' }, 'rise']])('%j is refused at its field', (typed, field) => {
    expect(Object.keys(answerTo(typed).errors)).toEqual([field]);
  });
});

describe('a whole hanging', () => {
  test('with a fringe tells knots, strands and cut length', () => {
    const answer = answerTo({ fringe: 'rya' });
    expect(told(answer, 'piece', 'Knots of the fringe')).toBe('31 knots');
    expect(told(answer, 'piece', 'Cut length of the fringe')).toMatch(/^3\d(\.5)? cm$/u);
    expect(told(answerTo({}), 'piece', 'Knots of the fringe')).toContain('no line');
  });

  test('without a rod tells nothing of rod and cord', () => {
    expect(told(answerTo({ dowel: '' }), 'piece', 'Rod, long')).toContain('no line');
  });
});

test('what one part waits for does not keep the others from answering', () => {
  const answer = answerTo({ pile: 'long', radius: 'round', shape: 'circle', 'rod-load': '-' });
  expect([answer.rya, answer.shape, answer.rod].map(({ lines }) => lines.length)).toEqual([0, 0, 0]);
  for (const part of ['yarn', 'sett', 'cloth', 'soumak', 'piece'] as const) expect(answer[part].lines.length, part).toBeGreaterThan(0);
});

describe('what cannot be used is told at its field', () => {
  test.each<[Partial<ReckonerForm>, string, string]>([
    [{ width: '' }, 'width', 'Width is missing. Type it in cm.'],
    [{ width: 'wide' }, 'width', 'Write one length, like 12.5 or 4 7/8.'],
    [{ width: '0' }, 'width', 'Width: anything above 0, up to 20 m, works.'],
    [{ nails: '0' }, 'nails', 'From nail to nail: between 1 mm and 10 cm works.'],
    [{ yarn: '' }, 'yarn', 'The yarn is missing. Type a number.'],
    [{ yarn: '8/2' }, 'yarn', 'The yarn is not a number. Type it like 12 or 12.5.'],
    [{ 'yarn-by': 'nm', yarn: '' }, 'yarn', 'The count is missing. Write it like 8/2.'],
    [{ 'yarn-by': 'nm', yarn: 'two' }, 'yarn', '“two” is not a count. Write it like 16, 8/2 or 2/16.'],
    [{ wraps: '99' }, 'wraps', 'Wraps in an inch: between 1 and 60 works.'],
    [{ strands: '1.5' }, 'strands', 'Strands together must be a whole number.'],
    [{ 'ball-length': '100' }, 'ball-weight', 'How much does that length weigh? Type both, or neither.'],
    [{ 'ball-weight': '100' }, 'ball-length', 'How long is the yarn that weighs that? Type both, or neither.'],
    [{ 'ball-weight': '0', 'ball-length': '5' }, 'ball-weight', 'Grams of a ball: anything above 0, up to 1000000 g, works.'],
    [{ 'warp-tex': '0' }, 'warp-tex', 'Tex: between 1 tex and 200000 tex works.'],
    [{ 'draw-in': '60' }, 'draw-in', 'Draw-in: from 0 % to less than 40 % works.'],
    [{ 'frame-height': '40' }, 'frame-height', 'The loom is 40 cm high inside. The piece needs 50.9 cm. Up to 29.4 cm of cloth fit.'],
    [{ 'frame-width': '20' }, 'frame-width', 'The loom is 20 cm inside. The piece needs 35 cm. At this spacing up to 15.6 cm fit.'],
    [{ beat: 'swatch' }, 'swatch', 'Rows in a centimetre is missing. Type a number.'],
    [{ over: '2', back: '2' }, 'back', 'A soumak stitch goes back under fewer ends than it passed over: between 1 and 1 works.'],
    [{ base: '40' }, 'base', 'The shape is wider than the cloth, which takes 31 cm.'],
    [{ 'leg-ends': '40' }, 'edge-ends', 'One knot needs 80 ends beside the plain ones at the edges.'],
    [{ every: '0' }, 'every', 'Every so-many-th nail: between 1 and 50 works.'],
    [{ trim: '' }, 'trim', 'Length to trim away is missing. Type it in mm.'],
    [{ beat: 'swatch', swatch: '90' }, 'swatch', 'Rows of this yarn cannot lie so close: up to 19.7 in a centimetre work. Count the swatch again.'],
    [{ pile: '' }, 'pile', 'Length of the pile is missing. Type it in cm.'],
    [{ pile: '0' }, 'pile', 'Length of the pile: anything above 0, up to 20 m, works.'],
    [{ 'knot-strands': '0' }, 'knot-strands', 'Strands in a knot: between 1 and 100 works.'],
  ])('%j', (typed, field, says) => {
    const { errors } = answerTo(typed);
    expect(errors).toEqual({ [field]: says });
  });

  test('several at once, each at its own field', () => {
    expect(Object.keys(answerTo({ wraps: '99', strands: 'x', width: '', 'warp-tex': '-1', beat: 'swatch' }).errors).sort()).toEqual(['strands', 'swatch', 'warp-tex', 'width', 'wraps']);
  });

  test('nothing anybody types makes it throw, and what it refuses it says', () => {
    const typed = fc.oneof(fc.string({ maxLength: 20 }), fc.constantFrom('0', '-1', '1e308', 'NaN', '999999999', '0.0000001', '1/0', '½'));
    fc.assert(
      fc.property(fc.constantFrom(...RECKONER_FIELDS), typed, typed, (field, value, height) => {
        const answer = answerTo({ [field]: value, height });
        return Object.keys(answer.errors).length > 0 || PARTS.every((part) => answer[part].lines.length > 0 && answer[part].failed === undefined);
      }),
      { numRuns: 1000, seed: 13 },
    );
  });

  test('places that no field stands for go to the height', () => {
    expect(fieldOfPath('/somewhere')).toBe('height');
    expect(fieldOfPath('/bands')).toBe('height');
    expect(fieldOfPath('/yarns/ground/ball/metres')).toBe('ball-length');
    expect(fieldOfPath('/warp/parity')).toBe('parity');
  });
});

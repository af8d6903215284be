import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { answerForm, type ReckonerAnswer } from '#core/reckoner/answer-form.ts';
import { fieldOfPath } from '#core/reckoner/field-of-path.ts';
import { changeUnits, RECKONER_DEFAULTS, RECKONER_FIELDS, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { amountText } from '#core/units/format-amount.ts';

const answerTo = (typed: Partial<ReckonerForm>): ReckonerAnswer => answerForm({ ...RECKONER_DEFAULTS, ...typed });

/** Value of a line in words, by its label. */
function told(answer: ReckonerAnswer, section: 'yarn' | 'ends' | 'piece', label: string, units: 'cm' | 'in' = 'cm'): string {
  const line = answer[section].lines.find((one) => one.label === label);
  if (line === undefined) return `no line called ${label}`;
  return line.value.kind === 'words' ? line.value.words : amountText(line.value, units).replaceAll('\u00a0', ' ');
}

describe('at first', () => {
  const answer = answerTo({});

  test('everything is answered and nothing is wrong', () => {
    expect(answer.errors).toEqual({});
    expect(answer.yarn.lines).not.toHaveLength(0);
    expect(answer.ends.lines).not.toHaveLength(0);
    expect(answer.piece.made).toBeDefined();
  });

  test('every answer says how it was got', () => {
    for (const line of [...answer.yarn.lines, ...answer.ends.lines, ...answer.piece.lines]) expect(line.how, line.label).not.toBe('');
  });

  test('no two lines of a part are called the same', () => {
    for (const { lines } of [answer.yarn, answer.ends, answer.piece]) expect(new Set(lines.map(({ label }) => label)).size).toBe(lines.length);
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
    const answer = answerTo({ 'yarn-by': 'ne-cotton', yarn: '8/4', 'ball-metres': '150', 'ball-grams': '50' });
    expect(told(answer, 'yarn', 'Metres in 100 g')).toBe('300 m');
  });

  test('wraps that were counted give the thickness and the class', () => {
    const answer = answerTo({ wraps: '10', strands: '2' });
    expect(told(answer, 'yarn', 'Wraps in an inch')).toBe('10');
    expect(told(answer, 'yarn', 'Thickness together, lying free')).toBe('3.59 mm');
    expect(told(answer, 'yarn', 'Shop’s class')).toBe('4 medium');
    expect(told(answerTo({ wraps: '4.5', 'yarn-by': 'tex', yarn: '2000' }), 'yarn', 'Shop’s class')).toBe('between two classes');
  });

  test('firm yarn lies thinner than soft yarn of the same weight', () => {
    expect(told(answerTo({ hand: 'firm' }), 'yarn', 'Thickness, beaten down')).toBe('0.94 mm');
    expect(told(answerTo({ hand: 'soft' }), 'yarn', 'Thickness, beaten down')).toBe('1.01 mm');
  });

  test('a doubtful count is answered with a note', () => {
    expect(answerTo({ 'yarn-by': 'ne-cotton', yarn: '2/8' }).yarn.notes).toHaveLength(1);
  });
});

describe('ends and spacing', () => {
  test('in pairs the working ends are told, too', () => {
    expect(told(answerTo({ together: '2', parity: 'any' }), 'ends', 'Worked as')).toBe('31 ends');
    expect(told(answerTo({}), 'ends', 'Worked as')).toBe('no line called Worked as');
  });

  test('tells whether the yarn suits, and how many strands would', () => {
    expect(told(answerTo({ yarn: '60' }), 'ends', 'Your yarn between these ends')).toBe('Too thick for them');
    expect(told(answerTo({ yarn: '3000' }), 'ends', 'Your yarn between these ends')).toBe('Too thin by itself');
    expect(told(answerTo({}), 'ends', 'Your yarn between these ends')).toBe('It suits them');
    expect(told(answerTo({ yarn: '1000' }), 'ends', 'Strands to take together')).toBe('8 strands');
  });

  test('says nothing of strands where the warp alone fills the room', () => {
    expect(told(answerTo({ nails: '3', 'warp-tex': '900' }), 'ends', 'Strands to take together')).toContain('no line');
  });

  test('tells balanced ends in the person’s own unit', () => {
    const inches = answerForm(changeUnits({ ...RECKONER_DEFAULTS, wraps: '14' }, 'in'));
    expect(told(inches, 'ends', 'Ends for balanced cloth', 'in')).toBe('7 to the inch');
  });

  test('still answers when the yarn or the frame is wrong', () => {
    expect(told(answerTo({ yarn: 'thick' }), 'ends', 'Warp ends')).toBe('62 ends');
    expect(told(answerTo({ 'frame-height': '20' }), 'ends', 'Warp ends')).toBe('62 ends');
  });
});

describe('a whole hanging', () => {
  test('with a fringe tells knots, strands and cut length', () => {
    const answer = answerTo({ fringe: 'rya' });
    expect(told(answer, 'piece', 'Fringe: knots')).toBe('31 knots');
    expect(told(answer, 'piece', 'Fringe: cut length')).toMatch(/^3\d(\.5)? cm$/u);
    expect(told(answerTo({}), 'piece', 'Fringe: knots')).toContain('no line');
  });

  test('without a dowel tells nothing of dowel and cord', () => {
    expect(told(answerTo({ dowel: '' }), 'piece', 'Length of the dowel')).toContain('no line');
  });

  test('counted rows replace the beat, in a centimetre or an inch', () => {
    expect(told(answerTo({ beat: 'swatch', swatch: '6' }), 'piece', 'Cloth: rows')).toBe('240 rows');
    const inches = answerForm({ ...changeUnits(RECKONER_DEFAULTS, 'in'), beat: 'swatch', swatch: '15.24', height: '15 3/4' });
    expect(told(inches, 'piece', 'Cloth: rows')).toBe('240 rows');
  });
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
    [{ 'ball-metres': '100' }, 'ball-grams', 'How much do those metres weigh? Type both, or neither.'],
    [{ 'ball-grams': '100' }, 'ball-metres', 'How many metres weigh that? Type both, or neither.'],
    [{ 'ball-grams': '0', 'ball-metres': '5' }, 'ball-grams', 'Grams of a ball: anything above 0, up to 1000000 g, works.'],
    [{ 'warp-tex': '0' }, 'warp-tex', 'Tex: between 1 tex and 200000 tex works.'],
    [{ 'draw-in': '60' }, 'draw-in', 'Draw-in: from 0 % to less than 40 % works.'],
    [{ 'frame-height': '40' }, 'frame-height', 'The loom is 40 cm high inside. The piece needs 50.9 cm. Up to 29.4 cm of cloth fit.'],
    [{ 'frame-width': '20' }, 'frame-width', 'The loom is 20 cm inside. The piece needs 35 cm. At this spacing up to 15.6 cm fit.'],
    [{ beat: 'swatch' }, 'swatch', 'Rows in a centimetre is missing. Type a number.'],
    [{ beat: 'swatch', swatch: '90' }, 'swatch', 'Rows of this yarn cannot lie so close: up to 19.7 in a centimetre work. Count the swatch again.'],
    [{ fringe: 'rya', pile: '' }, 'pile', 'Length of the fringe is missing. Type it in cm.'],
    [{ fringe: 'rya', pile: '0' }, 'pile', 'Length of the pile: anything above 0, up to 20 m, works.'],
    [{ fringe: 'rya', 'fringe-strands': '0' }, 'fringe-strands', 'Strands in a knot: between 1 and 100 works.'],
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
        return Object.keys(answer.errors).length > 0 || answer.piece.lines.length > 0;
      }),
      { numRuns: 1000, seed: 13 },
    );
  });

  test('places that no field stands for go to the height', () => {
    expect(fieldOfPath('/somewhere')).toBe('height');
    expect(fieldOfPath('/bands')).toBe('height');
    expect(fieldOfPath('/yarns/ground/ball/metres')).toBe('ball-metres');
    expect(fieldOfPath('/warp/parity')).toBe('parity');
  });
});

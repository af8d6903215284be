import { expect, test } from 'vitest';
import { contradictions, type ListedLine } from '#core/gathering/contradictions.ts';

let count = 0;
function line(part: number, name: string, given: Partial<ListedLine> = {}): ListedLine {
  count += 1;
  return { publicId: `line-${count}`, part, kind: 'tool', name, amountText: null, untilPart: null, ...given };
}

test('two parts that want different needles are told, at the later one, with both lines', () => {
  const [blunt, pointed] = [line(3, 'Tapestry needle, blunt'), line(5, 'Tapestry needle, pointed')];
  expect(contradictions([blunt, pointed])).toEqual([
    {
      part: 5, line: pointed.publicId, other: { part: 3, line: blunt.publicId, name: 'Tapestry needle, blunt' },
      says: 'It asks for “Tapestry needle, pointed”, Part 3 for “Tapestry needle, blunt”. If it is one and the same, give both lines the same words.',
    },
  ]);
});

test('so are two numbers of one thing', () => {
  expect(contradictions([line(1, 'Shed stick', { amountText: '1' }), line(2, 'shed  stick', { amountText: '2' })])[0]?.says).toContain('“shed  stick: 2”, Part 1 for “Shed stick: 1”');
});

test('one name for two kinds of thing stands on her list twice', () => {
  expect(contradictions([line(1, 'Spacer card', { kind: 'material' }), line(2, 'spacer card')]).map(({ says }) => says)).toEqual(['“spacer card” is a tool here and material in Part 1, so it stands on her list twice. Choose one kind for both.']);
});

test('nothing is needed until a part before its own, or one that is not there', () => {
  expect(contradictions([line(4, 'Beater', { untilPart: 2 }), line(5, 'Comb', { untilPart: 9 }), line(5, 'Card', { untilPart: 7 })], 7)).toEqual([
    expect.objectContaining({ part: 4, other: null, says: expect.stringContaining('until Part 2, which comes before') }),
    expect.objectContaining({ part: 5, other: null, says: expect.stringContaining('until Part 9, and there are only 7 parts') }),
  ]);
});

test('the same words, an amount in one of them only, other things, yarns by the band, and two lines of one part are none', () => {
  const yarn = { kind: 'yarn', amountText: '20 m' } as const;
  expect(contradictions([
    line(1, 'Beater', { amountText: '1' }), line(2, 'Beater', { amountText: '1' }), line(3, 'Beater'), line(3, 'Ruler, long'), line(3, 'Ruler, short'),
    line(3, 'Fenwool', yarn), line(4, 'Fenwool', { ...yarn, amountText: '5 m' }),
  ])).toEqual([]);
});

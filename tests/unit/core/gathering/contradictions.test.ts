import { expect, test } from 'vitest';
import { contradictions } from '#core/gathering/contradictions.ts';

const line = (part: number, name: string, amountText: string | null = null) => ({ part, name, amountText });

test('two parts that want different needles are told, at the later one', () => {
  expect(contradictions([line(3, 'Tapestry needle, blunt'), line(5, 'Tapestry needle, pointed')])).toEqual([
    { part: 5, earlier: 3, says: 'It asks for “Tapestry needle, pointed”, Part 3 for “Tapestry needle, blunt”. If it is one and the same, give both lines the same words.' },
  ]);
});

test('so are two numbers of one thing', () => {
  expect(contradictions([line(1, 'Shed stick', '1'), line(2, 'shed  stick', '2')])[0]?.says).toContain('“shed  stick: 2”, Part 1 for “Shed stick: 1”');
});

test('the same words, an amount in one of them only, other things, and two lines of one part are none', () => {
  expect(contradictions([line(1, 'Beater', '1'), line(2, 'Beater', '1'), line(3, 'Beater'), line(3, 'Ruler, long'), line(3, 'Ruler, short')])).toEqual([]);
});

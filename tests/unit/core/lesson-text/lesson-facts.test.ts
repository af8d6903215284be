import { expect, test } from 'vitest';
import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';

test('a tree that was kept tells the same facts as when it was read', () => {
  const read = parseLessonText('## Wind\n\n<Step id="a">Take <Amount of="warp"/>.</Step>\n\n<Figure of="tabby"/>\n\n<Video name="v"/>\n\n![x](p)\n\nand <Amount of="ends"/>, <Amount of="warp"/>');
  if (!read.ok) throw new Error('This lesson is in order.');
  expect(factsOf(JSON.parse(JSON.stringify(read.tree)) as typeof read.tree)).toEqual({
    outline: [{ depth: 2, id: 'wind', words: 'Wind' }],
    steps: [{ id: 'a', words: 'Take ….' }],
    amounts: ['warp', 'ends'],
    figures: ['tabby'],
    media: [{ kind: 'video', name: 'v' }, { kind: 'picture', name: 'p' }],
  });
});

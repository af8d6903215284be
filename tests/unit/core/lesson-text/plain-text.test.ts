import { expect, test } from 'vitest';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { lessonPlainText, plainWords } from '#core/lesson-text/plain-text.ts';

const parsed = parseLessonText(`## Wind **it**

Wind <Amount of="ends"/> on. See [the handbook](https://a.example "title") and \`code\`.

- one
- two

| a | b |
| - | - |
| c | d |

<Caution title="Nails">
Mind them.
</Caution>

![a loom](loom "caption")
`);
if (!parsed.ok) throw new Error('This lesson is in order.');
const { tree } = parsed;

test('the words of a lesson are those a person wrote as words, in their order', () => {
  expect(lessonPlainText(tree)).toBe('Wind it Wind on. See the handbook and . one two a b c d Mind them.');
});

test('amounts can be put in by whoever knows them', () => {
  expect(plainWords(tree.children, (key) => `38 ${key}`)).toContain('Wind 38 ends on.');
});

import { expect, test } from 'vitest';
import { loomSideSteps } from '#core/lesson-text/loom-side.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';

function stepsOf(source: string) {
  const read = parseLessonText(source);
  if (!read.ok) throw new Error(read.problems[0]?.reason);
  return loomSideSteps(read.tree).map(({ id, figure, cautions }) => ({ id, figure, cautions: cautions.map(({ props }) => props['title']) }));
}

test('each step carries the caution before it and the figure that belongs to it', () => {
  const steps = stepsOf(`
<Figure of="warping"/>

<Caution title="Nails">Mind them.</Caution>

<Step id="tie-on">Tie on.</Step>

Some words.

<Step id="wind">Wind.</Step>

<Figure of="shed-stick"/>

## Another thing

<Step id="rest">Rest.</Step>
`);
  expect(steps).toEqual([
    { id: 'tie-on', figure: 'warping', cautions: ['Nails'] },
    { id: 'wind', figure: 'shed-stick', cautions: [] },
    { id: 'rest', figure: undefined, cautions: [] },
  ]);
});

test('a text without steps has nothing for the loom side', () => {
  expect(stepsOf('Only words.')).toEqual([]);
});

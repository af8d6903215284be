import { describe, expect, test } from 'vitest';
import { isSeeToMend, seesToMend, seeToMend } from '#core/following/see-to-mend.ts';

const STEPS = [{ id: 'tie-on', words: 'Tie on.' }, { id: 'wind', words: 'Wind the warp.' }];

describe('where it says how to mend', () => {
  test('is a step of the part or a common fault, each offered by its words', () => {
    const offered = seesToMend(STEPS);
    expect(offered[1]).toEqual({ value: 'step:wind', label: 'Step 2: Wind the warp.' });
    expect(offered).toContainEqual({ value: 'fault:slack-end', label: 'Handbook: An end is slack' });
    expect(offered.every(({ value }) => isSeeToMend(value))).toBe(true);
  });

  test('leads to the heading in the handbook, or to the step on the same page', () => {
    expect(seeToMend('fault:crossed-ends', STEPS)).toEqual({ label: 'Two ends have changed places: how to mend it', href: '/handbook/mending-the-warp#crossed-ends' });
    expect(seeToMend('step:wind', STEPS)).toEqual({ label: 'Step 2, once more', href: '#step-wind' });
  });

  test('leads nowhere when the step is gone, and takes nothing else', () => {
    expect(seeToMend('step:gone', STEPS)).toBeNull();
    expect(['fault:none', 'https://elsewhere.example', 'step:', ''].map(isSeeToMend)).toEqual([false, false, false, false]);
  });
});

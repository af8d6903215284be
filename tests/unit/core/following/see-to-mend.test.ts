import { describe, expect, test } from 'vitest';
import { firstToSee, isSeeToMend, seesToMend, seeToMend } from '#core/following/see-to-mend.ts';

const STEPS = [{ id: 'tie-on', words: 'Tie on.' }, { id: 'wind', words: 'Wind the warp.' }];

describe('where it says how to mend', () => {
  test('is a step of the part or a common fault, each offered by its words', () => {
    const offered = seesToMend(STEPS, ['rya']);
    expect(offered[0]).toEqual({ value: 'technique:rya', label: expect.stringMatching(/^Handbook: Rya/) });
    expect(offered[2]).toEqual({ value: 'step:wind', label: 'Step 2: Wind the warp.' });
    expect(offered).toContainEqual({ value: 'fault:slack-end', label: 'Handbook: An end is slack' });
    expect(offered.every(({ value }) => isSeeToMend(value))).toBe(true);
  });

  test('leads to the heading in the handbook, or to the step on the same page', () => {
    expect(seeToMend('fault:crossed-ends', STEPS)).toEqual({ label: 'Two ends have changed places: how to mend it', href: '/handbook/mending-the-warp#crossed-ends' });
    expect(seeToMend('step:wind', STEPS)).toEqual({ label: 'Step 2, once more', href: '#step-wind' });
  });

  test('is the page of the technique the part teaches until another is chosen, plain tabby only where there is no other', () => {
    expect([firstToSee(['tabby', 'rya']), firstToSee(['tabby']), firstToSee([])]).toEqual(['technique:rya', 'technique:tabby', '']);
    expect(seeToMend('technique:rya', STEPS)).toMatchObject({ href: '/handbook/rya', label: expect.stringContaining('how it is worked') });
  });

  test('leads nowhere when the step is gone, and takes nothing else', () => {
    expect(seeToMend('step:gone', STEPS)).toBeNull();
    expect(['technique:none', 'fault:none', 'https://elsewhere.example', 'step:', ''].map(isSeeToMend)).toEqual([false, false, false, false, false]);
  });
});

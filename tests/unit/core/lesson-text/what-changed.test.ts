import { describe, expect, test } from 'vitest';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { whatChanged } from '#core/lesson-text/what-changed.ts';

function treeOf(source: string): LessonTree {
  const reading = parseLessonText(source);
  if (!reading.ok) throw new RangeError(source);
  return reading.tree;
}
const change = (before: string, after: string) => whatChanged(treeOf(before), treeOf(after), (key) => (key === 'ends' ? '38 ends' : '…'));
const told = (before: string, after: string): string[] => (change(before, after)?.lines ?? []).map(({ kind, text }) => `${kind} ${text}`);

describe('what a reader is told of a newer text', () => {
  test('is what she would read, with her own amounts, and no tags', () => {
    expect(told('<Step id="wind">Wind the warp.</Step>', '<Step id="wind">Wind <Amount of="ends"/>.</Step>')).toEqual(['out Wind the warp.', 'in Wind 38 ends.']);
  });

  test('counts new steps, steps that are gone, and passages', () => {
    expect(change('<Step id="a">One.</Step>\n\nWords.', '<Step id="b">One.</Step>\n\n<Step id="c">Two.</Step>\n\nOther words.')?.says).toBe('2 new steps, one step taken out and one passage');
    expect(change('## A\n\nOne.\n\nSame.\n\nTwo.', '## A\n\nFirst.\n\nSame.\n\nSecond.')?.says).toBe('2 passages');
  });

  test('names films, pictures and figures that came or went, and the title of a caution', () => {
    expect(told('Words.', 'Words.\n\n<Picture name="warped-loom" alt="A loom"/>\n\n<Caution title="Nails">Mind them.</Caution>')).toEqual(['same Words.', 'in Picture: warped loom', 'in Nails', 'in Mind them.']);
  });

  test('is nothing where only the writing differs: blanks, a name of a step, other marks for the same list', () => {
    expect(change('* One\n* Two\n\n<Step id="a">Go.</Step>', '- One\n- Two\n\n\n<Step id="b">Go.</Step>')).toBeNull();
    expect(change('Same.', 'Same.')).toBeNull();
  });

  test('keeps the lines of tables and lists apart', () => {
    expect(told('- One\n- Two', '- One\n- Three')).toEqual(['same One', 'out Two', 'in Three']);
    expect(told('| A | B |\n| - | - |\n| 1 | 2 |', '| A | B |\n| - | - |\n| 1 | 3 |')).toEqual(['same A B', 'out 1 2', 'in 1 3']);
  });
});

// How long reading a lesson takes: of the usual length, at the greatest length, and the slowest texts that the limits
// let through. The last are why reading happens in threads.
import { readFileSync } from 'node:fs';
import { bench, describe } from 'vitest';
import { LIMITS } from '#core/lesson-text/limits.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { preScan } from '#core/lesson-text/pre-scan.ts';
import { treeIsValid } from '#core/lesson-text/tree-is-valid.ts';

const lesson = readFileSync(new URL('../../content/series/low-tide/02-dress-the-loom.mdx', import.meta.url), 'utf8');
const prose = `${'You wind one long thread round the nails, up and down, until all of them stand side by side. '.repeat(6)}\n\n`;
const longest = prose.repeat(Math.floor(LIMITS.sourceLength / prose.length));
const read = parseLessonText(lesson);

describe('reading a lesson', () => {
  bench('of eight thousand characters', () => void parseLessonText(lesson));
  bench('of two hundred thousand characters of prose', () => void parseLessonText(longest));
  bench('looking at a kept tree again', () => void treeIsValid(read.ok && read.tree));
});

describe('the slowest texts we know', () => {
  bench('a line of signs without meaning', () => void parseLessonText(`${`${'='.repeat(41)}\n`.repeat(200)}\n`.repeat(20)));
  bench('half-open emphasis', () => void parseLessonText(`${'*a **b '.repeat(250)}\n\n`.repeat(13)));
  bench('items that never end', () => void parseLessonText('1.\n\n**]\\'.repeat(1_400)));
});

describe('what is refused before it is parsed', () => {
  bench('twenty thousand brackets', () => void preScan('['.repeat(20_000)));
  bench('two hundred thousand characters of prose, counted', () => void preScan(longest));
});

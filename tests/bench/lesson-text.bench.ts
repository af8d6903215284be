// How long reading a lesson takes: of the usual length, at the greatest length, and the slowest texts that the limits
// let through. The last are why reading happens in threads.
import { readdirSync, readFileSync } from 'node:fs';
import { bench, describe } from 'vitest';
import { LIMITS } from '#core/lesson-text/limits.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { KeptReadings } from '#core/lesson-text/read-in-stretches.ts';
import { preScan } from '#core/lesson-text/pre-scan.ts';
import { treeIsValid } from '#core/lesson-text/tree-is-valid.ts';

const lesson = readFileSync(new URL('../../content/series/low-tide/02-dress-the-loom.mdx', import.meta.url), 'utf8');
const prose = `${'You wind one long thread round the nails, up and down, until all of them stand side by side. '.repeat(6)}\n\n`;
const longest = prose.repeat(Math.floor(LIMITS.sourceLength / prose.length));
const read = parseLessonText(lesson);

/**
 * All seven parts of a series four times over, almost up to the greatest length, with a number in each paragraph, so
 * that none stands there twice. It is refused for its many steps, after all of it was read.
 */
const folder = new URL('../../content/series/low-tide/', import.meta.url);
const series = readdirSync(folder).filter((name) => name.endsWith('.mdx')).map((name) => readFileSync(new URL(name, folder), 'utf8')).join('\n\n');
let laps = 0;
const fourTimes = `${series}\n\n`.repeat(4).replace(/^(?:## |- \*\*|<(?:Figure|Caution|Tip) .*(?:caption|title)="|)(?=[A-Z])/gm, (start) => `${start}Lap ${String((laps += 1))} `);
const realistic = fourTimes.slice(0, fourTimes.lastIndexOf('\n\n## ', LIMITS.sourceLength));
const kept = new KeptReadings();
parseLessonText(realistic, kept);
let edits = 0;
/** A letter more in the middle, as one types. */
const edited = (): string => `${realistic.slice(0, 90_000)}${'x'.repeat((edits += 1) % 50)}${realistic.slice(90_000)}`;

describe('reading a lesson', () => {
  bench('of eight thousand characters', () => void parseLessonText(lesson));
  bench('of two hundred thousand characters of prose', () => void parseLessonText(longest));
  bench(`of ${String(realistic.length)} characters of lessons as they are, under 50 ms`, () => void parseLessonText(realistic));
  bench('of the same after an edit in the middle', () => void parseLessonText(edited(), kept));
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

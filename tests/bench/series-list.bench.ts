// How long the list of a series folder takes to read when it means harm: half a megabyte of what is slowest. Over half a second would hold up others.
import { bench, describe } from 'vitest';
import { FOLDER_LIMITS } from '#core/series-folder/limits.ts';
import { listFromYaml } from '#core/series-folder/list-as-yaml.ts';

const full = (unit: string): string => unit.repeat(Math.floor(FOLDER_LIMITS.maxListBytes / unit.length));
let key = 0;
const keys = full('k00000: 1\n').replaceAll('k00000', () => `k${String((key += 1)).padStart(5, '0')}`);
const tryReading = (source: string): void => {
  try {
    listFromYaml(source);
  } catch {
    // A refusal counts as read.
  }
};

describe('half a megabyte of a list', () => {
  for (const [what, source] of Object.entries({ items: full('- a\n'), keys, 'items in brackets': `[${full('a,')}]`, pairs: full('- a: b\n'), quotes: full('- "a"\n'), 'empty lines': `a: |\n${full('\n')}`, remarks: full('#\n') })) {
    bench(`of ${what}`, () => { tryReading(source); });
  }
});

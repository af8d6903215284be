// Every pattern and loop that meets a writer's characters one by one, with a hundred thousand of the worst of them.
import { describe, expect, test } from 'vitest';
import { isAmountKey } from '#core/lesson-text/amount-key.ts';
import { isName, readAttributeValue } from '#core/lesson-text/attribute-value.ts';
import { findBadCharacter } from '#core/lesson-text/characters.ts';
import { explainSyntaxError } from '#core/lesson-text/explain-syntax.ts';
import { checkLinkAddress } from '#core/lesson-text/link-address.ts';
import { plainWords } from '#core/lesson-text/plain-text.ts';
import { preScan } from '#core/lesson-text/pre-scan.ts';
import { readPlain } from '#core/lesson-text/read-plain.ts';
import { slugOf } from '#core/lesson-text/slugs.ts';
import { leastTime } from './least-time.ts';

const WORST = ['a', 'a-', 'a.', '-', '.', ' ', '\t', '\n', '[', '<', '`', '- ', '1.', '/', ':', '@', 'a@', '%', '\u200b', '\u0301', '\ud83e', '[]:', "'"];
const long = (unit: string): string => unit.repeat(Math.ceil(100_000 / unit.length));

const READERS: Record<string, (text: string) => unknown> = {
  isName,
  isAmountKey,
  'words of an attribute': (text) => readAttributeValue({ kind: 'words', required: true, maximum: 200, says: '' }, text),
  findBadCharacter,
  'checkLinkAddress, of https': (text) => checkLinkAddress(`https://${text}!`, Infinity),
  'checkLinkAddress, of mail': (text) => checkLinkAddress(`mailto:${text}!`, Infinity),
  'checkLinkAddress, of anything': (text) => checkLinkAddress(text, Infinity),
  plainWords: (text) => plainWords([{ type: 'text', value: text }]),
  preScan,
  readPlain: (text) => readPlain(text),
  'readPlain, of stress that does not close': (text) => readPlain(`Z *a${text}`),
  'readPlain, of a tag that does not close': (text) => readPlain(`<A${' b="c"'.repeat(20_000)}${text}`),
  slugOf,
  explainSyntaxError: (text) => explainSyntaxError(Object.assign(new Error('x'), { reason: `Unexpected \`<${text}`, ruleId: 'end-tag-mismatch', line: 1, column: 1 }), text),
};

describe.each(Object.entries(READERS))('%s', (_name, read) => {
  test.each(WORST.map((unit) => [JSON.stringify(unit), long(unit)]))('is through with %s in less than 50 ms', (_unit, text) => {
    expect(leastTime(() => read(text), 50)).toBeLessThan(50);
  });
});

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { judgePassword } from '#core/password-rules.ts';
import { isCommonPassword } from '#server/auth/common-passwords.ts';

const maud = { isSteward: false, ownWords: ['Maud Ellery', 'maud.ellery@weavers.example'], isCommon: isCommonPassword };

function judged(password: string, isSteward = false): string {
  const verdict = judgePassword(password, { ...maud, isSteward });
  return verdict.ok ? 'taken' : verdict.reason;
}

describe('a password', () => {
  test.each([
    ['three words in a row', 'estuary shuttle heron', 'taken'],
    ['twelve chosen by chance', 'k4vq-zzp2-tm', 'taken'],
    ['letters of any script', '織物と経糸の間に風が吹く', 'taken'],
    ['spaces at its ends, which count', ' two kettles ', 'taken'],
    ['sixty-four characters and more', 'heron estuary kettle '.repeat(12), 'pattern'],
    ['a long sentence of one’s own', 'the tide goes out at nine and the herons stand in what it leaves behind', 'taken'],
    ['two hundred and fifty-six', Array.from({ length: 128 }, (_, at) => String.fromCharCode(0x4e00 + at * 7) + String.fromCharCode(97 + ((at * at) % 26))).join(''), 'taken'],
    ['eleven', 'k4vq-zzp2-t', 'short'],
    ['nothing', '', 'short'],
    ['two hundred and fifty-seven', `${'k4vq-zzp2-tm'.repeat(21)}hullo`, 'long'],
    ['a common one', 'qwertyuiop123', 'common'],
    ['a common one in capitals', 'QWERTYUIOP123', 'common'],
    ['a common one with a year behind it', 'Sunshine-2024', 'common'],
    ['a common one twice', 'dragondragon!', 'common'],
    ['one known from leaks', '1qaz2wsx3edc', 'common'],
    ['one sign over and over', 'aaaaaaaaaaaaaa', 'pattern'],
    ['one piece over and over', 'kv7kv7kv7kv7kv7', 'pattern'],
    ['a run of figures', '123456789012', 'pattern'],
    ['the alphabet', 'abcdefghijklmnop', 'pattern'],
    ['the name of the site', 'fellmark-fellmark2', 'known'],
    ['her own name', 'MaudEllery1987', 'known'],
    ['her own address', 'maud.ellery@weavers', 'known'],
    ['words of the site', 'weavingworkshop1', 'known'],
  ])('of %s', (_what, password, verdict) => {
    expect(judged(password)).toBe(verdict);
  });

  test('of a steward has at least fifteen characters', () => {
    expect(judged('k4vq-zzp2-tm', true)).toBe('short');
    expect(judged('k4vq-zzp2-tmb9x', true)).toBe('taken');
  });

  test('is counted in characters as people see them written, not in bytes', () => {
    expect(judged('🧶🐑🪡🧵🪢🪵🌊🐚🦀🪶🌾🦢')).toBe('taken');
    expect(judged('🧶🐑🪡🧵🪢🪵🌊🐚🦀🪶🌾')).toBe('short');
  });

  test('that is refused is refused with a sentence that says what works', () => {
    const verdict = judgePassword('short', maud);
    expect(verdict.ok ? '' : verdict.says).toBe('This has 5 characters. At least 12 work; three or four words in a row are easy to keep.');
  });

  test('of any signs is judged without failing', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme', maxLength: 300 }), (password) => typeof judgePassword(password, maud).ok === 'boolean'));
  });

  test('chosen by chance is never refused once it is long enough', () => {
    const random = fc.array(fc.constantFrom(...'abcdefghjkmnpqrstuvwxyz23456789'), { minLength: 20, maxLength: 20 }).map((signs) => signs.join(''));
    fc.assert(fc.property(random.filter((text) => new Set(text).size >= 10), (password) => judgePassword(password, maud).ok));
  });
});

test('the file of common passwords holds the commonest, whole and as the body of longer ones', () => {
  for (const word of ['password', 'qwerty', 'dragon', 'sunshine', 'letmein', '1q2w3e4r5t6y', 'qwertyuiop']) expect(isCommonPassword(word), word).toBe(true);
  for (const word of ['estuary', 'k4vq-zzp2-tm', '', 'saltmarsh loom room']) expect(isCommonPassword(word), word).toBe(false);
});

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { isEnvelopeAddress, parseMailAddress } from '#core/mail-address.ts';

function addressOf(text: string): string {
  const outcome = parseMailAddress(text);
  return outcome.ok ? outcome.value.address : (outcome.problems[0]?.code ?? '');
}

describe('a mail address', () => {
  test.each([
    ['maud@weavers.example', 'maud@weavers.example'],
    ['  maud@weavers.example ', 'maud@weavers.example'],
    ['Maud.Ellery+loom@Weavers.EXAMPLE', 'Maud.Ellery+loom@weavers.example'],
    ["o'dell@weavers.example", "o'dell@weavers.example"],
    ['a@x-y.co', 'a@x-y.co'],
    ['maud@wübstuhl.example', 'maud@xn--wbstuhl-n2a.example'],
    ['maud@織物.example', 'maud@xn--g2x37w.example'],
    [`${'a'.repeat(64)}@weavers.example`, `${'a'.repeat(64)}@weavers.example`],
  ])('%s is written to as %s', (typed, address) => {
    expect(addressOf(typed)).toBe(address);
  });

  test.each([
    ['', 'E_ADDRESS_MISSING'],
    ['maud', 'E_ADDRESS_NO_AT'],
    ['@weavers.example', 'E_ADDRESS_NO_NAME'],
    ['maud@', 'E_ADDRESS_NO_DOMAIN'],
    ['maud@a@b.example', 'E_ADDRESS_MANY'],
    ['a@x.example, b@x.example', 'E_ADDRESS_MANY'],
    ['b@x.example\r\nRCPT TO:<evil@x.example>', 'E_ADDRESS_MANY'],
    ['b@x.example\r\nDATA', 'E_ADDRESS_SIGN'],
    ['b@x.example\0', 'E_ADDRESS_SIGN'],
    ['Maud <maud@weavers.example>', 'E_ADDRESS_SIGN'],
    ['maud ellery@weavers.example', 'E_ADDRESS_SIGN'],
    ['"maud"@weavers.example', 'E_ADDRESS_SIGN'],
    ['maud;x@weavers.example', 'E_ADDRESS_SIGN'],
    ['maud@weavers,example', 'E_ADDRESS_SIGN'],
    ['maud@[127.0.0.1]', 'E_ADDRESS_SIGN'],
    ['maud@weavers.exam\u200bple', 'E_ADDRESS_SIGN'],
    [`${'a'.repeat(65)}@weavers.example`, 'E_ADDRESS_LONG'],
    [`a@${'b'.repeat(250)}.example`, 'E_ADDRESS_LONG'],
    [`a@${'b'.repeat(64)}.example`, 'E_ADDRESS_DOMAIN'],
    ['.maud@weavers.example', 'E_ADDRESS_NAME'],
    ['ma..ud@weavers.example', 'E_ADDRESS_NAME'],
    ['müd@weavers.example', 'E_ADDRESS_NAME'],
    ['maud@weavers', 'E_ADDRESS_DOMAIN'],
    ['maud@127.0.0.1', 'E_ADDRESS_DOMAIN'],
    ['maud@weavers..example', 'E_ADDRESS_DOMAIN'],
    ['maud@-weavers.example', 'E_ADDRESS_DOMAIN'],
    ['maud@weavers.example/x', 'E_ADDRESS_DOMAIN'],
    ['maud@weavers.example?x', 'E_ADDRESS_DOMAIN'],
    ['maud@weavers%2eexample', 'E_ADDRESS_DOMAIN'],
  ])('%j is refused: %s', (typed, code) => {
    expect(addressOf(typed)).toBe(code);
  });

  test('says what is missing and how to write it', () => {
    const outcome = parseMailAddress('maud@');
    expect(outcome.ok ? '' : outcome.problems[0]?.message).toBe('The part after the @ is missing. Write it like name@saltmarsh.example.');
  });

  test('is one person’s, however it is written', () => {
    const keys = ['Maud@Weavers.example', 'maud@weavers.EXAMPLE', ' maud@weavers.example'].map((typed) => {
      const outcome = parseMailAddress(typed);
      return outcome.ok ? outcome.value.key : undefined;
    });
    expect(new Set(keys)).toEqual(new Set(['maud@weavers.example']));
  });

  test('that is accepted names exactly one recipient, whatever was typed', () => {
    const parts = fc.string({ unit: fc.constantFrom(...'abcAZ09.@-+_<>,;:"\'\\() \r\n\0\u200bé%[]#/?') });
    fc.assert(
      fc.property(parts, parts, (local, domain) => {
        const outcome = parseMailAddress(`${local}@${domain}.example`);
        if (!outcome.ok) return;
        expect(outcome.value.address).toMatch(/^[^\s<>,;:"\\()@]+@[a-z0-9.-]+$/);
        expect(isEnvelopeAddress(outcome.value.address)).toBe(true);
      }),
      { numRuns: 2000 },
    );
  });
});

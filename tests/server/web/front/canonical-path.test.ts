import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { canonicalTarget } from '#server/web/front/canonical-path.ts';

describe('every address has one spelling', () => {
  test.each([
    ['//workroom', '/workroom'],
    ['/\\workroom', '/workroom'],
    ['\\\\workroom', '/workroom'],
    ['///workroom', '/workroom'],
    ['/%5Cworkroom', '/workroom'],
    ['/%77orkroom', '/workroom'],
    ['/x/../workroom', '/workroom'],
    ['/x/%2e%2E/workroom', '/workroom'],
    ['/./workroom/.', '/workroom/'],
    ['/../../etc/passwd', '/etc/passwd'],
    ['/workroom//?a=//b', '/workroom/?a=//b'],
    ['//evil.example/%2e%2e', '/'],
    ['/series/low-tide?back=/../x', '/series/low-tide?back=/../x'],
    ['/caf%c3%a9', '/caf%C3%A9'],
  ])('%s is %s', (spelling, canonical) => {
    expect(canonicalTarget(spelling)).toBe(canonical);
  });

  test('an escaped escape is unescaped once at most', () => {
    expect(canonicalTarget('/%2577orkroom')).toBe('/%2577orkroom');
    expect(canonicalTarget('/%252e%252e/x')).toBe('/%252e%252e/x');
  });

  test.each(['http://other.example/', 'workroom', '', '/%zz', '/%', '/a%00b', '/a#b', '*'])('%s is no address at all', (target) => {
    expect(canonicalTarget(target)).toBeUndefined();
  });

  test('a canonical address stays as it is, and never begins like the address of another host', () => {
    const piece = fc.constantFrom('/', '\\', '.', '..', '%2e', '%2F', '%5c', '%61', 'a', 'workroom', '%25', '?', '=');
    fc.assert(fc.property(fc.array(piece, { maxLength: 12 }), (pieces) => {
      const canonical = canonicalTarget(`/${pieces.join('')}`);
      expect(canonical).toBeDefined();
      expect(canonicalTarget(canonical ?? '')).toBe(canonical);
      expect(canonical).not.toMatch(/^\/[/\\]/);
    }));
  });
});

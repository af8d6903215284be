import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { canonicalForm, decodeForm, type FormGroup, type FormValue } from '#stand-ins/payment/form-body.ts';

/** Prototypes apart, so that groups compare with literals. */
function plain(form: FormValue): unknown {
  return JSON.parse(JSON.stringify(form)) as unknown;
}

describe('a form', () => {
  test.each([
    ['', {}],
    ['a=1&b=two', { a: '1', b: 'two' }],
    ['a[b][c]=1', { a: { b: { c: '1' } } }],
    ['a[0]=x&a[1]=y', { a: ['x', 'y'] }],
    ['a[1]=y&a[0]=x', { a: ['x', 'y'] }],
    ['a[]=x&a[]=y', { a: ['x', 'y'] }],
    ['a[0][b]=1&a[0][c]=2&a[1][b]=3', { a: [{ b: '1', c: '2' }, { b: '3' }] }],
    ['a%5Bb%5D=1', { a: { b: '1' } }],
    ['a=x+y%26z', { a: 'x y&z' }],
    ['a[=1', { 'a[': '1' }],
    ['a=', { a: '' }],
  ])('%j is read as %j', (text, form) => {
    expect(plain(decodeForm(text))).toEqual(form);
  });

  test('cannot reach what it is not', () => {
    decodeForm('__proto__[polluted]=1&constructor[prototype][polluted]=1&a[__proto__][polluted]=1');
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });

  test('that goes too deep or says two things of one name is refused', () => {
    expect(() => decodeForm(`a${'[b]'.repeat(9)}=1`)).toThrow(/too deeply/);
    expect(() => decodeForm('a=1&a[b]=2')).toThrow(/value and as a group/);
    expect(() => decodeForm('a[b]=2&a=1')).toThrow(/value and as a group/);
  });

  test('is the same in every order of its parts', () => {
    const parts = ['a=1', 'b[c]=2', 'b[d][0]=3', 'b[d][1]=4', 'e=5'];
    const one = canonicalForm(decodeForm(parts.join('&')));
    fc.assert(
      fc.property(fc.shuffledSubarray(parts, { minLength: parts.length }), (shuffled) => {
        expect(canonicalForm(decodeForm(shuffled.join('&')))).toBe(one);
      }),
    );
  });

  test('of any kind never breaks the reader', () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(...'ab[]=&0%+_') }), (text) => {
        let form: FormGroup = {};
        try {
          form = decodeForm(text);
        } catch (error) {
          expect((error as Error).name).toBe('ApiError');
        }
        expect(typeof canonicalForm(form)).toBe('string');
      }),
      { numRuns: 2000 },
    );
  });
});

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { answerForm, type ReckonerAnswer } from '#core/reckoner/answer-form.ts';
import { RECKONER_DEFAULTS, RECKONER_FIELDS, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';

const PARTS = ['yarn', 'sett', 'cloth', 'soumak', 'rya', 'shape', 'rod', 'piece'] as const;

describe('an answer after another', () => {
  const first = answerForm(RECKONER_DEFAULTS);
  const after = (typed: Partial<ReckonerForm>): ReckonerAnswer => answerForm({ ...RECKONER_DEFAULTS, ...typed }, first);
  const kept = (now: ReckonerAnswer): string[] => [...PARTS.filter((part) => now[part] === first[part]), ...(now.errors === first.errors ? ['errors'] : [])];

  test('hands back, as they were, the parts that a letter does not concern', () => {
    expect(kept(after({ rise: '13' }))).toEqual([...PARTS.filter((part) => part !== 'rod'), 'errors']);
    expect(kept(after({ pile: '20' }))).toEqual([...PARTS.filter((part) => part !== 'rya'), 'errors']);
    expect(kept(after({ rise: '' }))).not.toContain('errors');
    expect(kept(after({}))).toHaveLength(PARTS.length + 1);
  });

  test('says just what it says without the one before', () => {
    const words = (answer: ReckonerAnswer): unknown => JSON.parse(JSON.stringify({ ...answer, steps: PARTS.map((part) => answer[part].workings?.()) }));
    fc.assert(
      fc.property(fc.constantFrom(...RECKONER_FIELDS), fc.constantFrom('1', '2', '7', '12,5', 'in', 'rya', 'circle', ''), (field, value) => {
        const form = { ...RECKONER_DEFAULTS, [field]: value };
        expect(words(answerForm(form, first))).toEqual(words(answerForm(form)));
      }),
      { numRuns: 25, seed: 7 },
    );
  });
});

import { describe, expect, test } from 'vitest';
import { StashForm } from '#contracts/following.ts';
import { stashOf } from '#server/queries/gathering/stash-of.ts';
import { keepStash } from '#server/use-cases/progress/keep-stash.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

describe('what a student has already', () => {
  test('is kept for her seat; of a yarn that is not named nothing changes, and none takes it away', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    const keep = (yarn: string[], have: string[]) => keepStash(ctx, StashForm.parse({ series: series.slug, yarn, have }));
    await keep(['wool|#112233|', 'cotton||'], ['1.5 balls', '40 g']);
    await keep(['cotton||'], ['']);
    expect([...await stashOf(seat.id)]).toEqual([['wool|#112233|', { amount: 1.5, unit: 'balls' }]]);
    await keep(['wool|#112233|'], ['120 m']);
    expect([...await stashOf(seat.id)]).toEqual([['wool|#112233|', { amount: 120_000, unit: 'mm' }]]);
    expect([...await stashOf(null)]).toEqual([]);
  });

  test('is refused to a visitor, and to whoever has no seat', async () => {
    const { series } = await buildFollowed();
    const input = StashForm.parse({ series: series.slug, yarn: ['wool||'], have: ['40 g'] });
    await expect(keepStash(contextOf(null), input)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(keepStash(await contextFor(await buildUser()), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('that cannot be read is asked for at its field', () => {
    const parsed = StashForm.safeParse({ series: 'low-tide', yarn: ['a', 'b'], have: ['40 g', 'much'] });
    expect(parsed.error?.issues).toMatchObject([{ path: ['have', 1], message: 'Write what you have like 40 g, 120 m, 2 oz, 130 yd or 1.5 balls.' }]);
  });
});

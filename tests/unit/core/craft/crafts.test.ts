import { describe, expect, test } from 'vitest';
import { amountKeysOf, amountOf } from '#core/craft/amounts.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { CRAFT_NAMES, CRAFTS, craftOf, type Piece } from '#core/craft/crafts.ts';
import { fitPiece } from '#core/craft/fit.ts';
import { planPiece } from '#core/craft/plan.ts';
import { reckon } from '#core/craft/reckon.ts';

describe.each(CRAFT_NAMES)('the craft %s', (name) => {
  const piece: Piece = CRAFTS[name].example;
  const planned = planPiece(piece);
  if (!planned.ok) throw new Error(JSON.stringify(planned.problems));
  const made = { piece, plan: planned.value };

  test('answers the public reckoner with the plan of its example', () => {
    const answer = reckon({ what: 'piece', piece });
    // Warnings point into the question there, into the piece here.
    expect(answer.ok && { ...answer.value, warnings: [] }).toEqual({ ...planned.value, warnings: [] });
    expect(planned.value.massG).toBeGreaterThan(0);
    expect(planned.value.hours.low).toBeLessThan(planned.value.hours.high);
  });

  test('tells amounts, materials, size and summary, and draws itself with words', () => {
    expect(amountKeysOf(piece, planned.value).length).toBeGreaterThan(4);
    for (const { key } of craftOf(piece).materials(made)) expect(amountOf(key, piece, planned.value).ok, key).toBe(true);
    expect(craftOf(piece).size(made, 'in')).not.toMatch(/\bcm\b/);
    expect(craftOf(piece).summary(made, 'cm')).toMatch(/\d/);
    expect(drawCloth(clothOf(piece, planned.value, 'It'), { id: 'a', as: 'hanging', width: 200 })).toMatch(/role="img" aria-label="It, [^"]{20,}"/);
  });

  test('says its cautions and sends to people who know', () => {
    expect(craftOf(piece).cautions.length).toBeGreaterThan(0);
    for (const { says } of craftOf(piece).cautions) expect(says).toMatch(/local rules/);
  });

  test('a student without wishes of her own has the pattern as it is', () => {
    const fitted = fitPiece(piece, {});
    expect(fitted.ok && fitted.value.changes).toEqual([]);
    expect(fitted.ok && fitted.value.plan).toEqual(planned.value);
  });
});

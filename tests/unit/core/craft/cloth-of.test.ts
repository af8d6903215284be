import { expect, test } from 'vitest';
import { clothOf, wovenOf } from '#core/craft/cloth-of.ts';
import { isMadeIn } from '#core/craft/crafts.ts';
import { planOf, PLAIN_PIECE } from './a-piece.ts';
import { BRAID, planOf as planOfKnots } from './macrame/a-hanging.ts';

test('a woven piece can be shown growing, a knotted one is only drawn', () => {
  expect(wovenOf(PLAIN_PIECE, planOf(PLAIN_PIECE), 'Low tide')).toMatchObject({ kind: 'woven', title: 'Low tide' });
  expect(wovenOf(BRAID, planOfKnots(BRAID), 'Braid')).toBeNull();
  expect(clothOf(BRAID, planOfKnots(BRAID), 'Braid').kind).not.toBe('woven');
});

test('a piece is made in its own craft', () => {
  const woven = { piece: PLAIN_PIECE, plan: planOf(PLAIN_PIECE) };
  expect([isMadeIn('frame-loom', woven), isMadeIn('macrame', woven)]).toEqual([true, false]);
});

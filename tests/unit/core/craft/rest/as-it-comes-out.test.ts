/** A piece half woven as its texts and lists tell it. The plain piece has 277 rows of 328.4816 mm and one band. */
import { describe, expect, test } from 'vitest';
import { isMadeIn } from '#core/craft/crafts.ts';
import type { Made } from '#core/craft/fitting/tell-changes.ts';
import { madeFor, type MadeFor } from '#core/craft/made-for.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { amountFor, amountToHave } from '#core/craft/rest/amount-for.ts';
import { restListWords, restWords } from '#core/craft/rest/rest-words.ts';
import type { WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { amountText } from '#core/units/format-amount.ts';
import { lowTide } from '../../../../support/low-tide.ts';
import { pieceWith, planOf } from '../a-piece.ts';

const pattern = await lowTide();
const NAMED: FrameLoomPiece = pieceWith({ bands: [{ technique: 'tabby', name: 'sky', yarn: 'ground', fill: true }] });
const MEASURED: WovenSoFar = { bandsDone: 0, rows: 100, heightMm: 163.9 };
const plain = (words: string): string => words.replaceAll('\u00a0', ' ');

function made(piece: FrameLoomPiece, woven: WovenSoFar): MadeFor & Made {
  const found = madeFor(piece, {}, 'cm', woven);
  if (found === null || found.halfway === null || !isMadeIn('frame-loom', found)) throw new Error('not half way');
  return found;
}

function told(key: string, woven: WovenSoFar, piece = NAMED) {
  const amount = amountFor(key, made(piece, woven));
  if (!amount.ok) throw new Error(amount.problems[0]?.message);
  const { howReckoned: { inputs, trust } } = amount.value;
  return { is: plain(amountText(amount.value, 'cm')), trust, left: inputs.filter(({ name }) => name === 'still to weave').map(({ value }) => plain(amountText(value, 'cm'))) };
}

describe('the whole of it, in a text', () => {
  // 100 rows are woven and 149 are left, at 1.60622 mm from row to row.
  test('has the rows that are woven and those that were measured', () => {
    expect(told('band.sky.rows', MEASURED)).toEqual({ is: '249 rows', trust: 'measured', left: ['149 rows'] });
    expect(told('band.sky.rows', { bandsDone: 0, rows: 100 })).toEqual({ is: '277 rows', trust: 'formula', left: ['177 rows'] });
  });

  test('has the yarn that is woven and that of the rest', () => {
    const [whole, half] = [planOf(NAMED), made(NAMED, MEASURED)];
    const fewerMm = (whole.yarns['ground']?.netMm ?? 0) - (half.plan.yarns['ground']?.netMm ?? 0);
    // 28 rows fewer, and their tails.
    expect(fewerMm).toBeGreaterThan(28 * 328);
    expect(fewerMm).toBeLessThan(28 * 329 + 300);
    expect(told('yarn.ground', MEASURED).left).toEqual([plain(amountText({ kind: 'length', mm: half.halfway?.rest.yarns['ground']?.netMm ?? 0, use: 'yarn' }, 'cm'))]);
  });

  test('is the plan itself where nothing was measured', () => {
    for (const bandsDone of [1, 7, pattern.bands.length]) {
      const { warnings: _, ...plan } = made(pattern, { bandsDone }).plan;
      expect(planOf(pattern)).toMatchObject(plan);
    }
  });

  test('leaves bands that are woven as they were planned, and reckons those to come anew', () => {
    const dunes = pattern.bands.findIndex(({ name }) => name === 'dunes');
    const half = made(pattern, { bandsDone: dunes, rows: 40, heightMm: 160 });
    const bands = half.plan.bands;
    const planned = planOf(pattern).bands;
    expect(half.halfway?.rest.trust).toBe('measured');
    expect(bands.slice(0, dunes)).toEqual(planned.slice(0, dunes));
    expect(bands[dunes]).not.toEqual(planned[dunes]);
    expect(bands.at(-2)).not.toEqual(planned.at(-2));
    expect(bands.map(({ index }) => index)).toEqual(planned.map(({ index }) => index));
  });

  test('hours are those that went and those to go', () => {
    const [whole, half] = [planOf(NAMED), made(NAMED, MEASURED)];
    expect(half.plan.hours.likely).toBeCloseTo(whole.hours.likely - (28 * 57.2) / 3600, 2);
  });
});

describe('what must still be had', () => {
  const toHave = (key: string, woven: WovenSoFar): string => {
    const amount = amountToHave(key, made(pattern, woven));
    return typeof amount === 'string' ? amount : amount.ok ? plain(amountText(amount.value, 'cm')) : (amount.problems[0]?.message ?? '');
  };

  test('is nothing of what is woven or wound', () => {
    const all = { bandsDone: pattern.bands.length };
    expect(['yarn.water', 'yarn.fringe.mass', 'band.sky.yarn', 'warp', 'warp.mass'].map((key) => toHave(key, all))).toEqual(['woven', 'woven', 'woven', 'on-loom', 'on-loom']);
    expect(toHave('dowel.length', all)).toMatch(/cm$/);
    expect(toHave('yarn.nobody', all)).toContain('no yarn in the role');
  });
});

describe('the words for it', () => {
  test('say how far she is, and by what the rest is reckoned', () => {
    expect(restWords(made(NAMED, MEASURED), 'cm')).toBe('You said that 100 of 249 rows of the first band are woven. What is woven stays as it is, and the rest is reckoned anew with the 6.2 rows in a centimetre you measured.');
    expect(restWords(made(NAMED, MEASURED), 'in')).toContain('15.8 rows in an inch');
    expect(restWords(made(pattern, { bandsDone: 3 }), 'cm')).toBe(`You said that 3 of ${String(pattern.bands.length)} bands are woven. What is woven stays as it is, and the rest follows the plan.`);
    expect(restListWords(made(pattern, { bandsDone: pattern.bands.length }))).toContain('every band is woven');
  });

  test('are none while nothing is woven', () => {
    expect([restWords(madeFor(NAMED, {}, 'cm'), 'cm'), restListWords(null)]).toEqual(['', '']);
  });
});

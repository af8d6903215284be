// Every pair of colours that stands on another is checked in the sheet as it is shipped: text 4.5, parts of controls and
// drawings 3 (WCAG 2.2, 1.4.3 and 1.4.11).
import type { Root } from 'postcss';
import { beforeAll, describe, expect, it } from 'vitest';
import { contrast } from './contrast.ts';
import { colour, shippedSheet, variables, type Scheme } from './shipped-sheet.ts';

const text = 4.5;
const part = 3;

/** [what lies on top, what it lies on, least ratio] */
const pairs: readonly (readonly [string, string, number])[] = [
  ...(['ground', 'sheet', 'field'] as const).flatMap((below) => [
    ['ink', below, text] as const, ['ink-2', below, text] as const, ['link', below, text] as const, ['mend', below, text] as const,
    ['moss', below, text] as const, ['edge', below, part] as const, ['ring', below, part] as const, ['act', below, part] as const,
  ]),
  ['on-act', 'act', text], ['on-tint', 'tint', text], ['on-mend', 'mend', text], ['on-moss', 'moss', text],
  ['mend', 'mend-tint', text], ['on-toast', 'toast', text], ['bar', 'ground', part],
  // On what keeps its colour in both schemes
  ['wool-0', 'moss-600', text], ['wool-0', 'moss-700', text], ['wool-0', 'madder-600', text], ['wool-0', 'madder-700', text],
  ['woad-900', 'weld-400', text], ['wool-50', 'woad-950', text], ['wool-0', 'big', text], ['weld', 'weld-edge', part],
  ['ring', 'ring-2', part],
];

/** The table of the design: what was reckoned when the colours were chosen. A changed colour shows here first. */
const chosen: readonly (readonly [string, string, number, number])[] = [
  ['ink', 'ground', 12.6, 14.2], ['ink', 'sheet', 15.0, 12.9], ['ink', 'field', 16.0, 15.1],
  ['ink-2', 'ground', 5.8, 8.5], ['ink-2', 'sheet', 6.9, 7.7], ['ink-2', 'field', 7.4, 9.0],
  ['link', 'ground', 6.0, 8.5], ['link', 'sheet', 7.1, 7.7], ['on-act', 'act', 13.8, 14.6],
  ['wool-0', 'moss-600', 6.8, 6.8], ['wool-0', 'madder-600', 6.9, 6.9], ['wool-50', 'woad-950', 16.7, 16.7],
  ['mend', 'ground', 5.5, 8.1], ['mend', 'sheet', 6.5, 7.3], ['mend', 'field', 6.9, 8.6],
  ['moss', 'ground', 5.3, 9.0], ['moss', 'sheet', 6.3, 8.1], ['on-tint', 'tint', 14.8, 11.6],
  ['edge', 'ground', 3.9, 4.9], ['edge', 'sheet', 4.6, 4.4], ['edge', 'field', 4.9, 5.2],
  ['ring', 'ground', 12.6, 11.2], ['ring', 'sheet', 15.0, 10.1], ['weld', 'weld-edge', 10.3, 11.8],
  ['woad-900', 'weld-400', 10.3, 10.3], ['bar', 'ground', 4.0, 5.7],
];

let sheet: Root;
beforeAll(async () => {
  sheet = await shippedSheet();
});

const ratio = (scheme: Scheme, above: string, below: string): number => {
  const all = variables(sheet, scheme);
  return contrast(colour(all, above), colour(all, below));
};

describe.each(['day', 'evening', 'evening by the system'] as const)('colours by %s', (scheme) => {
  it.each(pairs)('%s can be told from %s', (above, below, least) => {
    expect(ratio(scheme, above, below)).toBeGreaterThanOrEqual(least);
  });

  it('keeps the fell in sight: weld itself, or its edge, stands out from the ground', () => {
    expect(Math.max(ratio(scheme, 'weld', 'ground'), ratio(scheme, 'weld-edge', 'ground'))).toBeGreaterThanOrEqual(part);
  });
});

it.each(chosen)('%s on %s is as chosen', (above, below, day, evening) => {
  expect(ratio('day', above, below)).toBeCloseTo(day, 1);
  expect(ratio('evening', above, below)).toBeCloseTo(evening, 1);
});

it('sets the same colours whether the person or the system asks for the evening', () => {
  expect(variables(sheet, 'evening by the system')).toEqual(variables(sheet, 'evening'));
});

it('prints ink on white', () => {
  for (const above of ['ink', 'ink-2', 'link', 'mend', 'moss', 'on-tint', 'on-act']) {
    expect(contrast(colour(variables(sheet, 'paper'), above), [255, 255, 255]), above).toBeGreaterThanOrEqual(text);
  }
});

it('reckons black on white as 21 to 1', () => {
  expect(contrast([0, 0, 0], [255, 255, 255])).toBeCloseTo(21, 10);
  expect(contrast([255, 255, 255], [119, 119, 119])).toBeCloseTo(4.48, 2);
});

import { describe, expect, test } from 'vitest';
import { fitPiece } from '#core/craft/fit.ts';
import { exampleLooms } from '#core/craft/fitting/example-looms.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { lowTide } from '../../../../support/low-tide.ts';
import { BRAID } from '../macrame/a-hanging.ts';

const pattern = await lowTide();

describe('looms to look at a lesson with', () => {
  test('are a small one, one with wide nails, and the pattern’s own in the other units', () => {
    expect(exampleLooms(pattern, 'cm').map(({ label, units }) => `${label}: ${units}`)).toEqual([
      'A small loom, 30 cm inside: cm', 'A loom with nails 10 mm apart: cm', 'Your pattern piece, in inches: in',
    ]);
    expect(exampleLooms(pattern, 'in').map(({ label, units }) => `${label}: ${units}`)).toEqual([
      'A small loom, about 12 in inside: in', 'A loom with nails about 3/8 in apart: in', 'Your pattern piece, in centimetres: cm',
    ]);
  });

  test('are only other units where there is no piece yet, or none from a frame', () => {
    expect(exampleLooms(null, 'cm').map(({ name }) => name)).toEqual(['other-units']);
    expect(exampleLooms(BRAID, 'in').map(({ name, units }) => `${name} ${units}`)).toEqual(['other-units cm']);
  });

  test('hold the demo series, each with a piece that can be made on it', () => {
    const made = exampleLooms(pattern, 'cm').map(({ mine, units }) => fitPiece<FrameLoomPiece>(pattern, mine, units));
    expect(made.map((outcome) => (outcome.ok ? outcome.value.piece.size.widthMm : 0))).toEqual([200, 400, 400]);
  });
});

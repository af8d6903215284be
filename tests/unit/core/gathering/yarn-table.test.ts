import { expect, test } from 'vitest';
import { planPiece } from '#core/craft/plan.ts';
import { yarnTable } from '#core/gathering/yarn-table.ts';
import { seriesFigures } from '#core/series/figures.ts';
import { lowTide } from '../../../support/low-tide.ts';

async function made() {
  const piece = await lowTide();
  const plan = planPiece(piece);
  if (!plan.ok) throw new Error('the demo piece cannot be reckoned');
  return { piece, plan: plan.value };
}

test('a yarn that plays two roles is one line to buy, the warp stands first', async () => {
  const { piece, plan } = await made();
  const { lines } = yarnTable(piece, plan);
  expect(lines.map(({ name, detail }) => `${name} / ${detail}`)).toEqual([
    'Saltmarsh warp 12/6 / ', 'Fenwool 6/2 / Estuary', 'Fenwool 6/2 / Slack Water', 'Fenwool 6/2 / Dry Sand', 'Fenwool 6/2 / Samphire', 'Fenwool 6/2 / Foam',
  ]);
  const [shore, ridge] = [plan.yarns['shore'], plan.yarns['ridge']];
  expect(lines[1]?.lengthMm).toBeCloseTo((shore?.withMarginMm ?? 0) + (ridge?.withMarginMm ?? 0));
});

test('weights are those of the lengths to have in hand, and add up', async () => {
  const { piece, plan } = await made();
  const { lines, grams } = yarnTable(piece, plan);
  // 500 tex: half a gram a metre.
  expect(lines[0]?.grams).toBeCloseTo((plan.warp.withMarginMm / 1000) * 0.5);
  expect(grams).toBeCloseTo(lines.reduce((sum, line) => sum + line.grams, 0));
  expect(seriesFigures(piece, plan).yarnGrams).toBeCloseTo(grams);
});

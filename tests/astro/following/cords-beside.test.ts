import { experimental_AstroContainer as AstroContainer } from 'astro/container';
import { expect, test } from 'vitest';
import CordsBeside from '#components/following/CordsBeside.astro';
import { CRAFTS } from '#core/craft/crafts.ts';
import { fitPiece } from '#core/craft/fit.ts';

const pattern = CRAFTS.macrame.example;
const [role = ''] = Object.keys(pattern.yarns);

test('a thicker cord of her own stands beside the pattern: two drawings, what each takes, what differs', async () => {
  const fitted = fitPiece(pattern, { cords: { [role]: { diameterMm: 8, label: 'Rope from the attic' } } });
  if (!fitted.ok) throw new Error(fitted.problems[0]?.message);
  const container = await AstroContainer.create();
  const page = await container.renderToString(CordsBeside, { props: { pattern, fitted: fitted.value, name: 'Cords', teacher: 'Teodor', units: 'cm' } });
  expect(page.match(/<svg /g)).toHaveLength(2);
  expect(page).toContain('Rope from the attic is the');
  expect(page).toContain('Teodor’s');
  const width = /Width<\/th>\s*<td class="num"[^>]*>([\d.]+).*?<td class="num"[^>]*>([\d.]+)/s.exec(page);
  expect(Number(width?.[2])).toBeGreaterThan(Number(width?.[1]));
});

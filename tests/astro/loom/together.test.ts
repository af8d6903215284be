import react from '@astrojs/react/server.js';
import { experimental_AstroContainer as AstroContainer } from 'astro/container';
import { JSDOM } from 'jsdom';
import { expect, test } from 'vitest';
import Together from '#components/loom/Together.astro';
import { lowTide } from '../../support/low-tide.ts';

test('two pieces are shopped for as one: each yarn once, with its balls and what is left over', async () => {
  const piece = await lowTide();
  const container = await AstroContainer.create();
  container.addServerRenderer({ name: '@astrojs/react', renderer: react });
  const html = await container.renderToString(Together, { props: { units: 'cm', pieces: [{ name: 'Low Tide', piece }, { name: 'High Tide', piece }] } });
  const page = new JSDOM(html).window.document;
  const rows = [...page.querySelectorAll('dl > div')].map((row) => row.textContent.replaceAll(/\s+/g, ' ').trim());
  expect(rows.filter((row) => row.startsWith('Fenwool 6/2, Estuary'))).toHaveLength(1);
  expect(rows[0]).toMatch(/^Saltmarsh warp 12\/6.*Warp\. For Low Tide and High Tide\..* \d balls?, .* left over$/);
  expect(rows.find((row) => row.startsWith('Dowel'))).toContain('2 of them');
  expect(rows.find((row) => row.startsWith('Spacer card'))).not.toContain('2 of them');
  expect(html).not.toContain(' style=');
});

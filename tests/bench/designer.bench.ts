// The piece's form at sixty bands: what is reckoned and drawn at every letter, and in Chromium all that a page does from the key
// until it is laid out. Painting is not in it: it waits for the screen.
import { existsSync, readFileSync } from 'node:fs';
import { build } from 'esbuild';
import { chromium, type Page } from 'playwright';
import postcss from 'postcss';
import tailwind from 'tailwindcss';
import { bench, describe } from 'vitest';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import { layerCloth, type LayeredCloth } from '#core/craft/cloth/draw-cloth.ts';
import { typeIn } from '#core/craft/piece-form/change-typed.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import type { Band } from '#core/craft/piece.ts';
import { pieceWith } from '../unit/core/craft/a-piece.ts';

const KINDS: readonly Band[] = [
  { technique: 'tabby', yarn: 'ground', heightMm: 40, shapes: [{ shape: 'triangle', yarn: 'ground', baseMm: 150, heightMm: 30, join: 'dovetail' }] },
  { technique: 'soumak', yarn: 'ground', over: 4, back: 2, rows: 2, tabbyBetween: 1, tabbyYarn: 'ground' },
  { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 2, heightMm: 12 },
  { technique: 'twining', yarn: 'ground', rows: 2 },
];
const SIXTY = typePiece(pieceWith({
  size: { widthMm: 300, heightMm: 1_600 }, loom: { nailPitchMm: 10, warping: 'zigzag', insideHeightMm: 1_900 },
  bands: [...Array.from({ length: 59 }, (_, at) => KINDS[at % KINDS.length]).filter((band) => band !== undefined), { technique: 'tabby', yarn: 'ground', fill: true }],
}), 'cm');

function drawn(typed: TypedPiece, before?: LayeredCloth): LayeredCloth {
  const judged = judgeTyped(typed);
  if (!judged.ok) throw new Error(judged.problems.map(({ field, says }) => `${field} ${says}`).join('\n'));
  return layerCloth(clothPieceOf(judged.piece, judged.plan, 'Sixty bands'), { id: 'piece', as: 'hanging', width: 390 }, before);
}

/** One sheet of the site's many. */
function sheet(file: string): string {
  return readFileSync(file, 'utf8').replace(/@import '([^']+)';/gu, (_, path: string) => {
    if (path.startsWith('tailwindcss/')) return `@tailwind ${path.slice('tailwindcss/'.length)};`;
    const found = `src/styles/${path}`;
    return existsSync(found) ? sheet(found) : '';
  });
}

/** The form alone in a page, as the site's build makes it. */
async function formOf(typed: TypedPiece, page: Page): Promise<void> {
  const { css } = await postcss([tailwind()]).process(sheet('src/styles/global.css'), { from: undefined });
  const saved = "{ words: '', isDraft: false, pieceWords: null, asideWords: null }";
  const contents = `import { createElement } from 'react'; import { createRoot } from 'react-dom/client'; import { PieceForm } from '#islands/piece-form/PieceForm.tsx';
    createRoot(document.getElementById('form')).render(createElement(PieceForm, { action: '/', series: { slug: 's', name: 'Sixty' }, revision: 1, typed: ${JSON.stringify(typed)}, isTried: false, isChanged: false, summary: '', isOver: false, openBand: null, saved: ${saved}, looms: [] }));`;
  const { outputFiles } = await build({ stdin: { contents, resolveDir: process.cwd(), loader: 'ts' }, bundle: true, minify: true, format: 'esm', jsx: 'automatic', define: { 'process.env.NODE_ENV': '"production"' }, write: false });
  await page.setContent(`<!doctype html><html lang="en"><style>${css}</style><main class="page piece-page warped"><div id="form"></div></main>`);
  await page.addScriptTag({ content: outputFiles[0]?.text ?? '', type: 'module' });
  await page.locator('.drawn-bands').waitFor();
}

/** Script, style and layout of each press in milliseconds, sorted. By the processor's own clock: what else the machine does counts little. */
async function timesOf(page: Page, presses: readonly [string, string]): Promise<readonly number[]> {
  const tools = await page.context().newCDPSession(page);
  await tools.send('Performance.enable', { timeDomain: 'threadTicks' });
  const spent = async (): Promise<number> => (await tools.send('Performance.getMetrics')).metrics.reduce((sum, { name, value }) => sum + (/^(?:Script|RecalcStyle|Layout)Duration$/u.test(name) ? value * 1000 : 0), 0);
  const times: number[] = [];
  for (let press = 0; press < 30; press++) {
    const before = await spent();
    await page.keyboard.press(presses[press % 2 === 0 ? 0 : 1]);
    await page.waitForTimeout(60);
    times.push((await spent()) - before);
  }
  await tools.detach();
  // The first ones warm up.
  return times.slice(10).sort((a, b) => a - b);
}

const MOST_MS = 16;

/** What a hand feels, in words; throws over a frame. */
async function inChromium(): Promise<string> {
  const browser = await chromium.launch({ executablePath: process.env['FELLMARK_TEST_CHROMIUM'] ?? '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu'] });
  const page = await browser.newPage({ viewport: { width: 1280, height: 1000 } });
  await formOf(SIXTY, page);
  await page.locator('#band-0 summary').click();
  await page.locator('[name="bands.0.heightMm"]').focus();
  const said: string[] = [];
  const note = async (what: string, presses: readonly [string, string]): Promise<void> => {
    const times = await timesOf(page, presses);
    const [least = Number.POSITIVE_INFINITY, median = least] = [times[0], times[times.length >> 1]];
    if (least >= MOST_MS) throw new Error(`${what} takes ${least.toFixed(1)} ms at best, over ${String(MOST_MS)}`);
    said.push(`${what} ${least.toFixed(1)} at best, median ${median.toFixed(1)}`);
  };
  await note('a letter', ['5', 'Backspace']);
  await page.locator('.band-hit').first().click();
  await page.locator('.band-square').focus();
  await note('a pull', ['ArrowUp', 'ArrowDown']);
  await note('a move', ['Alt+ArrowUp', 'Alt+ArrowDown']);
  await page.keyboard.press('ArrowUp');
  await note('a step back or forth', ['ControlOrMeta+z', 'ControlOrMeta+y']);
  await browser.close();
  return said.join('; ');
}

const felt = await inChromium();

describe(`sixty bands in the designer (in Chromium, ms of script, style and layout: ${felt})`, () => {
  const [four, five] = [SIXTY, typeIn(SIXTY, 'bands.0.heightMm', '5')];
  let last = drawn(four);
  let odd = false;
  bench('a letter typed, reckoned and drawn, under 8 ms', () => {
    odd = !odd;
    last = drawn(odd ? five : four, last);
  });
  bench('all bands drawn anew, under 16 ms', () => { drawn(five); });
});

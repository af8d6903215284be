/**
 * One picture of a storyboard, as SVG in day colours.
 *
 * The lower fifth stays empty: a player lays the captions there.
 */
import type { Scene } from '#core/captions/storyboard.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { drawnInto, fitInto, type Box } from '#core/craft/cloth/fit-into.ts';
import { escapeWords } from '#core/craft/cloth/markup.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import type { AnyFigureInput } from '#core/craft/figures/figures.ts';

export const FRAME = { width: 960, height: 540 } as const;

const GROUND = '#dce1df';
const SHEET = '#f0f3f2';
const INK = '#111e33';
const BEAM = '#203d66';
const SERIF = "Lora,Georgia,'Liberation Serif','DejaVu Serif',serif";

/** Where the picture stands: below the title, above the captions. */
const ROOM: Box = { x: 40, y: 74, width: 880, height: 362 };

export interface FrameWords {
  readonly title: string;
  readonly chapter: string;
}

export function drawFrame(scene: Scene, progress: number, input: AnyFigureInput, words: FrameWords): string {
  const picture = scene.figure === undefined ? growing(scene.cloth, progress, input) : drawFigure(scene.figure, input, progress, { id: 'figure', decorative: true });
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${FRAME.width} ${FRAME.height}" width="${FRAME.width}" height="${FRAME.height}" fill="none">` +
    `<path d="M0 0H${FRAME.width}V${FRAME.height}H0z" fill="${GROUND}"/><path d="M0 0H${FRAME.width}V6H0z" fill="${BEAM}"/>` +
    `<path d="M24 60H936V448H24z" fill="${SHEET}"/>${heading(words)}${warpEnds()}${fitInto(picture, ROOM)}</svg>`
  );
}

function heading({ title, chapter }: FrameWords): string {
  const line = (x: number, anchor: string, size: number, text: string, weight: number): string =>
    `<text x="${x}" y="43" font-family="${SERIF}" font-size="${size}" font-weight="${weight}" text-anchor="${anchor}" fill="${INK}">${escapeWords(text)}</text>`;
  return line(28, 'start', 25, chapter, 500) + (chapter === title ? '' : line(932, 'end', 17, title, 400));
}

/** Bare warp below the sheet: the cloth of the page ends there. */
function warpEnds(): string {
  let d = '';
  for (let x = 40; x < FRAME.width - 24; x += 22) d += `M${x} 448V${FRAME.height}`;
  return `<path d="${d}" stroke="#cbd1cf" stroke-width="1"/>`;
}

function growing(as: 'loom' | 'hanging', progress: number, input: AnyFigureInput): string {
  const piece = clothOf(input.piece, input.plan, '');
  return drawnInto(ROOM, (width) => drawCloth(piece, { id: 'cloth', as, width, woven: progress, decorative: true }));
}

/** What stands round the threads of a figure: wood and nails, measures, words, and the way of the hand. */
import { escapeWords, num } from '#core/craft/cloth/markup.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { toPath } from '#core/craft/figures/kit/strand.ts';
import { cutAt, heading, lengthOf, type Point } from '#core/craft/figures/kit/trail.ts';

const INK = '#111e33';
const HAND = '#2b5283';
const QUIET = '#646f77';
const PAPER = '#f0f3f2';
const WOOD = '#b9aa8d';
const WOOD_LIGHT = '#d3c7ad';
const WOOD_DARK = '#6f6250';
const NAIL = '#36424c';

/** Faces the site's own face stands before; a picture made without it takes the next that is there. */
export const FIGURE_FONT = "'Sofia Sans Variable','Sofia Sans','Segoe UI','Helvetica Neue','Liberation Sans','DejaVu Sans',Arial,sans-serif";

/** A bar of wood; its light falls on the upper edge. */
export function wood(x: number, y: number, width: number, height: number): string {
  return (
    `<path d="M${num(x)} ${num(y)}h${num(width)}v${num(height)}h${num(-width)}z" fill="${WOOD}"/>` +
    `<path d="M${num(x)} ${num(y + 1.5)}h${num(width)}" stroke="${WOOD_LIGHT}" stroke-width="3"/>` +
    `<path d="M${num(x)} ${num(y + height - 0.5)}h${num(width)}" stroke="${WOOD_DARK}" stroke-width="1"/>`
  );
}

export function nail(x: number, y: number): string {
  return `<circle cx="${num(x)}" cy="${num(y)}" r="6" fill="${NAIL}"/><circle cx="${num(x - 1.6)}" cy="${num(y - 1.8)}" r="1.7" fill="#8a9498"/>`;
}

export type Anchor = 'start' | 'middle' | 'end';

interface WordsOptions {
  readonly anchor?: Anchor;
  readonly size?: number;
  readonly quiet?: boolean;
  /** Words on a patch of the ground, where they stand on threads. */
  readonly patch?: boolean;
}

/** A line of words on its baseline. */
export function words(scene: Scene, x: number, y: number, text: string, options: WordsOptions = {}): void {
  const { anchor = 'start', size = 18, quiet = false, patch = false } = options;
  if (patch) scene.add(LEVEL.words, patchBehind(x, y, text, anchor, size));
  scene.add(
    LEVEL.words,
    `<text class="draw-words" x="${num(x)}" y="${num(y)}" font-size="${size}" font-weight="${quiet ? 400 : 600}" text-anchor="${anchor}" fill="${INK}" font-family="${FIGURE_FONT}">${escapeWords(text)}</text>`,
  );
}

/** A face is not measured here: this is wide enough for every face in the list. */
function widthOf(text: string, size: number): number {
  return text.length * size * 0.56 + 14;
}

function patchBehind(x: number, y: number, text: string, anchor: Anchor, size: number): string {
  const width = widthOf(text, size);
  const left = anchor === 'middle' ? x - width / 2 : anchor === 'end' ? x - width + 7 : x - 7;
  return `<path class="draw-paper" d="M${num(left)} ${num(y - size * 1.02)}h${num(width)}v${num(size * 1.44)}h${num(-width)}z" fill="${PAPER}"/>`;
}

/** A measure between two points with its amount in the middle. Lies or stands. */
export function measure(scene: Scene, from: Point, to: Point, text: string): void {
  const across = Math.abs(to.x - from.x) >= Math.abs(to.y - from.y);
  const tick = (at: Point): string => (across ? `M${num(at.x)} ${num(at.y - 8)}v16` : `M${num(at.x - 8)} ${num(at.y)}h16`);
  const d = `M${num(from.x)} ${num(from.y)}L${num(to.x)} ${num(to.y)}${tick(from)}${tick(to)}`;
  scene.add(LEVEL.marks, `<path class="draw-line" d="${d}" stroke="${INK}" stroke-width="1.5"/>`);
  /* Words wider than the measure would hide it: they stand above. */
  const above = across && widthOf(text, 18) > Math.abs(to.x - from.x) - 8;
  words(scene, (from.x + to.x) / 2, (from.y + to.y) / 2 + (above ? -12 : 6), text, { anchor: 'middle', patch: true });
}

/** A measure too small to hold its words: they stand beside it. */
export function measureBeside(scene: Scene, from: Point, to: Point, text: string, at: Point, anchor: Anchor = 'start'): void {
  const across = Math.abs(to.x - from.x) >= Math.abs(to.y - from.y);
  const tick = (p: Point): string => (across ? `M${num(p.x)} ${num(p.y - 8)}v16` : `M${num(p.x - 8)} ${num(p.y)}h16`);
  const d = `M${num(from.x)} ${num(from.y)}L${num(to.x)} ${num(to.y)}${tick(from)}${tick(to)}`;
  scene.add(LEVEL.marks, `<path class="draw-line" d="${d}" stroke="${INK}" stroke-width="1.5"/>`);
  words(scene, at.x, at.y, text, { anchor, patch: true });
}

/** The way of the hand: a dotted line with a head, in woad. */
export function handWay(scene: Scene, points: readonly Point[], share = 1): void {
  const shown = cutAt(points, lengthOf(points) * share);
  const tip = shown.at(-1);
  if (tip === undefined || share <= 0.02) return;
  const to = heading(shown);
  const side = (turn: number): string => {
    const angle = Math.atan2(to.y, to.x) + turn;
    return `${num(tip.x - 12 * Math.cos(angle))} ${num(tip.y - 12 * Math.sin(angle))}`;
  };
  scene.add(
    LEVEL.marks,
    `<path class="draw-hand" d="${toPath(shown)}" stroke="${HAND}" stroke-width="2.6" stroke-linecap="round" stroke-dasharray=".1 7"/>` +
      `<path class="draw-hand" d="M${side(0.5)}L${num(tip.x)} ${num(tip.y)}L${side(-0.5)}" stroke="${HAND}" stroke-width="2.6" stroke-linecap="round" stroke-linejoin="round"/>`,
  );
}

/** A thin line from words to what they name. */
export function pointer(scene: Scene, from: Point, to: Point): void {
  scene.add(
    LEVEL.marks,
    `<path class="draw-line" d="M${num(from.x)} ${num(from.y)}L${num(to.x)} ${num(to.y)}" stroke="${INK}" stroke-width="1.2"/>` +
      `<circle class="draw-words" cx="${num(to.x)}" cy="${num(to.y)}" r="2.6" fill="${INK}"/>`,
  );
}

/** The order of movements: a figure in a ring. */
export function numeral(scene: Scene, x: number, y: number, value: number): void {
  scene.add(
    LEVEL.words,
    `<circle class="draw-paper" cx="${num(x)}" cy="${num(y)}" r="12" fill="${PAPER}"/>` +
      `<circle class="draw-line" cx="${num(x)}" cy="${num(y)}" r="12" stroke="${INK}" stroke-width="1.5"/>`,
  );
  words(scene, x, y + 5.4, String(value), { anchor: 'middle', size: 16 });
}

/** A hair line that guides the eye: the edge of the cloth, a level. */
export function guide(scene: Scene, d: string): void {
  scene.add(LEVEL.marks, `<path class="draw-quiet" d="${d}" stroke="${QUIET}" stroke-width="1.3" stroke-dasharray="5 5"/>`);
}

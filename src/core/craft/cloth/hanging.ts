/** What a piece hangs from, and the one flat shadow it casts. */
import { box, num } from '#core/craft/cloth/markup.ts';

/** Dowel and cord. `top` is where the cloth's warp begins below the dowel. */
export function drawDowel(width: number, inset: number, top: number): string {
  const y = top * 0.72;
  const r = Math.max(2.5, width * 0.014);
  const from = inset + r;
  const to = width - inset - r;
  const rod = (dy: number, colour: string, thick: number): string =>
    `<path d="M${num(from)} ${num(y + dy)}H${num(to)}" stroke="${colour}" stroke-width="${num(thick)}" stroke-linecap="round"/>`;
  const peak = Math.max(1.5, y - top * 0.66);
  const cord = `M${num(width * 0.14)} ${num(y)}L${num(width / 2)} ${num(peak)}L${num(width * 0.86)} ${num(y)}`;
  return (
    `<path class="cord" d="${cord}" stroke="#646f77" stroke-width="${num(Math.max(1, r * 0.32))}" stroke-linejoin="round"/>` +
    rod(0, '#6f6250', r * 2) + rod(-r * 0.15, '#a4957c', r * 1.35) + rod(-r * 0.5, '#c5b89f', r * 0.45)
  );
}

export function drawCastShadow(x: number, y: number, width: number, height: number): string {
  return `<g class="cast" fill-opacity=".13">${box(x + 5, y + 6, width, height, '#101c2d')}</g>`;
}

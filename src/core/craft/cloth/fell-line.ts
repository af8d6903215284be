/**
 * The fell line: weld between two hairlines, so that it never depends on yellow alone. Its colours are classes
 * (`fell-line`, `fell-edge`) that follow the page's scheme; the attributes hold where no style sheet is.
 */
import { num } from '#core/craft/cloth/markup.ts';

export function drawFellLine(width: number, y: number, out: number, thick: number): string {
  return (
    `<g class="fell"><path class="fell-edge" d="M${num(-out)} ${num(y)}H${num(width + out)}" stroke="#111e33" stroke-width="${num(thick + 2)}"/>` +
    `<path class="fell-line" d="M${num(1 - out)} ${num(y)}H${num(width + out - 1)}" stroke="#e8ca33" stroke-width="${num(thick)}"/></g>`
  );
}

/** A technique as an SVG string, part-way or done, with this person's amounts. Pure and repeatable, as the cloth is. */
import { escapeWords } from '#core/craft/cloth/markup.ts';
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { FIGURE_WIDTH } from '#core/craft/figures/figure.ts';
import { figureOf, type AnyFigureInput } from '#core/craft/figures/figures.ts';
import { Scene } from '#core/craft/figures/kit/scene.ts';

export interface FigureOptions {
  /** Begins every id in the drawing; one page, one id for each figure. Default the kind. */
  readonly id?: string;
  /** For a picture that stands alone: a ground of its own, in day colours. */
  readonly standalone?: boolean;
  /** Hidden from screen readers, because the same stands in words beside it. */
  readonly decorative?: boolean;
}

const DAY_SHEET = '#f0f3f2';

/** @param progress how far the movement has come, 0..1; outside of that it counts as 0 or 1 */
export function drawFigure(kind: FigureKind, given: AnyFigureInput, progress = 1, options: FigureOptions = {}): string {
  const { figure, input } = figureOf(kind, given);
  const scene = new Scene(options.id ?? kind);
  figure.draw(scene, input, Math.max(0, Math.min(1, progress)));
  const ground = options.standalone === true ? `<path d="M0 0H${FIGURE_WIDTH}V${figure.height}H0z" fill="${DAY_SHEET}"/>` : '';
  const words = options.decorative === true ? ' aria-hidden="true"' : ` role="img" aria-label="${escapeWords(figure.describe(input))}"`;
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${FIGURE_WIDTH} ${figure.height}" width="${FIGURE_WIDTH}" height="${figure.height}" ` +
    `fill="none" stroke-linejoin="round"${words}>${ground}${scene.markup()}</svg>`
  );
}

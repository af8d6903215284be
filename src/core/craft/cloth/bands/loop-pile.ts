/** Loop pile: on tabby, rows of loops that hang a little over the row below. Lower rows come first. */
import { drawGround } from '#core/craft/cloth/bands/tabby.ts';
import type { LoopPileBand } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, moved, num } from '#core/craft/cloth/markup.ts';
import { drawPicks } from '#core/craft/cloth/picks.ts';
import { drawnRows, rowOnScreen, type Weave } from '#core/craft/cloth/weave.ts';
import { loopRow } from '#core/craft/interlacement/lay.ts';

const GROUND_COVER = 0.7;

const loopRows = (band: LoopPileBand, height: number, weave: Pick<Weave, 'minPick'>): number => (band.rows === 1 ? 1 : drawnRows(band.rows, height, weave.minPick * 2.4));

export function loopGroundRows(band: LoopPileBand, height: number, weave: Pick<Weave, 'minPick'>): number {
  return drawnRows(loopRows(band, height, weave) * 4, height, weave.minPick);
}

export function drawLoopPile(band: LoopPileBand, height: number, weave: Weave): string {
  const count = loopRows(band, height, weave);
  const unit = height / count;
  const groundRows = loopGroundRows(band, height, weave);
  const width = Math.min(weave.end * 0.9, unit * 0.5);
  const hang = Math.min(Math.max(unit * 0.75, band.loopMm * weave.pxPerMm), unit * 1.6);
  const at = (row: number): number => row * unit + unit * 0.16;
  const pitch = height / groundRows;
  /* The row that is drawn up is a row of tabby, and is seen as one where it has no loops. */
  const own = drawPicks(Array.from({ length: count }, (_, row) => ({ y: at(row), row: rowOnScreen(row, count, weave), x0: 0, x1: weave.width })), pitch, band.colour, GROUND_COVER, weave);
  let drawn = drawGround(band.groundColour, groundRows, height, GROUND_COVER, weave) + own.under + own.over;
  for (let row = count - 1; row >= 0; row--) {
    const d = loopsIn(rowOnScreen(row, count, weave), hang, weave);
    const place = (off: number): string => ROUND + moved(0, at(row) + off);
    drawn += weave.paths.stroke(d, shade(band.colour, 0.55), width * 1.15, place(width * 0.3));
    drawn += weave.paths.stroke(d, band.colour, width * 0.9, place(0));
    drawn += weave.paths.stroke(d, light(band.colour, 0.3), width * 0.26, place(-width * 0.16));
  }
  return drawn;
}

/** One hanging loop at every second end, where the row lies on the face; two rows of tabby between put the next one's beside them. */
function loopsIn(row: number, hang: number, weave: Weave): string {
  const { ends, end, width, begin, grouped } = weave;
  /* A drawn end that stands for several has loops among them, though the last one is plain. */
  const beyond = grouped >= 2 ? 1 : 0;
  const raised = loopRow({ first: -beyond, last: ends - 1 + beyond }, row, 'right').filter((pass) => pass.raised === 'loop');
  return raised
    .map(({ from }) => {
      const middle = begin === 'head' ? width - (from + 0.5) * end : (from + 0.5) * end;
      /* A quadratic curve reaches half as far as its handle. */
      return `M${num(middle - end * 0.55)} 0q${num(end * 0.55)} ${num(hang * 2)} ${num(end * 1.1)} 0`;
    })
    .join('');
}

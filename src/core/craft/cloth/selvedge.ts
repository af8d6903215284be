/**
 * Weft turning round the last end, at the right and at the left in turn. It lies under the beads.
 * A row that does not reach the edge does not turn there.
 */
import { shade } from '#core/craft/cloth/colour.ts';
import { ROUND, dashes, num } from '#core/craft/cloth/markup.ts';
import type { PickRow } from '#core/craft/cloth/picks.ts';
import { turnSide, type Weave } from '#core/craft/cloth/weave.ts';

/** Turns finer than this, or more than so many, are drawn as one dashed line for each edge; the others as arcs. */
const ARCS_FROM = 5;
const MOST_ARCS = 100;

export function drawSelvedge(rows: readonly PickRow[], pitch: number, colour: string, weave: Weave): string {
  const out = Math.min(pitch * 0.5, weave.end * 0.42);
  return pitch < ARCS_FROM || rows.length > MOST_ARCS ? fineTurns(rows, pitch, out, colour, weave) : arcs(rows, pitch, out, colour, weave);
}

const touchesLeft = (row: PickRow): boolean => row.x0 === 0;
const touchesRight = (row: PickRow, weave: Weave): boolean => weave.width - row.x1 < 0.5;

type Side = 'left' | 'right';

interface Turn {
  readonly side: Side;
  /** From one row to the next. */
  readonly y: number;
  readonly nextY: number;
}

/** A turn joins a row and the one woven after it, at the side the first of the two ends at. Both must reach that edge. */
function turnsOf(rows: readonly PickRow[], pitch: number, weave: Weave): Turn[] {
  return (['left', 'right'] as const).flatMap((side) => {
    const own = rows.filter((row) => (side === 'left' ? touchesLeft(row) : touchesRight(row, weave)));
    return own.flatMap((row, index): Turn[] => {
      const next = own[index + 1];
      if (next === undefined || next.row === row.row || next.y - row.y > pitch * 1.5) return [];
      return turnSide(Math.min(row.row, next.row), weave) === side ? [{ side, y: row.y, nextY: next.y }] : [];
    });
  });
}

function arcs(rows: readonly PickRow[], pitch: number, out: number, colour: string, weave: Weave): string {
  let d = '';
  for (const { side, y, nextY } of turnsOf(rows, pitch, weave)) {
    const rise = nextY - y;
    if (side === 'left') d += `M1 ${num(y)}h-1a${num(out)} ${num(rise / 2)} 0 0 0 0 ${num(rise)}h1`;
    else d += `M${num(weave.width - 1)} ${num(y)}h1a${num(out)} ${num(rise / 2)} 0 0 1 0 ${num(rise)}h-1`;
  }
  return weave.paths.stroke(d, shade(colour, 0.45), pitch * 0.8, ROUND) + weave.paths.stroke(d, shade(colour, 0.06), pitch * 0.54, ROUND);
}

interface Edge {
  readonly x: number;
  readonly first: number;
  last: number;
}

function fineTurns(rows: readonly PickRow[], pitch: number, out: number, colour: string, weave: Weave): string {
  const edges: Edge[] = [];
  for (const { side, y } of turnsOf(rows, pitch, weave)) {
    const x = side === 'left' ? -out * 0.4 : weave.width + out * 0.4;
    const before = edges.findLast((edge) => edge.x === x);
    if (before !== undefined && y - before.last < pitch * 2.5) before.last = y;
    else edges.push({ x, first: y, last: y });
  }
  const turn = ROUND + dashes(pitch * 0.3, pitch * 1.7, 0);
  const d = edges.map((edge) => `M${num(edge.x)} ${num(edge.first + pitch * 0.35)}V${num(edge.last + pitch * 0.7)}`).join('');
  const drawn = weave.paths.stroke(d, shade(colour, 0.45), pitch * 0.8, turn);
  return pitch > 3.4 ? drawn + weave.paths.stroke(d, shade(colour, 0.06), pitch * 0.54, turn) : drawn;
}

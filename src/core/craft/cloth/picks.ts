/**
 * Plain picks: weft that goes over one end and under the next.
 *
 * Every thread is a line, "over" is a dash and "under" is a gap, so one pick is one dashed line however many ends it
 * crosses. The weft is drawn twice: once whole, to lie under the warp, and once as the beads that lie over it.
 */
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, dashes, moved, num } from '#core/craft/cloth/markup.ts';
import { firstOver, rowOnScreen, type Weave } from '#core/craft/cloth/weave.ts';

/** One pick on the screen. `x0` and `x1` are multiples of one end. */
export interface PickRow {
  readonly y: number;
  /** Counted from the first one woven. */
  readonly row: number;
  readonly x0: number;
  readonly x1: number;
}

export interface Picks {
  /** Lies under the warp. */
  readonly under: string;
  /** Lies over the warp. */
  readonly over: string;
}

/** Rows finer than this show no light and shadow, and are too fine to bow. */
export const LIT_FROM = 3.4;
const BOWED_FROM = 5;
/** Where so many rows lie together, nobody sees that they bow. */
const BOWED_ROWS = 100;
/** Near, rows from here on show the plies of their yarn and a shade along their lower side. */
const PLIED_FROM = 9;

/** Rows over the whole width, from above. */
export function rowsOver(count: number, pitch: number, top: number, weave: Weave): PickRow[] {
  return Array.from({ length: count }, (_, index) => ({ y: top + (index + 0.5) * pitch, row: rowOnScreen(index, count, weave), x0: 0, x1: weave.width }));
}

/** Each row as so many threads side by side, which go over and under together. */
export function sideBySide(rows: readonly PickRow[], pitch: number, threads: number): readonly PickRow[] {
  if (threads === 1) return rows;
  return rows.flatMap((row) => Array.from({ length: threads }, (_, at): PickRow => ({ ...row, y: row.y + ((at + 0.5) / threads - 0.5) * pitch })));
}

/**
 * @param pitch pixels from row to row
 * @param cover how much of the warp the weft hides, 0..1
 */
export function drawPicks(rows: readonly PickRow[], pitch: number, colour: string, cover: number, weave: Weave): Picks {
  const thick = pitch * (1.06 + 0.12 * cover);
  const { whole, lots } = sortRows(rows, pitch, weave);
  let under = weave.paths.stroke(whole, shade(colour, 0.4), thick * 0.9);
  if (weave.plied && pitch >= PLIED_FROM) under += weave.paths.stroke(whole, shade(colour, 0.22), thick * 0.5, moved(0, -pitch * 0.08));
  const bead = beadLength(weave.end, thick, cover);
  const over = lots.map((lot) => drawBeads(lot, pitch, thick, bead, colour, weave)).join('');
  return { under, over };
}

interface Lot {
  readonly d: string;
  /** First end it goes over. */
  readonly over: 0 | 1;
  /** 0 a little darker, 1 as dyed, 2 a little lighter. */
  readonly tone: number;
}

/** Sorts the rows by chance into three tones, so that a band never looks printed; no two picks lie quite flat. */
function sortRows(rows: readonly PickRow[], pitch: number, weave: Weave): { whole: string; lots: Lot[] } {
  const found = ['', '', '', '', '', ''];
  let whole = '';
  const bowed = pitch >= BOWED_FROM && rows.length <= BOWED_ROWS;
  for (const row of rows) {
    const width = row.x1 - row.x0;
    const bow = bowed ? (weave.chance() - 0.5) * Math.min(pitch * 0.5, width * 0.02) : 0;
    const d = `M${num(row.x0)} ${num(row.y)}` + (bow === 0 ? `h${num(width)}` : `q${num(width / 2)} ${num(bow)} ${num(width)} 0`);
    whole += d;
    /* A row that begins at an odd end begins with what its neighbours do there. */
    const lot = (firstOver(row.row, weave) + Math.round(row.x0 / weave.end)) % 2 + 2 * Math.floor(weave.chance() * 3);
    found[lot] = (found[lot] ?? '') + d;
  }
  const lots = found.map((d, lot) => ({ d, over: lot % 2 === 1 ? (1 as const) : (0 as const), tone: lot >> 1 })).filter((lot) => lot.d !== '');
  return { whole, lots };
}

/** Length of one float without its round ends. */
function beadLength(end: number, thick: number, cover: number): number {
  return Math.max(0.4, end * (1.04 + 0.6 * cover) - thick * 0.86);
}

function drawBeads(lot: Lot, pitch: number, thick: number, bead: number, colour: string, weave: Weave): string {
  const { paths } = weave;
  const start = (lot.over + 0.5) * weave.end - bead / 2;
  const repeat = 2 * weave.end;
  const dash = dashes(bead, repeat - bead, start) + ROUND;
  const tone = [shade(colour, 0.06), colour, light(colour, 0.06)][lot.tone] ?? colour;
  const near = weave.plied && pitch >= PLIED_FROM;
  const lit = pitch >= LIT_FROM;
  let drawn = '';
  if (lit) drawn += paths.stroke(lot.d, shade(colour, 0.55), thick * 0.9, dash + moved(0, pitch * 0.14));
  drawn += paths.stroke(lot.d, tone, thick * 0.86, dash);
  if (near) {
    drawn += paths.stroke(lot.d, shade(tone, 0.16), thick * 0.3, dash + moved(0, thick * 0.27));
    drawn += paths.stroke(lot.d, plyPaint(weave.id, colour), thick * 0.84, dash);
  }
  if (lit) {
    const shine = bead * 0.86;
    const shineDash = dashes(shine, repeat - shine, start + bead * 0.07) + ROUND;
    drawn += paths.stroke(lot.d, light(tone, near ? 0.3 : 0.22), thick * 0.24, shineDash + moved(0, -thick * 0.2));
  }
  return drawn;
}

/** The stroke paint that shows a yarn's plies; `drawPlies` defines it. */
export function plyPaint(id: string, colour: string): string {
  return `url(#${id}-ply${colour.slice(1)})`;
}

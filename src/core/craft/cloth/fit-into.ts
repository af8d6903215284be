/** One of our own drawings as a part of a larger one. Lengths are px of the larger one. */
import { num } from './markup.ts';

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

const TRIAL_WIDTH = 300;

/** The drawing at the size at which it just fits; `draw` takes its width. Threads scaled afterwards would blur into bands, so it is drawn twice. */
export function drawnInto(room: Box, draw: (width: number) => string): string {
  const { width, height } = sizeOf(draw(TRIAL_WIDTH));
  return draw(Math.floor(width * Math.min(room.width / width, room.height / height)));
}

/** Placed in the middle of `room`, as large as fits. */
export function fitInto(svg: string, room: Box): string {
  const { width, height } = sizeOf(svg);
  const scale = Math.min(room.width / width, room.height / height);
  const w = width * scale;
  const h = height * scale;
  const place = ` x="${num(room.x + (room.width - w) / 2)}" y="${num(room.y + (room.height - h) / 2)}" width="${num(w)}" height="${num(h)}"`;
  return svg.replace(/ width="[\d.]+" height="[\d.]+"/, place);
}

function sizeOf(svg: string): { readonly width: number; readonly height: number } {
  const [, width = '1', height = '1'] = / width="([\d.]+)" height="([\d.]+)"/.exec(svg) ?? [];
  return { width: Number(width), height: Number(height) };
}

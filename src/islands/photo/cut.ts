// Which part of a photo is shown, and which way up, apart from any screen. Edges are thousandths of the photo's width and
// height as it lies after its quarter turns, from the upper left.

export interface Cut {
  /** Quarter turns clockwise, 0 to 3. */
  readonly turns: number;
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export type Corner = 'upper left' | 'upper right' | 'lower left' | 'lower right';
export const CORNERS: readonly Corner[] = ['upper left', 'upper right', 'lower right', 'lower left'];

export const UNCUT: Cut = { turns: 0, left: 0, top: 0, right: 1_000, bottom: 1_000 };
/** A tenth of the photo is the least that is kept of each side. */
const LEAST = 100;

export const isUncut = (cut: Cut): boolean => cut.turns === 0 && cut.left === 0 && cut.top === 0 && cut.right === 1_000 && cut.bottom === 1_000;

/** A quarter turn clockwise; the same part of the photo stays in the cut. */
export function turned({ turns, left, top, right, bottom }: Cut): Cut {
  return { turns: (turns + 1) % 4, left: 1_000 - bottom, top: left, right: 1_000 - top, bottom: right };
}

const between = (value: number, least: number, most: number): number => Math.round(Math.max(least, Math.min(most, value)));

/** Where a corner lies. */
export function placeOf(cut: Cut, corner: Corner): { readonly x: number; readonly y: number } {
  return { x: corner.endsWith('left') ? cut.left : cut.right, y: corner.startsWith('upper') ? cut.top : cut.bottom };
}

/** A corner put at a place; it stops at the photo's edge, and short of the opposite corner. */
export function cornerAt(cut: Cut, corner: Corner, x: number, y: number): Cut {
  return {
    ...cut,
    ...(corner.endsWith('left') ? { left: between(x, 0, cut.right - LEAST) } : { right: between(x, cut.left + LEAST, 1_000) }),
    ...(corner.startsWith('upper') ? { top: between(y, 0, cut.bottom - LEAST) } : { bottom: between(y, cut.top + LEAST, 1_000) }),
  };
}

/** Longest side that is drawn, in points: some phones draw nothing larger. The server shows photos at half of it. */
const MOST_SIDE = 4_096;

export interface CutPixels {
  /** Of the turned photo, before anything is cut off. */
  readonly turnedWidth: number;
  readonly turnedHeight: number;
  /** Upper left of what is kept, in points of the turned photo. */
  readonly x: number;
  readonly y: number;
  /** Of what is drawn. */
  readonly width: number;
  readonly height: number;
  /** Points drawn for each point of the photo, 1 at most. */
  readonly scale: number;
}

/** @param width of the photo as it is seen before its turns, in points */
export function cutPixels(cut: Cut, width: number, height: number, mostSide = MOST_SIDE): CutPixels {
  const [turnedWidth, turnedHeight] = cut.turns % 2 === 0 ? [width, height] : [height, width];
  const [wide, high] = [((cut.right - cut.left) / 1_000) * turnedWidth, ((cut.bottom - cut.top) / 1_000) * turnedHeight];
  const scale = Math.min(1, mostSide / Math.max(wide, high));
  return { turnedWidth, turnedHeight, x: (cut.left / 1_000) * turnedWidth, y: (cut.top / 1_000) * turnedHeight, width: Math.max(1, Math.round(wide * scale)), height: Math.max(1, Math.round(high * scale)), scale };
}

/** `warped-loom.heic` becomes `warped-loom.jpg`: what is drawn anew is a JPEG. */
export const jpegName = (name: string): string => `${name.replace(/\.[^.]+$/, '') || 'photo'}.jpg`;

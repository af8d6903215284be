/**
 * How a photo is looked at: how close, turned, and which part of it. The frame stays; the photo in it is made larger
 * about its middle, turned clockwise, and moved. Places in the frame are shares of its width and height from its middle.
 */

export interface View {
  /** 1 shows the whole photo. */
  readonly zoom: number;
  /** Quarter turns clockwise, 0 to 3. */
  readonly turns: number;
  /** Where the photo's middle lies. */
  readonly x: number;
  readonly y: number;
}

export interface Place {
  readonly x: number;
  readonly y: number;
}

export const WHOLE: View = { zoom: 1, turns: 0, x: 0, y: 0 };
export const CLOSEST = 8;
/** One press of the key goes closer by this. */
export const STEP = 1.5;

/** What a photo of `aspect` (width by height) is scaled by: one lying on its side is made to fit its frame. */
export function scaleOf({ zoom, turns }: View, aspect: number): number {
  return turns % 2 === 0 ? zoom : zoom * Math.min(aspect, 1 / aspect);
}

const between = (value: number, limit: number): number => Math.max(-limit, Math.min(limit, value));

/** `view` moved back so far that the photo never leaves its frame. */
export function kept(view: View, aspect: number): View {
  const zoom = Math.max(1, Math.min(CLOSEST, view.zoom));
  const scale = scaleOf({ ...view, zoom }, aspect);
  const [wide, high] = view.turns % 2 === 0 ? [scale, scale] : [scale / aspect, scale * aspect];
  return { ...view, zoom, x: between(view.x, Math.max(0, (wide - 1) / 2)), y: between(view.y, Math.max(0, (high - 1) / 2)) };
}

/** Closer by `factor`, or further below 1, with what lies at `at` staying there. */
export function closer(view: View, aspect: number, factor: number, at: Place = { x: 0, y: 0 }): View {
  const zoom = Math.max(1, Math.min(CLOSEST, view.zoom * factor));
  const grown = zoom / view.zoom;
  return kept({ ...view, zoom, x: at.x - (at.x - view.x) * grown, y: at.y - (at.y - view.y) * grown }, aspect);
}

export function moved(view: View, aspect: number, dx: number, dy: number): View {
  return kept({ ...view, x: view.x + dx, y: view.y + dy }, aspect);
}

/** A quarter turn on, the whole photo in sight. */
export function turned({ turns }: View): View {
  return { ...WHOLE, turns: (turns + 1) % 4 };
}

/** A step on the screen as a step on the photo lying under it. */
export function stepOnPhoto(turns: number, dx: number, dy: number): readonly [number, number] {
  const steps = [[dx, dy], [dy, -dx], [-dx, -dy], [-dy, dx]] as const;
  return steps[turns % 4] ?? steps[0];
}

/** What lies at a place in the frame, in thousandths of the photo; null beside the photo. */
export function onPhoto(view: View, aspect: number, at: Place): { xPermille: number; yPermille: number } | null {
  const scale = scaleOf(view, aspect);
  const [x, y] = stepOnPhoto(view.turns, (at.x - view.x) * aspect, at.y - view.y);
  const [xPermille, yPermille] = [1_000 * (x / scale / aspect + 0.5), 1_000 * (y / scale + 0.5)];
  return [xPermille, yPermille].every((permille) => permille >= 0 && permille <= 1_000) ? { xPermille, yPermille } : null;
}

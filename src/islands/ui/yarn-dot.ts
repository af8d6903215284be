const undyed = '#d8d2c1';

/** The colour of a yarn's dot: only `#rrggbb` is let into markup, everything else is shown undyed. */
export function yarnDotFill(colour: string | undefined): string {
  return colour !== undefined && /^#[0-9a-f]{6}$/i.test(colour) ? colour : undyed;
}

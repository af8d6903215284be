/**
 * Colours of drawn yarn.
 *
 * Light on the cloth is mixed from a warm white and shadow from dark woad, never from pure white or black, so that every
 * yarn stays in the same air as the page it hangs on.
 */

const SHADOW = '#101c2d';
const GLARE = '#fffdf3';

/** Undyed yarn: stands in wherever a piece names no colour that can be drawn. */
export const NEUTRAL = '#b9b7ad';

/** The `#rrggbb` colour in lower case, or {@link NEUTRAL} for anything else. Nothing a person typed reaches the markup otherwise. */
export function yarnColour(value: unknown): string {
  return typeof value === 'string' && /^#[0-9a-f]{6}$/i.test(value) ? value.toLowerCase() : NEUTRAL;
}

/** `colour` moved `share` (0..1) of the way to the shadow. */
export function shade(colour: string, share: number): string {
  return mix(colour, SHADOW, share);
}

/** `colour` moved `share` (0..1) of the way to the light. */
export function light(colour: string, share: number): string {
  return mix(colour, GLARE, share);
}

/** Both colours must be `#rrggbb`. */
export function mix(from: string, to: string, share: number): string {
  const part = (start: number): string => {
    const a = Number.parseInt(from.slice(start, start + 2), 16);
    const b = Number.parseInt(to.slice(start, start + 2), 16);
    return Math.round(a + (b - a) * share).toString(16).padStart(2, '0');
  };
  return `#${part(1)}${part(3)}${part(5)}`;
}

// Contrast by WCAG 2.2, "contrast ratio" and "relative luminance".

export type Channels = readonly [number, number, number];

function luminance(channels: Channels): number {
  const [r, g, b] = channels.map((channel) => {
    const share = channel / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * (r ?? 0) + 0.7152 * (g ?? 0) + 0.0722 * (b ?? 0);
}

/** 1 to 21, whichever of the two lies on the other. */
export function contrast(one: Channels, other: Channels): number {
  const [dark = 0, light = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

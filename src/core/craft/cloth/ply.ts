/** The twist of a yarn, seen only near: a small pattern of slanted lines used as stroke paint. */
import { light, shade } from '#core/craft/cloth/colour.ts';
import { num } from '#core/craft/cloth/markup.ts';

/** One pattern for each colour, under the ids that `plyPaint` asks for. `pitch` is the thickness of a drawn row. */
export function drawPlies(colours: readonly string[], pitch: number, id: string): string {
  return [...new Set(colours)].map((colour) => pattern(colour, pitch, id)).join('');
}

function pattern(colour: string, pitch: number, id: string): string {
  const w = pitch * 0.62;
  const h = pitch * 0.9;
  const dark = `M${num(-w * 0.2)} ${num(h)}L${num(w * 0.62)} 0M${num(w * 0.8)} ${num(h)}L${num(w * 1.62)} 0`;
  const bright = `M${num(w * 0.02)} ${num(h)}L${num(w * 0.84)} 0`;
  return (
    `<pattern id="${id}-ply${colour.slice(1)}" width="${num(w)}" height="${num(h)}" patternUnits="userSpaceOnUse">` +
    `<path d="${dark}" stroke="${shade(colour, 0.5)}" stroke-opacity=".42" stroke-width="${num(pitch * 0.08)}"/>` +
    `<path d="${bright}" stroke="${light(colour, 0.5)}" stroke-opacity=".35" stroke-width="${num(pitch * 0.1)}"/></pattern>`
  );
}

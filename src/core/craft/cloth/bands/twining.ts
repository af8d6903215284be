/** Twining: two strands that cross between the ends, so every end, or every few, carries one slanted stroke. */
import type { TwiningBand } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { drawEnds } from '#core/craft/cloth/ends.ts';
import { ROUND, box, moved, num } from '#core/craft/cloth/markup.ts';
import { endsIn, onFace, twinedRow } from '#core/craft/interlacement/lay.ts';
import { drawnRows, type Weave } from '#core/craft/cloth/weave.ts';

export function drawTwining(band: TwiningBand, height: number, weave: Weave): string {
  const count = band.rows === 1 ? 1 : drawnRows(band.rows, height, weave.minPick * 1.3);
  const pitch = height / count;
  const rise = pitch * 0.22;
  const { end, paths } = weave;
  let d = '';
  const perTwist = Math.max(1, Math.round((band.endsPerTwist ?? 1) / weave.grouped));
  for (const pass of twinedRow({ first: 0, last: weave.ends - 1 }, perTwist).flatMap((strand) => onFace(strand, 'front'))) {
    const long = endsIn(pass) * end;
    d += `M${num(pass.from * end + long * 0.1)} ${num(rise)}l${num(long * 0.8)} ${num(-2 * rise)}`;
  }
  let drawn = box(0, 0, weave.width, height, shade(band.colour, 0.6)) + drawEnds(0, height, weave);
  for (let row = 0; row < count; row++) {
    const at = (off: number): string => ROUND + moved(0, (row + 0.5) * pitch + off);
    drawn += paths.stroke(d, shade(band.colour, 0.55), pitch * 0.72, at(pitch * 0.1));
    drawn += paths.stroke(d, band.colour, pitch * 0.56, at(0));
    drawn += paths.stroke(d, light(band.colour, 0.28), pitch * 0.16, at(-pitch * 0.12));
  }
  return drawn;
}

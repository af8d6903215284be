/** A dyeing as three skeins on a rod: as it was, mordanted, dyed; with iron a fourth. */
import type { HungPiece, HungStrand } from '#core/craft/cloth/cloth-piece.ts';
import { mix, shade, yarnColour } from '#core/craft/cloth/colour.ts';
import type { MadeOf } from '#core/craft/craft.ts';
import type { DyePiece, DyePlan } from '#core/craft/dyeing/piece.ts';

const SKEIN = { widthMm: 64, heightMm: 200, strands: 9, thickMm: 6 } as const;

function skein(colour: string, middle: number): HungStrand[] {
  return Array.from({ length: SKEIN.strands }, (_, index) => {
    const out = 6 + (index / (SKEIN.strands - 1)) * (SKEIN.widthMm / 2 - 6);
    const low = SKEIN.heightMm - (SKEIN.strands - index) * 3;
    return { colour, widthMm: SKEIN.thickMm, way: [middle - out, -12, middle - out, low * 0.5, middle - out * 1.05, low, middle, low, middle + out * 1.05, low, middle + out, low * 0.5, middle + out, -12] };
  });
}

export function drawDyeing({ piece, plan }: MadeOf<DyePiece, DyePlan>, title: string): HungPiece {
  const plain = yarnColour(piece.fibre.colour ?? '#e8e2d2');
  const dyed = yarnColour(piece.dye.colour ?? '#a0664a');
  const skeins = [{ words: 'as it was', colour: plain }, { words: 'mordanted', colour: mix(plain, '#cdbb94', 0.3) }, { words: 'dyed', colour: dyed }, ...(piece.iron === undefined ? [] : [{ words: 'saddened with iron', colour: shade(dyed, 0.4) }])];
  const room = SKEIN.widthMm * 1.35;
  const said = `${String(skeins.length)} skeins on a rod: ${skeins.map(({ words }) => words).join(', ')}. ${String(plan.steps.length)} baths.`;
  return {
    kind: 'hung', title, thing: 'dyeing', widthMm: room * skeins.length, heightMm: SKEIN.heightMm + 8, rod: { kind: 'rod', diameterMm: 14 }, words: { cm: said, in: said }, motifs: [],
    laid: ['rod', ...skeins.flatMap(({ colour }, index) => skein(colour, room * (index + 0.5)))],
  };
}

/** One band of any technique, drawn with its upper edge at y = 0. */
import { drawHeading, headingRows } from '#core/craft/cloth/bands/heading.ts';
import { drawLoopPile, loopGroundRows } from '#core/craft/cloth/bands/loop-pile.ts';
import { drawRoving, rovingRows } from '#core/craft/cloth/bands/roving.ts';
import { drawRya, ryaGroundRows } from '#core/craft/cloth/bands/rya.ts';
import { drawSoumak } from '#core/craft/cloth/bands/soumak.ts';
import { drawTabby } from '#core/craft/cloth/bands/tabby.ts';
import { drawTwining } from '#core/craft/cloth/bands/twining.ts';
import type { ClothBand, HemStitchBand } from '#core/craft/cloth/cloth-piece.ts';
import { drawnRows, type Weave } from '#core/craft/cloth/weave.ts';

/** Hem-stitch is not here: it has no height of its own and is laid on the edge of the cloth afterwards. */
export type LaidBand = Exclude<ClothBand, HemStitchBand>;

/** @param height of the whole band in pixels, even where only part of it is woven, so that rows stay where they were */
export function drawBand(band: LaidBand, height: number, weave: Weave): string {
  switch (band.technique) {
    case 'tabby':
      return drawTabby(band, height, weave);
    case 'soumak':
      return drawSoumak(band, height, weave);
    case 'rya':
      return drawRya(band, height, weave);
    case 'roving':
      return drawRoving(band, height, weave);
    case 'loop-pile':
      return drawLoopPile(band, height, weave);
    case 'twining':
      return drawTwining(band, height, weave);
    case 'heading':
      return drawHeading(band, height, weave);
  }
}

/** Picks of tabby drawn in a band: the next one's rows go on from them. */
export function picksDrawn(band: LaidBand, height: number, weave: Weave): number {
  switch (band.technique) {
    case 'tabby':
      return drawnRows(band.picks, height, weave.minPick);
    case 'rya':
      return ryaGroundRows(height, weave);
    case 'loop-pile':
      return loopGroundRows(band, height, weave);
    case 'roving':
      return rovingRows(band);
    case 'heading':
      return headingRows(height, weave);
    case 'soumak':
    case 'twining':
      return 0;
  }
}

/** All colours of yarn in a band. */
export function coloursOf(band: ClothBand): string[] {
  switch (band.technique) {
    case 'tabby':
      return [band.colour, ...band.shapes.map((shape) => shape.colour)];
    case 'soumak':
      return [band.colour, band.tabbyColour];
    case 'rya':
    case 'loop-pile':
      return [band.colour, band.groundColour];
    default:
      return [band.colour];
  }
}

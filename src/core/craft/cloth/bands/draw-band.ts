/** One band of any technique, drawn with its upper edge at y = 0. */
import { drawHeading } from '#core/craft/cloth/bands/heading.ts';
import { drawLoopPile } from '#core/craft/cloth/bands/loop-pile.ts';
import { drawRoving } from '#core/craft/cloth/bands/roving.ts';
import { drawRya } from '#core/craft/cloth/bands/rya.ts';
import { drawSoumak } from '#core/craft/cloth/bands/soumak.ts';
import { drawTabby } from '#core/craft/cloth/bands/tabby.ts';
import { drawTwining } from '#core/craft/cloth/bands/twining.ts';
import type { ClothBand, HemStitchBand } from '#core/craft/cloth/cloth-piece.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

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

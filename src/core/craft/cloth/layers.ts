/** A drawing is laid in layers, the farthest first. What a layer shows does not depend on where it lies, so it is moved as a whole. */
import { moved } from '#core/craft/cloth/markup.ts';

export interface Layer {
  /** A band by its place among the piece's bands, or what lies behind, below and in front of the cloth. */
  readonly of: number | 'behind' | 'fringe' | 'front';
  /** Pixels of the picture. */
  readonly x: number;
  readonly y: number;
  readonly markup: string;
  /** All that its marks follow from, where they are worth keeping: what has the same inputs has the same marks. */
  readonly inputs?: string;
}

/** The layer as it stands in the drawing. */
export const markupOf = ({ x, y, markup }: Layer): string => (x === 0 && y === 0 ? markup : `<g${moved(x, y)}>${markup}</g>`);

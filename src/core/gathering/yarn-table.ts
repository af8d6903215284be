/** All material of a piece of any craft as one would buy it. */
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';
import { yarnLines, type YarnTable } from '#core/gathering/yarn-lines.ts';

/** In the order of the craft: in weaving the warp first, then the weft yarns as the piece names them. */
export function yarnTable(piece: Piece, plan: Plan): YarnTable {
  return yarnLines(craftOf(piece).materials({ piece, plan }));
}

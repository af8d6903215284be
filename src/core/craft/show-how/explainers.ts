/** Who writes down the workings of which craft; each stands in its craft's own folder. A further craft is a further line. */
import type { CraftName } from '#core/craft/crafts.ts';
import { noteDyeing } from '#core/craft/dyeing/explain.ts';
import { noteMacrame } from '#core/craft/macrame/explain.ts';
import { PLANNED_CRAFTS } from '#core/craft/planners.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { noteHeddle } from '#core/craft/rigid-heddle/explain.ts';
import { noteFrameLoom } from '#core/craft/show-how/explain-piece.ts';
import type { Notebook } from '#core/craft/show-how/notebook.ts';

const EXPLAINERS: Readonly<Record<CraftName, (book: Notebook, fields: Fields) => boolean>> = {
  'frame-loom': noteFrameLoom,
  macrame: noteMacrame,
  dyeing: noteDyeing,
  'rigid-heddle': noteHeddle,
};

/** Writes down the workings of a piece of any craft; false, with a problem among the findings, if it cannot be reckoned. */
export function notePiece(book: Notebook, fields: Fields): boolean {
  const craft = fields.findings.soundly(() => fields.choice('craft', 'Craft', PLANNED_CRAFTS));
  return craft !== undefined && EXPLAINERS[craft](book, fields);
}

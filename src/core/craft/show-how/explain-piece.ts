/** The workings of a piece woven on a frame, in the order in which one number needs the other. */
import { addUp, mainWeft, weaveBands } from '#core/craft/frame-loom/add-up.ts';
import { putOnLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { noteBands, type NotedBand } from '#core/craft/show-how/explain-bands.ts';
import type { DressedWorkings } from '#core/craft/show-how/bands/band.ts';
import { noteFinish } from '#core/craft/show-how/explain-finish.ts';
import { noteWarp, noteWarpYarn } from '#core/craft/show-how/explain-warp.ts';
import { noteWeft } from '#core/craft/show-how/explain-weft.ts';
import { noteYarns } from '#core/craft/show-how/explain-yarns.ts';
import { from, sumOf, type Notebook } from '#core/craft/show-how/notebook.ts';
import { pickKey } from '#core/craft/techniques/technique.ts';
import { RULES } from '#core/craft/show-how/sources.ts';

/** Rows of the yarn most picks are woven with, before rounding: of tabby as they come out, of other bands as they are given. */
function noteRawPicks({ book, piece, weft }: DressedWorkings, plan: Omit<FrameLoomPlan, 'warnings'>, bands: readonly NotedBand[]): void {
  const raw = new Map(book.workings.map((working) => [working.id, working]));
  const woven = weaveBands(piece).filter((band) => band.woven.picks?.key === weft.main);
  const inputs = woven.flatMap(({ index }) => {
    const rows = raw.get(`bands.${String(index)}.rawPicks`) ?? bands.find((band) => band.index === index)?.work.rows;
    return rows === undefined ? [] : [from(`b${String(index)}`, rows)];
  });
  book.note({ id: 'weft.rawPicks', name: 'rows of the main weft before rounding', formula: sumOf(inputs), inputs, value: plan.weft.rawPicks, unit: 'ratio', ...RULES.arithmetic });
}

export function noteFrameLoom(book: Notebook, fields: Fields): boolean {
  fields.choice('craft', 'Craft', ['frame-loom']);
  const piece = putOnLoom(fields);
  if (piece === undefined) return false;
  const plan = { ...addUp(piece, fields.findings), warnings: [] };
  const of = { book, piece };
  const woven = weaveBands(piece);
  const bare = noteWarp(of);
  const weft = noteWeft(of, pickKey(mainWeft(woven, piece.laid).geometry.pick), bare);
  const warp = { ...bare, net: noteWarpYarn(of, bare, weft.picks.get(weft.main)?.warpCrimp) };
  const on = { ...of, warp, weft };
  const bands = noteBands(on, woven);
  noteRawPicks(on, plan, bands);
  const masses = noteYarns(on, bands, woven, plan);
  noteFinish(on, bands, woven, plan, masses);
  return true;
}

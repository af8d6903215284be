/** All that a series asks to gather, as its teacher sees it: each thing once, with the lines it comes from and what contradicts what. */
import type { Piece } from '#core/craft/crafts.ts';
import { contradictions, type Contradiction } from '#core/gathering/contradictions.ts';
import type { GatheringLine } from '#core/gathering/merge.ts';
import type { Actor } from '#server/context.ts';
import { Lesson, PatternPiece, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { gatheringLines } from '#server/queries/gathering/gathering-lines.ts';
import { workroomOf } from './workroom-of.ts';

export interface WholeList {
  readonly slug: string;
  readonly title: string;
  readonly workroomName: string;
  readonly parts: readonly { readonly publicId: string; readonly number: number; readonly title: string }[];
  readonly lines: readonly GatheringLine[];
  readonly contradictions: readonly Contradiction[];
  readonly pattern: Piece | null;
}

/** @returns null when there is no such series, or it is another teacher's. */
export async function wholeList(actor: Actor, slug: string): Promise<WholeList | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const [workroom, lessons, piece] = await Promise.all([
    workroomOf(series.workroomId),
    Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'], attributes: ['id', 'publicId', 'title'] }),
    PatternPiece.findByPk(series.id),
  ]);
  const parts = lessons.map(({ id, publicId, title }, index) => ({ id, publicId, number: index + 1, title }));
  const lines = await gatheringLines(parts, null);
  return { slug, title: series.title, workroomName: workroom.name, parts, lines, contradictions: contradictions(lines, parts.length), pattern: piece?.data ?? null };
}

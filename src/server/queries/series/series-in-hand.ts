/** A series with everything that `whatIsMissing` looks at. */
import { amountOf } from '#core/craft/amounts.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { LessonText, RefusedText } from '#core/lesson-text/parse-lesson-text.ts';
import type { PartInHand, SeriesInHand } from '#core/series/missing.ts';
import { GatheringItem, Lesson, PatternPiece, SeriesMedia, type Series } from '#server/models/index.ts';

export interface Draft {
  readonly lesson: Lesson;
  readonly text: LessonText | RefusedText;
}

export async function seriesInHand(series: Series): Promise<{ inHand: SeriesInHand; drafts: Draft[] }> {
  const [lessons, piece, media] = await Promise.all([
    Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'] }),
    PatternPiece.findByPk(series.id),
    SeriesMedia.findAll({ where: { seriesId: series.id } }),
  ]);
  const items = await GatheringItem.findAll({ where: { lessonId: lessons.map(({ id }) => id) } });
  const drafts = lessons.map((lesson) => ({ lesson, text: lesson.draftReading }));
  const plan = piece === null ? null : planPiece(piece.data);
  const names = new Set(media.map(({ name }) => name));
  const knows = (key: string): boolean => piece !== null && plan?.ok === true && amountOf(key, piece.data, plan.value).ok;
  const parts = drafts.map(({ lesson, text }, index): PartInHand => {
    const keys = [...(text.ok ? text.amounts : []), ...items.filter(({ lessonId }) => lessonId === lesson.id).map(({ amountKey }) => amountKey)];
    const { opens } = lesson;
    return {
      number: index + 1,
      title: lesson.title,
      textProblems: text.ok ? [] : text.problems.map(({ line, reason }) => `Line ${line}: ${reason}`),
      isEmpty: lesson.draftSource.trim() === '',
      unknownAmounts: plan?.ok === true ? [...new Set(keys.filter((key): key is string => key !== null && !knows(key)))] : [],
      unknownMedia: text.ok ? text.media.map(({ name }) => name).filter((name) => !names.has(name)) : [],
      opensAfterPart: opens.rule === 'after-verdict' ? lessons.findIndex(({ publicId }) => publicId === opens.lesson) + 1 || index + 1 : null,
      hasCheckpoint: lesson.checkpoint !== null,
      opensAt: lesson.opensAt,
    };
  });
  return {
    inHand: { title: series.title, summary: series.summary, priceMinor: series.priceMinor, pieceFits: plan === null ? null : plan.ok, parts },
    drafts,
  };
}

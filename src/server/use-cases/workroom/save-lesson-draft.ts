import type { LessonDraftInput } from '#contracts/workroom.ts';
import type { Context } from '#server/context.ts';
import { found } from '#server/errors.ts';
import { readLessonText } from '#server/lesson-text/parse-pool.ts';
import type { ParseResult } from '#server/lesson-text/serve-parses.ts';
import { Lesson } from '#server/models/index.ts';
import { placeOf, type PartPlace } from './_part-place.ts';
import { ownLesson, requireRevision, withSeriesLocked } from './_own-series.ts';

export interface DraftSaved {
  readonly part: PartPlace;
  readonly revision: number;
  readonly savedAt: Date;
  readonly reading: ParseResult;
}

/**
 * Keeps what was written, readable or not: nothing a teacher wrote is lost over a missing bracket. How it was read is
 * kept with it; students see it only after publishing, and only if it can be read.
 * @throws CONFLICT when another window kept something else since `revision`.
 */
export async function saveLessonDraft(ctx: Context, input: LessonDraftInput): Promise<DraftSaved> {
  const { lesson: known, series } = await ownLesson(ctx, input.lesson);
  const source = input.source.replace(/\r\n?/g, '\n');
  const reading = await readLessonText(source);
  return withSeriesLocked(series, async () => {
    const lesson = found(await Lesson.findByPk(known.id));
    if (lesson.draftSource !== source) {
      requireRevision(lesson.draftRevision, input.revision);
      await lesson.update({ draftSource: source, draftReading: reading, draftRevision: lesson.draftRevision + 1 });
    }
    return { part: placeOf(series, lesson), revision: lesson.draftRevision, savedAt: ctx.clock.now(), reading };
  });
}

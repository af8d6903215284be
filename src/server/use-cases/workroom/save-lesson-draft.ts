import type { LessonDraftInput } from '#contracts/workroom.ts';
import type { Context } from '#server/context.ts';
import { found } from '#server/errors.ts';
import { readLessonText } from '#server/lesson-text/parse-pool.ts';
import type { ParseResult } from '#server/lesson-text/serve-parses.ts';
import { Lesson } from '#server/models/index.ts';
import { placeOf, type PartPlace } from './_part-place.ts';
import { ownLesson, requireRevision, withSeriesLocked } from './_own-series.ts';
import { draftOfLesson, setAside } from './_set-aside.ts';

export interface DraftSaved {
  readonly part: PartPlace;
  readonly revision: number;
  readonly savedAt: Date;
  readonly reading: ParseResult;
}

/** After a pause of this length, what was written before it is kept as an earlier text of its own. */
const NEW_SITTING_AFTER_MS = 30 * 60_000;

/**
 * Keeps what was written, readable or not: nothing a teacher wrote is lost over a missing bracket. How it was read is
 * kept with it; students see it only after publishing, and only if it can be read. A text of an earlier sitting is set
 * aside before it is written over; when two windows wrote, both texts are.
 * @throws CONFLICT when another window kept something else since `revision`.
 */
export async function saveLessonDraft(ctx: Context, input: LessonDraftInput): Promise<DraftSaved> {
  const { lesson: known, series } = await ownLesson(ctx, input.lesson);
  const source = input.source.replace(/\r\n?/g, '\n');
  const reading = await readLessonText(source);
  const now = ctx.clock.now();
  const { lesson, seen } = await withSeriesLocked(series, async () => {
    const lesson = found(await Lesson.findByPk(known.id));
    const seen = lesson.draftRevision;
    if (lesson.draftSource === source) return { lesson, seen: input.revision };
    const isBehind = seen !== input.revision;
    if (isBehind || now.getTime() - lesson.updatedAt.getTime() > NEW_SITTING_AFTER_MS) await setAside(ctx, lesson, draftOfLesson(lesson));
    if (isBehind) await setAside(ctx, lesson, { source, at: now });
    else await lesson.update({ draftSource: source, draftReading: reading, draftRevision: seen + 1 });
    return { lesson, seen };
  });
  requireRevision(seen, input.revision);
  return { part: placeOf(series, lesson), revision: lesson.draftRevision, savedAt: now, reading };
}

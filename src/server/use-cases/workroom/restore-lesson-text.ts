import type { RestoreTextInput } from '#contracts/workroom.ts';
import type { Context } from '#server/context.ts';
import { found } from '#server/errors.ts';
import { readLessonText } from '#server/lesson-text/parse-pool.ts';
import { Lesson } from '#server/models/index.ts';
import { lessonText } from '#server/queries/workroom/lesson-texts.ts';
import { placeOf, type PartPlace } from './_part-place.ts';
import { ownLesson, requireRevision, withSeriesLocked } from './_own-series.ts';
import { draftOfLesson, setAside } from './_set-aside.ts';

/**
 * Takes an earlier text of a part up again as its draft. The draft of now is set aside first; students go on reading
 * what was published.
 * @throws NOT_FOUND for a text that the part does not have; CONFLICT when the draft was changed since `revision`.
 */
export async function restoreLessonText(ctx: Context, input: RestoreTextInput): Promise<PartPlace> {
  const { lesson: known, series } = await ownLesson(ctx, input.lesson);
  const source = found(await lessonText(known.publicId, input.text));
  const reading = await readLessonText(source);
  return withSeriesLocked(series, async () => {
    const lesson = found(await Lesson.findByPk(known.id));
    requireRevision(lesson.draftRevision, input.revision);
    if (lesson.draftSource !== source) {
      await setAside(ctx, lesson, draftOfLesson(lesson));
      await lesson.update({ draftSource: source, draftReading: reading, draftRevision: lesson.draftRevision + 1 });
    }
    return placeOf(series, lesson);
  });
}

import type { SeriesFile } from '#contracts/series-folder.ts';
import { instantOfWall, type OpeningRule } from '#core/timetable/opening.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { GatheringItem, Lesson, PatternPiece, Series } from '#server/models/index.ts';
import type { CheckedFolder } from './_check-folder.ts';

/** Writes the rows of a checked folder as a draft series, within the caller's transaction. @returns it and its lessons in their order. */
export async function makeSeries(place: { readonly workroomId: number; readonly slug: string }, folder: CheckedFolder): Promise<{ series: Series; lessons: Lesson[] }> {
  const { file, piece } = folder;
  const series = await Series.create({
    ...place,
    title: file.title,
    craft: file.craft,
    level: file.level,
    summary: file.summary,
    story: file.story,
    techniques: file.techniques,
    priceMinor: file.price?.amountMinor ?? null,
    currency: file.price?.currency ?? 'EUR',
  });
  if (piece !== null) await PatternPiece.create({ seriesId: series.id, data: piece });
  return { series, lessons: await writeLessons(series.id, folder) };
}

async function writeLessons(seriesId: number, { file, texts }: CheckedFolder): Promise<Lesson[]> {
  const publicIds = file.lessons.map(() => newPublicId());
  const lessons: Lesson[] = [];
  for (const [index, entry] of file.lessons.entries()) {
    const opens = openingRule(entry.opens, publicIds);
    const lesson = await Lesson.create({
      publicId: publicIds[index] ?? newPublicId(),
      seriesId,
      position: index + 1,
      title: entry.title,
      minutes: entry.minutes,
      isPreview: entry.preview,
      opens,
      opensAt: opens.rule === 'on-date' ? instantOfWall(opens.wall, opens.zone) : null,
      checkpoint: entry.checkpoint ?? null,
      draftSource: texts[index]?.source ?? '',
      ...(texts[index] === undefined ? {} : { draftReading: texts[index].reading }),
    });
    lessons.push(lesson);
    await GatheringItem.bulkCreate(entry.gathering.map((item, position) => ({
      lessonId: lesson.id,
      position: position + 1,
      kind: item.kind,
      name: item.name,
      amountKey: item.amount ?? null,
      amountText: item.amountText ?? null,
      standIn: item.standIn ?? null,
      untilPart: item.untilPart ?? null,
      note: item.note ?? null,
      lookOut: item.lookOut ?? null,
      getFrom: item.getFrom ?? null,
    })));
  }
  return lessons;
}

/** A part that is not in the folder is no part of the series; who opens the settings is asked for another. */
function openingRule(opens: SeriesFile['lessons'][number]['opens'], publicIds: readonly string[]): OpeningRule {
  return opens.rule === 'after-verdict' || opens.rule === 'after-part' ? { rule: opens.rule, lesson: publicIds[(opens.part ?? 0) - 1] ?? '' } : opens;
}

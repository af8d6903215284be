/** Rows for tests. Each makes the parents it needs and takes what the test is about. */
import { randomBytes } from 'node:crypto';
import type { CreationAttributes } from 'sequelize';
import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { Enrolment, GatheringItem, Lesson, LessonVersion, Series, User, Workroom } from '#server/models/index.ts';

const some = (): string => randomBytes(5).toString('hex');

export function buildUser(given: Partial<CreationAttributes<User>> = {}): Promise<User> {
  const email = `${some()}@weavers.example`;
  return User.create({ email, emailKey: given.email ?? email, name: `Student ${some()}`, emailConfirmedAt: new Date('2026-11-01T00:00:00Z'), ...given });
}

export async function buildWorkroom(given: Partial<CreationAttributes<Workroom>> = {}): Promise<Workroom> {
  const ownerId = given.ownerId ?? (await buildUser()).id;
  return Workroom.create({ ownerId, handle: `handle-${some()}`, name: 'Saltmarsh Loom Room', timeZone: 'Europe/Berlin', ...given });
}

export async function buildSeries(given: Partial<CreationAttributes<Series>> = {}): Promise<Series> {
  const workroomId = given.workroomId ?? (await buildWorkroom()).id;
  return Series.create({ workroomId, slug: `series-${some()}`, title: 'Low Tide', priceMinor: 6_800, state: 'published', publishedAt: new Date('2026-11-01T00:00:00Z'), ...given });
}

/** A lesson; published with a short text unless `publishedVersionId` is given as null. */
export async function buildLesson(given: Partial<CreationAttributes<Lesson>> = {}): Promise<Lesson> {
  const seriesId = given.seriesId ?? (await buildSeries()).id;
  const position = given.position ?? (await Lesson.count({ where: { seriesId } })) + 1;
  const lesson = await Lesson.create({ seriesId, position, title: `Part ${position}`, opens: { rule: 'at-once' }, ...given });
  if (given.publishedVersionId === undefined) {
    const source = 'Weave **one row**.';
    const reading = parseLessonText(source);
    if (!reading.ok) throw new RangeError(source);
    const version = await LessonVersion.create({ lessonId: lesson.id, number: 1, source, tree: reading.tree, facts: factsOf(reading.tree) });
    await lesson.update({ publishedVersionId: version.id, draftSource: source, draftReading: reading });
  }
  return lesson;
}

export async function buildEnrolment(given: Partial<CreationAttributes<Enrolment>> = {}): Promise<Enrolment> {
  const userId = given.userId ?? (await buildUser()).id;
  const seriesId = given.seriesId ?? (await buildSeries()).id;
  return Enrolment.create({ userId, seriesId, source: 'granted', startedAt: new Date('2026-11-15T00:00:00Z'), ...given });
}

export async function buildGatheringItem(given: Partial<CreationAttributes<GatheringItem>> = {}): Promise<GatheringItem> {
  const lessonId = given.lessonId ?? (await buildLesson()).id;
  return GatheringItem.create({ lessonId, position: 1, kind: 'tool', name: 'Tapestry needle', ...given });
}

import { describe, expect, test } from 'vitest';
import { LessonRead, LessonVisit, Tick, WorkroomHelper } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { noteReading, readAnew } from '#server/use-cases/progress/note-reading.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed, writeText, type Followed } from '../../support/followed.ts';

const now = new Date('2026-12-01T09:00:00Z');

/** As the page of a part does it. */
async function open({ series, student }: Pick<Followed, 'series' | 'student'>, number = 1): Promise<number | null> {
  const met = await seriesFor(await actorOf(student), series.slug, now);
  const part = met?.parts[number - 1];
  if (met === null || part === undefined) throw new RangeError(String(number));
  return noteReading(met, part, now);
}

describe('a part that was read', () => {
  test('is remembered the first time, without counting as begun', async () => {
    const followed = await buildFollowed();
    expect([await open(followed), await open(followed)]).toEqual([null, null]);
    expect(await LessonRead.findAll().then((all) => all.map(({ versionId }) => versionId))).toEqual([followed.parts[0].publishedVersionId]);
    expect(await LessonVisit.count()).toBe(0);
  });

  test('and then changed is told with the text she read, until she says that she has read the new one', async () => {
    const followed = await buildFollowed();
    const { series, parts: [first], student } = followed;
    const read = first.publishedVersionId;
    await open(followed);
    await writeText(first, '<Step id="tie-on">Tie on twice.</Step>', 3);
    expect([await open(followed), await open(followed)]).toEqual([read, read]);
    const ctx = await contextFor(student);
    await setTick(ctx, { subject: 'step', series: series.slug, lesson: first.publicId, item: 'tie-on', ticked: true });
    expect(await open(followed)).toBe(read);
    await readAnew(ctx, { series: series.slug, lesson: first.publicId, version: first.publishedVersionId ?? 0 });
    expect(await open(followed)).toBeNull();
    expect(await Tick.count({ where: { isTicked: true } })).toBe(1);
  });

  test('is not taken as read in a text that was published while she looked at another', async () => {
    const followed = await buildFollowed();
    const { series, parts: [first], student } = followed;
    await open(followed);
    const shown = first.publishedVersionId ?? 0;
    await writeText(first, '<Step id="tie-on">Tie on twice.</Step>', 3);
    await readAnew(await contextFor(student), { series: series.slug, lesson: first.publicId, version: shown });
    expect(await open(followed)).toBe(shown);
  });

  test('says nothing to others: a visitor, who looks after it, and who waits for it', async () => {
    const followed = await buildFollowed();
    const { series, parts: [first, , third], student } = followed;
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
    await open({ series, student: helper });
    await open(followed, 3);
    expect(await LessonRead.count()).toBe(0);
    const input = { series: series.slug, lesson: first.publicId, version: first.publishedVersionId ?? 0 };
    await expect(readAnew(contextOf(null), input)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(readAnew(await contextFor(await buildUser()), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(readAnew(await contextFor(helper), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(readAnew(await contextFor(student), { ...input, lesson: third.publicId })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await LessonRead.count()).toBe(0);
  });

  test('by two windows at once is kept once', async () => {
    const followed = await buildFollowed();
    await Promise.all([open(followed), open(followed)]);
    expect(await LessonRead.count()).toBe(1);
  });
});

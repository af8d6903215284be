import { describe, expect, test } from 'vitest';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { LessonVersion, type Lesson } from '#server/models/index.ts';
import { publishedText, publishedTexts } from '#server/queries/lessons/published-text.ts';
import { lessonLoader } from '#server/web/lesson-loader.ts';
import { buildLesson, buildSeries } from '../../support/factories.ts';

/** A version whose stored tree is whatever a test puts there. */
function versionOf(lesson: Lesson, source: string, tree: unknown): Promise<LessonVersion> {
  return LessonVersion.create({ lessonId: lesson.id, number: 7, source, tree: tree as LessonTree, facts: { outline: [], steps: [], amounts: [], figures: [], media: [] } });
}

const words = (value: string): unknown => [{ type: 'paragraph', children: [{ type: 'text', value }] }];

describe('a published text', () => {
  test('is the tree as it was published, with what it speaks of', async () => {
    const lesson = await buildLesson();
    const text = await publishedText(lesson.publishedVersionId ?? 0);
    expect(text?.tree.children).toMatchObject([{ type: 'paragraph' }]);
    expect(text?.facts.steps).toEqual([]);
  });

  test('is read anew from its source when its tree was kept by another version of the program', async () => {
    const lesson = await buildLesson();
    const version = await versionOf(lesson, 'Weave.', { v: 0, type: 'root', children: [] });
    expect((await publishedText(version.id))?.tree).toEqual({ v: 1, type: 'root', children: words('Weave.') });
  });

  test('is never drawn from a tree into which somebody wrote', async () => {
    const lesson = await buildLesson();
    const version = await versionOf(lesson, 'Weave.', { v: 1, type: 'root', children: [{ type: 'html', value: '<script>alert(1)</script>' }] });
    expect(JSON.stringify(await publishedText(version.id))).not.toContain('script');
  });

  test('that is not there is null', async () => {
    await expect(publishedText(4_000_000)).resolves.toBeNull();
  });
});

describe('the texts of a series', () => {
  test('come in the order of its parts, without drafts and parts that were taken out', async () => {
    const seriesId = (await buildSeries()).id;
    const second = await buildLesson({ seriesId, position: 2 });
    const first = await buildLesson({ seriesId, position: 1 });
    await buildLesson({ seriesId, position: 3, publishedVersionId: null });
    await buildLesson({ seriesId, position: 4, takenOutAt: new Date('2026-11-20T00:00:00Z') });
    expect((await publishedTexts(seriesId)).map(({ versionId }) => versionId)).toEqual([first.publishedVersionId, second.publishedVersionId]);
  });
});

describe('the live collection', () => {
  test('gives a text under the number of its version', async () => {
    const lesson = await buildLesson();
    const version = lesson.publishedVersionId ?? 0;
    await expect(lessonLoader().loadEntry({ filter: { version } })).resolves.toMatchObject({ id: String(version), data: { versionId: version, tree: { v: 1 } } });
    await expect(lessonLoader().loadCollection({ filter: { seriesId: lesson.seriesId } })).resolves.toMatchObject({ entries: [{ id: String(version) }] });
  });

  test('knows nothing of what is not there, and returns what fails', async () => {
    const broken = (): Promise<never> => Promise.reject(new Error('The line to the database is down.'));
    const loader = lessonLoader({ publishedText: broken, publishedTexts: broken });
    await expect(lessonLoader().loadEntry({ filter: { version: 4_000_000 } })).resolves.toBeUndefined();
    await expect(loader.loadEntry({ filter: { version: 1 } })).resolves.toMatchObject({ error: { message: 'The line to the database is down.' } });
    await expect(loader.loadCollection({ filter: { seriesId: 1 } })).resolves.toMatchObject({ error: { message: 'The line to the database is down.' } });
    await expect(loader.loadCollection({})).resolves.toMatchObject({ error: { name: 'RangeError' } });
  });
});

import { beforeEach, describe, expect, test } from 'vitest';
import { whatIsMissing } from '#core/series/missing.ts';
import { GatheringItem, PatternPiece, type Lesson, type Series } from '#server/models/index.ts';
import { seriesInHand } from '#server/queries/series/series-in-hand.ts';
import { publishSeries } from '#server/use-cases/series/publish-series.ts';
import { saveLessonDraft } from '#server/use-cases/workroom/save-lesson-draft.ts';
import { contextFor, type TestContext } from '../../support/context.ts';
import { buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

let ctx: TestContext;
let series: Series;
let first: Lesson;
let second: Lesson;

const write = (lesson: Lesson, source: string, revision = 0) => saveLessonDraft(ctx, { lesson: lesson.publicId, revision, source });

beforeEach(async () => {
  const teacher = await buildUser();
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id, state: 'draft', publishedAt: null, summary: 'Weave the shore.' });
  ctx = await contextFor(teacher);
  first = await buildLesson({ seriesId: series.id, publishedVersionId: null });
  second = await buildLesson({ seriesId: series.id, publishedVersionId: null });
  await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
  await write(first, '<Step id="gather">Gather what it takes.</Step>');
  await write(second, '<Step id="wind">Wind it.</Step>');
});

describe('before publishing', () => {
  const says = async (): Promise<string[]> => whatIsMissing((await seriesInHand(await series.reload())).inHand).filter(({ blocks }) => !blocks).map(({ part, place, says: words }) => `${part ?? ''} ${place}: ${words}`);

  test('what is doubtful in lists, texts and photos is told and does not block', async () => {
    await second.update({ checkpoint: { ask: 'Show your warped loom', look: [] } });
    await GatheringItem.create({ lessonId: first.id, position: 1, kind: 'tool', name: 'Tapestry needle, blunt', amountText: '1' });
    await GatheringItem.create({ lessonId: second.id, position: 1, kind: 'tool', name: 'Tapestry needle, pointed', amountText: '1' });
    await GatheringItem.create({ lessonId: second.id, position: 2, kind: 'tool', name: 'Sharp scissors' });
    expect(await says()).toEqual(expect.arrayContaining([
      expect.stringMatching(/^2 list: It asks for “Tapestry needle, pointed”, Part 1 for “Tapestry needle, blunt”/),
      '2 list: “Sharp scissors” has no amount, so nobody knows how much to bring.',
      '2 text: “Sharp scissors” can hurt, and no caution stands in the text.',
      '2 settings: It asks for a photo and does not say what you look for in it.',
    ]));
    await publishSeries(ctx, series.slug);
  });

  test('a caution in the text is enough', async () => {
    await GatheringItem.create({ lessonId: first.id, position: 1, kind: 'tool', name: 'Craft knife', amountText: '1' });
    await write(first, '<Step id="cut">Cut the card.</Step>\n\n<Caution title="The knife">Cut away from your hand.</Caution>', 1);
    expect((await first.reload()).draftReading.ok ? (await says()).filter((words) => words.includes('can hurt')) : 'not read').toEqual([]);
  });
});

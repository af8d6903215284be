import { beforeEach, describe, expect, test } from 'vitest';
import { LessonSettingsForm } from '#contracts/workroom.ts';
import { AuditEntry, Enrolment, GatheringItem, Lesson, LessonVersion, PatternPiece, Series, type User } from '#server/models/index.ts';
import { publishSeries } from '#server/use-cases/series/publish-series.ts';
import { takeBackSeries } from '#server/use-cases/series/take-back-series.ts';
import { addGatheringItem, moveGatheringItem, saveGatheringItem, takeOutGatheringItem } from '#server/use-cases/workroom/change-gathering.ts';
import { createSeries } from '#server/use-cases/workroom/create-series.ts';
import { restoreLessonText } from '#server/use-cases/workroom/restore-lesson-text.ts';
import { lessonText, lessonTexts } from '#server/queries/workroom/lesson-texts.ts';
import { saveLessonDraft } from '#server/use-cases/workroom/save-lesson-draft.ts';
import { saveLessonSettings } from '#server/use-cases/workroom/save-lesson-settings.ts';
import { saveSeriesDetails } from '#server/use-cases/workroom/save-series-details.ts';
import { contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

let teacher: User;
let ctx: TestContext;
let series: Series;
let first: Lesson;
let second: Lesson;

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id, state: 'draft', publishedAt: null, summary: 'Weave the shore.' });
  ctx = await contextFor(teacher);
  first = await buildLesson({ seriesId: series.id, publishedVersionId: null });
  second = await buildLesson({ seriesId: series.id, publishedVersionId: null });
});

const write = (lesson: Lesson, source: string, revision = 0) => saveLessonDraft(ctx, { lesson: lesson.publicId, revision, source });

async function makeReady(): Promise<void> {
  await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
  await write(first, '<Step id="gather">Gather what it takes.</Step>');
  await write(second, 'Wind <Amount of="ends"/>.\n\n<Step id="wind">Wind it.</Step>');
}

describe('a draft', () => {
  test('is kept readable or not, and its lines are told', async () => {
    const { revision, reading } = await write(first, 'Wind {1+1} ends.');
    expect([revision, reading.ok, reading.problems.map(({ line, code }) => [line, code])]).toEqual([1, false, [[1, 'code']]]);
    expect((await first.reload()).draftSource).toBe('Wind {1+1} ends.');
  });

  test.each([
    '<script>alert(1)</script>', 'import x from "fs"', '<img src=x onerror=alert(1)>', '[a](javascript:alert(1))', '<Step id="a" onClick="x">Go.</Step>', '{process.env.KEY}',
  ])('that is hostile is kept as it was typed and never published: %s', async (source) => {
    await makeReady();
    await write(first, source, 1);
    expect((await first.reload()).draftSource).toBe(source);
    await expect(publishSeries(ctx, series.slug)).rejects.toMatchObject({ code: 'VALIDATION', says: expect.stringContaining('Part 1: Line 1:') });
    expect(await LessonVersion.count()).toBe(0);
  });

  test('is not written over by a window that has not seen it', async () => {
    await write(first, 'Mine.');
    await expect(write(first, 'Older.')).rejects.toMatchObject({ code: 'CONFLICT' });
    expect((await first.reload()).draftSource).toBe('Mine.');
  });

  test('that is the same already is no conflict', async () => {
    await write(first, 'Mine.');
    await expect(write(first, 'Mine.')).resolves.toMatchObject({ revision: 1 });
  });

  test('of two windows that save at once one is heard', async () => {
    const results = await Promise.allSettled([write(first, 'One.'), write(first, 'Two.')]);
    expect(results.map(({ status }) => status).toSorted()).toEqual(['fulfilled', 'rejected']);
  });
});

describe('earlier texts', () => {
  const kept = async (lesson: Lesson): Promise<(string | null)[]> => Promise.all((await lessonTexts(lesson.publicId)).map(({ key }) => lessonText(lesson.publicId, key)));
  const restore = (lesson: Lesson, text: string, revision: number, as = ctx) => restoreLessonText(as, { lesson: lesson.publicId, revision, text });
  const writeLater = (minutes: number, source: string, revision: number) =>
    saveLessonDraft({ ...ctx, clock: { now: () => new Date(Date.now() + minutes * 60_000) } }, { lesson: first.publicId, revision, source });

  test('of two windows both are kept, whichever goes on', async () => {
    await write(first, 'Theirs.');
    await expect(write(first, 'Mine.')).rejects.toMatchObject({ code: 'CONFLICT' });
    expect(await kept(first)).toEqual(['Mine.']);
    await write(first, 'Mine.', 1);
    expect(await kept(first)).toEqual(['Theirs.']);
    expect((await first.reload()).draftSource).toBe('Mine.');
  });

  test('of an earlier sitting are kept, those of one sitting are not', async () => {
    await write(first, 'One.');
    await writeLater(60, 'Two.', 1);
    await writeLater(1, 'Three.', 2);
    expect(await kept(first)).toEqual(['One.']);
    expect((await lessonTexts(first.publicId))[0]).toMatchObject({ number: null, authorName: 'Ilse Marrow' });
  });

  test('are taken up again as the draft, which is set aside; students go on reading what was published', async () => {
    await makeReady();
    await publishSeries(ctx, series.slug);
    const read = (await first.reload()).publishedVersionId;
    await write(first, 'Something else.', 1);
    await restore(first, 'v1', 2);
    expect(await first.reload()).toMatchObject({ draftSource: '<Step id="gather">Gather what it takes.</Step>', draftRevision: 3, publishedVersionId: read });
    expect(await kept(first)).toContain('Something else.');
    const [aside] = (await lessonTexts(first.publicId)).filter(({ number }) => number === null);
    await restore(first, aside?.key ?? '', 3);
    expect((await first.reload()).draftSource).toBe('Something else.');
  });

  test('taken up twice are there once', async () => {
    await makeReady();
    await publishSeries(ctx, series.slug);
    await restore(first, 'v1', 1);
    expect((await first.reload()).draftRevision).toBe(1);
    expect(await kept(first)).toHaveLength(1);
  });

  test('that are not there, of another part, over a newer draft or for another teacher are refused and change nothing', async () => {
    await makeReady();
    await publishSeries(ctx, series.slug);
    await write(first, 'New.', 1);
    const elsewhere = await contextFor(await buildUser());
    await expect(restore(first, 'v9', 2)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(restore(first, '0'.repeat(26), 2)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(restore(first, 'v1', 1)).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(restore(first, 'v1', 2, elsewhere)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect((await first.reload()).draftSource).toBe('New.');
  });
});

describe('publishing', () => {
  test('says all that is missing and changes nothing', async () => {
    await series.update({ summary: '', priceMinor: null });
    await expect(publishSeries(ctx, series.slug)).rejects.toMatchObject({ code: 'VALIDATION', says: expect.stringMatching(/summary is missing.*price is missing.*piece is not described.*Part 1: Nothing is written/) });
    expect((await series.reload()).state).toBe('draft');
  });

  test('makes a version of each part, and twice makes no second', async () => {
    await makeReady();
    await publishSeries(ctx, series.slug);
    await publishSeries(ctx, series.slug);
    expect(await LessonVersion.findAll({ order: ['id'] }).then((all) => all.map(({ lessonId, number }) => [lessonId, number]))).toEqual([[first.id, 1], [second.id, 1]]);
    expect((await series.reload()).state).toBe('published');
  });

  test('again makes a version only of what changed; until then students keep the old text', async () => {
    await makeReady();
    await publishSeries(ctx, series.slug);
    const read = (await first.reload()).publishedVersionId;
    await write(first, 'Gather less.\n\n<Step id="gather">Go.</Step>', 1);
    expect((await first.reload()).publishedVersionId).toBe(read);
    await publishSeries(ctx, series.slug);
    expect(await LessonVersion.count({ where: { lessonId: first.id } })).toBe(2);
    expect(await LessonVersion.count({ where: { lessonId: second.id } })).toBe(1);
  });

  test('taking back keeps seats and what they read', async () => {
    await makeReady();
    await publishSeries(ctx, series.slug);
    const seat = await buildEnrolment({ seriesId: series.id });
    await takeBackSeries(ctx, series.slug);
    expect((await series.reload()).state).toBe('draft');
    expect((await Enrolment.findByPk(seat.id))?.state).toBe('active');
    expect((await first.reload()).publishedVersionId).not.toBeNull();
    expect((await AuditEntry.findAll({ order: ['id'] })).map(({ action }) => action)).toEqual(['publish-series', 'take-back-series']);
  });

  test('is refused for an amount that no plan gives, in text or list', async () => {
    await makeReady();
    await write(second, '<Amount of="band.sea.rows"/>', 1);
    await GatheringItem.create({ lessonId: first.id, position: 1, kind: 'tool', name: 'Card', amountKey: 'band.sea.cut' });
    await expect(publishSeries(ctx, series.slug)).rejects.toMatchObject({ says: expect.stringMatching(/gathering list asks for the amount “band\.sea\.cut”.*text asks for the amount “band\.sea\.rows”/) });
  });
});

describe('settings of a part', () => {
  const settings = (given: Record<string, string>) => LessonSettingsForm.parse({ lesson: second.publicId, title: 'Dress the loom', minutes: '90', rule: 'at-once', ...given });

  test('a date is kept on the teacher’s clock', async () => {
    await saveLessonSettings(ctx, settings({ rule: 'on-date', wall: '2027-07-01 09:00' }));
    expect(await second.reload()).toMatchObject({ opens: { rule: 'on-date', wall: '2027-07-01T09:00', zone: 'Europe/Berlin' }, opensAt: new Date('2027-07-01T07:00:00Z') });
  });

  test.each([
    ['a date in the past', { rule: 'on-date', wall: '2026-11-30T09:00' }, 'wall'],
    ['letters for a date', { rule: 'on-date', wall: 'next spring' }, 'wall'],
    ['no date', { rule: 'on-date' }, 'wall'],
    ['letters for days', { rule: 'after-seat', days: 'seven' }, 'days'],
    ['too many days', { rule: 'after-seat', days: '366' }, 'days'],
    ['no part', { rule: 'after-verdict' }, 'after'],
    ['a photo that asks for nothing', { asksForPhoto: 'yes' }, 'ask'],
    ['a date beside another way', { rule: 'at-once', wall: '2027-07-01T09:00' }, 'wall'],
  ])('%s is refused at its field, and nothing is kept', async (_words, given, field) => {
    await expect(saveLessonSettings(ctx, settings(given))).rejects.toMatchObject({ code: 'VALIDATION', fields: { [field]: expect.stringMatching(/\w{3}/) } });
    expect((await second.reload()).title).toBe('Part 2');
  });

  test('a part waits for the photo of an earlier one only', async () => {
    await first.update({ checkpoint: { ask: 'Show it', look: [] } });
    await saveLessonSettings(ctx, settings({ rule: 'after-verdict', after: first.publicId }));
    expect((await second.reload()).opens).toEqual({ rule: 'after-verdict', lesson: first.publicId });
    await second.update({ checkpoint: { ask: 'Show it', look: [] } });
    await expect(saveLessonSettings(ctx, { ...settings({ rule: 'after-verdict', after: second.publicId }), lesson: first.publicId })).rejects.toMatchObject({ fields: { after: expect.stringContaining('comes later') } });
  });

  test('a fourth part that would open before the third is refused at its date while the series is open, and nothing is kept', async () => {
    const seriesId = series.id;
    await buildLesson({ seriesId, position: 3, opens: { rule: 'on-date', wall: '2027-07-08T09:00', zone: 'Europe/Berlin' }, opensAt: new Date('2027-07-08T07:00:00Z') });
    const fourth = await buildLesson({ seriesId, position: 4, title: 'Fringe' });
    await series.update({ state: 'published' });
    const early = settings({ lesson: fourth.publicId, rule: 'on-date', wall: '2027-07-01T09:00' });
    await expect(saveLessonSettings(ctx, early)).rejects.toMatchObject({ code: 'VALIDATION', fields: { wall: 'People follow this series, so nothing was changed. Part 4 would be stuck: It opens before Part 3. Parts open in their order.' } });
    expect(await fourth.reload()).toMatchObject({ title: 'Fringe', opens: { rule: 'at-once' } });
  });

  test('a photo that others wait for stays while the series is open', async () => {
    await second.update({ opens: { rule: 'after-verdict', lesson: first.publicId } });
    await first.update({ checkpoint: { ask: 'Show it', look: [] } });
    await series.update({ state: 'published' });
    await expect(saveLessonSettings(ctx, { ...settings({}), lesson: first.publicId })).rejects.toMatchObject({ fields: { asksForPhoto: expect.stringContaining('Part 2 would be stuck') } });
    expect((await first.reload()).checkpoint).not.toBeNull();
  });
});

describe('a gathering list', () => {
  const line = { kind: 'tool', name: 'Comb', amountKey: null, amountText: null, standIn: null, untilPart: null, note: null, lookOut: null, getFrom: null, keep: false } as const;
  const names = async (): Promise<string[]> => (await GatheringItem.findAll({ where: { lessonId: first.id, takenOutAt: null }, order: ['position'] })).map(({ name }) => name);

  test('takes lines, changes, moves and takes them out', async () => {
    const comb = await addGatheringItem(ctx, { lesson: first.publicId, ...line });
    const card = await addGatheringItem(ctx, { lesson: first.publicId, ...line, name: 'Card' });
    await moveGatheringItem(ctx, card.publicId, 'up');
    await moveGatheringItem(ctx, card.publicId, 'up');
    expect(await names()).toEqual(['Card', 'Comb']);
    await saveGatheringItem(ctx, { item: comb.publicId, ...line, name: 'Heavy comb' });
    await takeOutGatheringItem(ctx, card.publicId);
    expect(await names()).toEqual(['Heavy comb']);
  });

  test('knows the amounts of the piece', async () => {
    await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
    await expect(addGatheringItem(ctx, { lesson: first.publicId, ...line, amountKey: 'yarn.sea' })).rejects.toMatchObject({ fields: { amountKey: expect.stringContaining('no such amount') } });
    await addGatheringItem(ctx, { lesson: first.publicId, ...line, amountKey: 'warp' });
    expect(await names()).toEqual(['Comb']);
  });
});

describe('words and price', () => {
  const details = (given: object = {}) => ({ series: series.slug, revision: series.revision, title: 'Low Tide', summary: 'S', story: '', level: 'beginner' as const, techniques: ['tabby'], price: '68', currency: 'EUR', ...given });

  test('are kept, and a changed price is noted', async () => {
    await saveSeriesDetails(ctx, details({ price: '72,50' }));
    expect(await series.reload()).toMatchObject({ priceMinor: 7_250, techniques: ['tabby'], revision: 1 });
    expect((await AuditEntry.findAll()).map(({ action }) => action)).toEqual(['change-price']);
  });

  test.each([['a price in letters', { price: 'dear' }, 'price'], ['less than nothing', { price: '-1' }, 'price'], ['an unknown currency', { currency: 'XXX' }, 'currency']])('%s is refused at its field', async (_words, given, field) => {
    await expect(saveSeriesDetails(ctx, details(given))).rejects.toMatchObject({ fields: { [field]: expect.any(String) } });
  });

  test('of an older window do not write over newer ones', async () => {
    await saveSeriesDetails(ctx, details());
    await expect(saveSeriesDetails(ctx, details({ title: 'Old' }))).rejects.toMatchObject({ code: 'CONFLICT' });
  });
});

describe('another’s series', () => {
  test('is written, set, priced, published and taken back by nobody else', async () => {
    const student = await buildUser();
    await buildEnrolment({ seriesId: series.id, userId: student.id });
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    const settings = LessonSettingsForm.parse({ lesson: first.publicId, title: 'Mine', minutes: '1', rule: 'at-once' });
    for (const foreign of [await contextFor(other), await contextFor(student), contextOf(null)]) {
      for (const act of [
        () => saveLessonDraft(foreign, { lesson: first.publicId, revision: 0, source: 'Mine.' }),
        () => saveLessonSettings(foreign, settings),
        () => addGatheringItem(foreign, { lesson: first.publicId, kind: 'tool', name: 'Comb', amountKey: null, amountText: null, standIn: null, untilPart: null, note: null, lookOut: null, getFrom: null, keep: false }),
        () => publishSeries(foreign, series.slug),
        () => takeBackSeries(foreign, series.slug),
      ]) await expect(act()).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    expect((await first.reload()).draftSource).toBe('');
  });

  test('is made by nobody without a workroom', async () => {
    await expect(createSeries(await contextFor(await buildUser()), { title: 'Mine', craft: 'frame-loom' })).rejects.toMatchObject({ code: 'FORBIDDEN' });
  });

  test('of one’s own has an address of its own, also for a name that is taken', async () => {
    const [one, two] = [await createSeries(ctx, { title: 'High Tide', craft: 'frame-loom' }), await createSeries(ctx, { title: 'High Tide', craft: 'frame-loom' })];
    expect([one.slug, two.slug.startsWith('high-tide-'), one.state]).toEqual(['high-tide', true, 'draft']);
    expect(await Series.count()).toBe(3);
  });
});

import { beforeEach, describe, expect, test } from 'vitest';
import { NewGatheringForm, NewKeptThingForm } from '#contracts/workroom.ts';
import { GatheringItem, KeptThing, Tick, WorkroomHelper, type Lesson, type Series, type User } from '#server/models/index.ts';
import { gatheringLines } from '#server/queries/gathering/gathering-lines.ts';
import { keptThings, thingsTakenOut } from '#server/queries/workroom/kept-things.ts';
import { lessonDesk } from '#server/queries/workroom/lesson-desk.ts';
import { wholeList } from '#server/queries/workroom/whole-list.ts';
import { addGatheringItem, moveGatheringItem, putBackGatheringItem, saveGatheringItem, takeOutGatheringItem } from '#server/use-cases/workroom/change-gathering.ts';
import { addKeptThing, putBackKeptThing, saveKeptThing, takeOutKeptThing } from '#server/use-cases/workroom/keep-things.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';
import { actorOf, contextFor, type TestContext } from '../../support/context.ts';
import { buildEnrolment, buildGatheringItem, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let teacher: User;
let ctx: TestContext;
let series: Series;
let part: Lesson;

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  ctx = await contextFor(teacher);
  part = await buildLesson({ seriesId: series.id });
});

const needle = NewKeptThingForm.parse({ kind: 'tool', name: 'Tapestry needle, blunt', lookOut: 'Its eye takes the yarn.', getFrom: 'A haberdasher', standIn: '' });
const lineOf = (given: Record<string, string> = {}) => NewGatheringForm.parse({ lesson: part.publicId, kind: 'tool', name: 'Comb', ...given });
const names = async (): Promise<string[]> => (await keptThings(series.workroomId)).map(({ name }) => name);

async function strangers(): Promise<TestContext[]> {
  const helper = await buildUser();
  await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
  const other = await buildUser();
  await buildWorkroom({ ownerId: other.id });
  return Promise.all([helper, other, await buildUser()].map((user) => contextFor(user)));
}

describe('a thing kept for all lists', () => {
  test('is changed, taken out and put back by its own teacher only', async () => {
    const { publicId } = await addKeptThing(ctx, needle);
    for (const stranger of await strangers()) {
      await expect(saveKeptThing(stranger, { thing: publicId, ...needle, name: 'Taken' })).rejects.toMatchObject({ code: 'NOT_FOUND' });
      await expect(takeOutKeptThing(stranger, publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
      await expect(putBackKeptThing(stranger, publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    await expect(addKeptThing(await contextFor(await buildUser()), needle)).rejects.toMatchObject({ code: 'FORBIDDEN' });
    expect(await names()).toEqual(['Tapestry needle, blunt']);
  });

  test('is kept once under its name, whatever its capitals, and says where the other one is', async () => {
    const { publicId } = await addKeptThing(ctx, needle);
    await expect(addKeptThing(ctx, { ...needle, name: 'TAPESTRY needle, blunt' })).rejects.toMatchObject({ fields: { name: expect.stringContaining('among your things already') } });
    await takeOutKeptThing(ctx, publicId);
    await expect(addKeptThing(ctx, needle)).rejects.toMatchObject({ fields: { name: expect.stringContaining('Put it back below') } });
    await expect(addKeptThing(ctx, { ...needle, kind: 'material' })).resolves.toBeDefined();
  });

  test('of two windows that keep it at once one is heard', async () => {
    const results = await Promise.allSettled([addKeptThing(ctx, needle), addKeptThing(ctx, needle)]);
    expect(results.map(({ status }) => status).toSorted()).toEqual(['fulfilled', 'rejected']);
  });

  test('is not lost when it is taken out', async () => {
    const { publicId } = await addKeptThing(ctx, needle);
    await takeOutKeptThing(ctx, publicId);
    expect([await names(), (await thingsTakenOut(series.workroomId)).map(({ name }) => name)]).toEqual([[], ['Tapestry needle, blunt']]);
    await putBackKeptThing(ctx, publicId);
    expect((await keptThings(series.workroomId))[0]).toMatchObject({ lookOut: 'Its eye takes the yarn.', getFrom: 'A haberdasher', standIn: null });
  });

  test('comes from a line she writes, and a line written anew brings it up to date', async () => {
    const line = await addGatheringItem(ctx, lineOf({ keep: 'yes', lookOut: 'Wide teeth' }));
    await saveGatheringItem(ctx, { ...lineOf({ keep: 'yes', lookOut: 'Teeth as wide as the ends' }), item: line.publicId });
    expect((await KeptThing.findAll()).map(({ name, lookOut }) => [name, lookOut])).toEqual([['Comb', 'Teeth as wide as the ends']]);
    await saveGatheringItem(ctx, { ...lineOf({ name: 'Fork' }), item: line.publicId });
    expect(await names()).toEqual(['Comb']);
  });

  test('changes without changing the lines that took its words', async () => {
    const thing = await addKeptThing(ctx, needle);
    const { publicId } = await addGatheringItem(ctx, { ...lineOf(), name: needle.name, lookOut: needle.lookOut });
    await saveKeptThing(ctx, { thing: thing.publicId, ...needle, lookOut: null });
    expect((await GatheringItem.findOne({ where: { publicId } }))?.lookOut).toBe('Its eye takes the yarn.');
  });
});

describe('a line taken off a list', () => {
  test('is gone for everybody, cannot be ticked or moved, and comes back to its place with its ticks', async () => {
    const maud = await buildUser();
    const seat = await buildEnrolment({ seriesId: series.id, userId: maud.id });
    const [comb, card] = [await addGatheringItem(ctx, lineOf()), await addGatheringItem(ctx, lineOf({ name: 'Card' }))];
    const student = await contextFor(maud);
    await setTick(student, { subject: 'gather', series: series.slug, items: [comb.publicId], ticked: true });
    await takeOutGatheringItem(ctx, comb.publicId);
    const seen = async () => (await gatheringLines([{ id: part.id, number: 1 }], seat.id)).map(({ name, ticked }) => [name, ticked]);
    expect(await seen()).toEqual([['Card', false]]);
    await expect(setTick(student, { subject: 'gather', series: series.slug, items: [comb.publicId], ticked: false })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(moveGatheringItem(ctx, comb.publicId, 'down')).rejects.toMatchObject({ code: 'CONFLICT' });
    const desk = await lessonDesk(await actorOf(teacher), series.slug, part.publicId);
    expect([desk?.list.map(({ name }) => name), desk?.linesOut.map(({ name }) => name)]).toEqual([['Card'], ['Comb']]);
    await putBackGatheringItem(ctx, comb.publicId);
    expect(await seen()).toEqual([['Comb', true], ['Card', false]]);
    expect((await GatheringItem.findOne({ where: { publicId: card.publicId } }))?.position).toBe(2);
    expect(await Tick.count()).toBe(1);
  });

  test('is put back by nobody else', async () => {
    const item = await buildGatheringItem({ lessonId: part.id, takenOutAt: new Date() });
    for (const stranger of await strangers()) await expect(putBackGatheringItem(stranger, item.publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});

test('the lists of a series as one tell both lines of what contradicts itself, to its teacher only', async () => {
  const later = await buildLesson({ seriesId: series.id });
  const blunt = await buildGatheringItem({ lessonId: part.id, name: 'Needle, blunt' });
  const pointed = await buildGatheringItem({ lessonId: later.id, name: 'Needle, pointed' });
  await buildGatheringItem({ lessonId: later.id, name: 'Needle, bent', takenOutAt: new Date() });
  const list = await wholeList(await actorOf(teacher), series.slug);
  expect(list?.contradictions.map(({ line, other }) => [line, other?.line])).toEqual([[pointed.publicId, blunt.publicId]]);
  for (const { actor } of await strangers()) expect(actor && (await wholeList(actor, series.slug))).toBeNull();
});

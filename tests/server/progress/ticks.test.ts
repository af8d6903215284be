import { describe, expect, test } from 'vitest';
import { GatheredForm } from '#contracts/following.ts';
import { TickInput } from '#contracts/ticks.ts';
import { LessonVisit, Tick } from '#server/models/index.ts';
import { finishPart } from '#server/use-cases/progress/finish-part.ts';
import { keepGathered } from '#server/use-cases/progress/keep-gathered.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildGatheringItem, buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

const at = (time: string): Date => new Date(`2026-12-01T${time}Z`);
const ticksOf = async (enrolmentId: number): Promise<Record<string, boolean>> => Object.fromEntries((await Tick.findAll({ where: { enrolmentId } })).map(({ itemKey, isTicked }) => [itemKey, isTicked]));

describe('a tick', () => {
  test('is refused to a visitor, and looks like nothing to whoever has no seat', async () => {
    const { series, parts: [first] } = await buildFollowed();
    const input = { subject: 'step', series: series.slug, lesson: first.publicId, item: 'tie-on', ticked: true } as const;
    await expect(setTick(contextOf(null), input)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(setTick(await contextFor(await buildUser()), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await Tick.count()).toBe(0);
  });

  test('is refused in a part that is not open yet', async () => {
    const { series, parts: [, , third], student } = await buildFollowed();
    await expect(setTick(await contextFor(student), { subject: 'step', series: series.slug, lesson: third.publicId, item: 'tie-on', ticked: true })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('is refused for a thing of another series, and then none of the list is ticked', async () => {
    const { series, parts: [first], student, seat } = await buildFollowed();
    const own = await buildGatheringItem({ lessonId: first.id });
    const foreign = await buildGatheringItem();
    await expect(setTick(await contextFor(student), { subject: 'gather', series: series.slug, items: [own.publicId, foreign.publicId], ticked: true })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await ticksOf(seat.id)).toEqual({});
  });

  test('of two devices the later change wins, in whichever order they arrive', async () => {
    const { series, parts: [first], student, seat } = await buildFollowed();
    const item = await buildGatheringItem({ lessonId: first.id });
    const ctx = await contextFor(student);
    const tick = (ticked: boolean, changedAt: Date) => setTick(ctx, { subject: 'gather', series: series.slug, items: [item.publicId], ticked, changedAt });
    await tick(false, at('09:30:00'));
    await tick(true, at('09:10:00'));
    expect(await ticksOf(seat.id)).toEqual({ [item.publicId]: false });
    await tick(true, at('09:40:00'));
    expect(await ticksOf(seat.id)).toEqual({ [item.publicId]: true });
  });

  test('a clock that runs ahead counts as now, and does not win for ever', async () => {
    const { series, parts: [first], student, seat } = await buildFollowed();
    const item = await buildGatheringItem({ lessonId: first.id });
    const ctx = await contextFor(student);
    await setTick(ctx, { subject: 'gather', series: series.slug, items: [item.publicId], ticked: true, changedAt: new Date('2031-01-01T00:00:00Z') });
    ctx.clock.set(at('10:00:01'));
    await setTick(ctx, { subject: 'gather', series: series.slug, items: [item.publicId], ticked: false });
    expect(await ticksOf(seat.id)).toEqual({ [item.publicId]: false });
  });

  test('of a step begins the part', async () => {
    const { series, parts: [first], student, seat } = await buildFollowed();
    await setTick(await contextFor(student), { subject: 'step', series: series.slug, lesson: first.publicId, item: 'tie-on', ticked: true });
    expect(await ticksOf(seat.id)).toEqual({ [`${first.publicId}:tie-on`]: true });
    expect(await LessonVisit.count({ where: { enrolmentId: seat.id, lessonId: first.id } })).toBe(1);
  });

  test.each([{}, { subject: 'gather' }, { subject: 'step', series: 'x', lesson: 'y', item: 'z', ticked: true }, { subject: 'gather', series: 'a', items: [], ticked: true }, { subject: 'gather', series: 'a', items: ['1'], ticked: 'maybe' }])('%j is no tick', (body) => {
    expect(TickInput.safeParse(body).success).toBe(false);
  });
});

describe('a whole list, sent without script', () => {
  test('changes only what was changed on the page', async () => {
    const { series, parts: [first], student, seat } = await buildFollowed();
    const [a, b, c] = [await buildGatheringItem({ lessonId: first.id }), await buildGatheringItem({ lessonId: first.id, name: 'Fork' }), await buildGatheringItem({ lessonId: first.id, name: 'Card' })];
    const ctx = await contextFor(student);
    // Meanwhile another device ticked the third.
    await setTick(ctx, { subject: 'gather', series: series.slug, items: [c.publicId], ticked: true });
    const input = GatheredForm.parse({ series: series.slug, shown: [a.publicId, b.publicId, c.publicId], had: [b.publicId], gathered: [a.publicId] });
    expect(await keepGathered(ctx, input)).toBe(2);
    expect(await ticksOf(seat.id)).toEqual({ [a.publicId]: true, [b.publicId]: false, [c.publicId]: true });
  });

  test('is refused without a seat, and for things of another series', async () => {
    const { series, student } = await buildFollowed();
    const foreign = await buildGatheringItem();
    const input = GatheredForm.parse({ series: series.slug, shown: [foreign.publicId], gathered: [foreign.publicId] });
    await expect(keepGathered(await contextFor(student), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(keepGathered(await contextFor(await buildUser()), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});

describe('the end of a part', () => {
  test('is said by the student, and taken back', async () => {
    const { series, parts: [first], student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    const finished = async () => (await LessonVisit.findOne({ where: { enrolmentId: seat.id, lessonId: first.id } }))?.finishedAt ?? null;
    expect(await finishPart(ctx, { series: series.slug, lesson: first.publicId, done: true })).toEqual({ number: 1, next: 2, isLast: false });
    const before = await finished();
    ctx.clock.set(at('11:00:00'));
    await finishPart(ctx, { series: series.slug, lesson: first.publicId, done: true });
    expect(await finished()).toEqual(before);
    await finishPart(ctx, { series: series.slug, lesson: first.publicId, done: false });
    expect(await finished()).toBeNull();
  });

  test('is the teacher’s to say where she asks for a photo, and nobody’s in a closed part', async () => {
    const { series, parts: [, second, third], student } = await buildFollowed();
    const ctx = await contextFor(student);
    await expect(finishPart(ctx, { series: series.slug, lesson: second.publicId, done: true })).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(finishPart(ctx, { series: series.slug, lesson: third.publicId, done: true })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});

import { describe, expect, test } from 'vitest';
import { GatheredForm } from '#contracts/following.ts';
import { TickInput } from '#contracts/ticks.ts';
import { LessonVisit, Tick, type GatheringItem } from '#server/models/index.ts';
import { finishPart } from '#server/use-cases/progress/finish-part.ts';
import { keepGathered } from '#server/use-cases/progress/keep-gathered.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';
import { sentFrom, type SentFrom } from '#server/web/sent-from.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildGatheringItem, buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

const at = (time: string): Date => new Date(`2026-12-01T${time}Z`);
const ticksOf = async (enrolmentId: number): Promise<Record<string, boolean>> => Object.fromEntries((await Tick.findAll({ where: { enrolmentId } })).map(({ itemKey, isTicked }) => [itemKey, isTicked]));

describe('what an outbox says of itself', () => {
  const headers = (device: string, sequence: string, waited: string): Headers => new Headers({ 'x-fellmark-device': device, 'x-fellmark-sequence': sequence, 'x-fellmark-waited-ms': waited });

  test('is which change of which browser, and how long it waited at least and at most', () => {
    expect(sentFrom(headers('f00dfacef00dface', '3', '1200'))).toEqual({ device: 'f00dfacef00dface', sequence: 3, waitedMs: 1_200 });
    expect(sentFrom(headers('f00dfacef00dface', '3', '-5'))?.waitedMs).toBe(0);
    expect(sentFrom(headers('f00dfacef00dface', '3', '1e30'))?.waitedMs).toBe(60 * 86_400_000);
  });

  test.each([['short', '1'], ['f00dfacef00dface', '0'], ['f00dfacef00dface', '1.5'], ['f00dfacef00dface', 'x'], ['F00DFACEF00DFACE', '1']])('is nothing for %s and %s', (device, sequence) => {
    expect(sentFrom(headers(device, sequence, '0'))).toBeNull();
    expect(sentFrom(new Headers())).toBeNull();
  });
});

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

  describe('of two devices', () => {
    const MINUTE = 60_000;
    const phone = (sequence: number, waitedMs = 0) => ({ device: 'f00dfacef00dface', sequence, waitedMs });
    const laptop = (sequence: number, waitedMs = 0) => ({ device: 'cafebabecafebabe', sequence, waitedMs });

    async function twoDevices() {
      const { series, parts: [first], student, seat } = await buildFollowed();
      const [needle, fork] = [await buildGatheringItem({ lessonId: first.id, name: 'Needle' }), await buildGatheringItem({ lessonId: first.id, name: 'Fork' })];
      const ctx = await contextFor(student);
      const tick = (item: GatheringItem, ticked: boolean, seen: number, from: SentFrom) => setTick(ctx, { subject: 'gather', series: series.slug, items: [item.publicId], ticked, seen }, from);
      return { ctx, seat, needle, fork, tick };
    }

    test('both ticks are there after both were without signal, and each hears of the other’s', async () => {
      const { seat, needle, fork, tick } = await twoDevices();
      expect(await tick(needle, true, 0, phone(1, 30 * MINUTE))).toEqual({ revision: 1, ticks: [{ subject: 'gather', key: needle.publicId, ticked: true, revision: 1 }] });
      expect((await tick(fork, true, 0, laptop(1))).ticks.map(({ key }) => key)).toEqual([needle.publicId, fork.publicId]);
      expect(await ticksOf(seat.id)).toEqual({ [needle.publicId]: true, [fork.publicId]: true });
    });

    test('of one thing the later change wins, in whichever order they arrive', async () => {
      const { seat, needle, tick } = await twoDevices();
      await tick(needle, false, 0, laptop(1, 5 * MINUTE));
      const { ticks } = await tick(needle, true, 0, phone(1, 25 * MINUTE));
      expect(ticks).toMatchObject([{ ticked: false }]);
      expect(await ticksOf(seat.id)).toEqual({ [needle.publicId]: false });
      await tick(needle, true, 0, phone(2, 0));
      expect(await ticksOf(seat.id)).toEqual({ [needle.publicId]: true });
    });

    test('a change made knowing of the other’s wins, though a clock jumped and makes it look old', async () => {
      const { seat, needle, tick } = await twoDevices();
      const { revision } = await tick(needle, true, 0, laptop(1));
      await tick(needle, false, revision, phone(1, 600 * 24 * 60 * MINUTE));
      expect(await ticksOf(seat.id)).toEqual({ [needle.publicId]: false });
    });

    test('what is sent twice counts once, and takes nothing back', async () => {
      const { seat, needle, tick } = await twoDevices();
      await tick(needle, true, 0, phone(1));
      await tick(needle, false, 1, phone(2));
      expect(await tick(needle, true, 0, phone(1))).toMatchObject({ revision: 2 });
      expect(await ticksOf(seat.id)).toEqual({ [needle.publicId]: false });
    });

    test('neither is lost when both are sent at the same moment', async () => {
      const { seat, needle, fork, tick } = await twoDevices();
      await Promise.all([tick(needle, true, 0, phone(1)), tick(fork, true, 0, laptop(1))]);
      expect(await ticksOf(seat.id)).toEqual({ [needle.publicId]: true, [fork.publicId]: true });
      expect((await Tick.findAll({ where: { enrolmentId: seat.id } })).map(({ revision }) => revision).sort()).toEqual([1, 2]);
    });
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

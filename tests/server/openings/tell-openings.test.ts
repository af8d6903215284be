import { beforeEach, describe, expect, test } from 'vitest';
import { VerdictForm } from '#contracts/bench.ts';
import { TEMPLATES } from '#server/mail/templates/index.ts';
import { Lesson, Mail, Media, PartOpening, ProgressPhoto, User, type Enrolment, type Series } from '#server/models/index.ts';
import { tellOpenings } from '#server/use-cases/openings/tell-openings.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { giveVerdict } from '../../support/verdicts.ts';

const DAY_MS = 86_400_000;
const NOW = new Date('2026-12-01T10:00:00Z');
const ago = (days: number): Date => new Date(NOW.getTime() - days * DAY_MS);

let teacher: User;
let series: Series;
let student: User;
let seat: Enrolment;

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id, title: 'Low Tide: a woven wall hanging' });
  student = await buildUser({ name: 'Maud Ellery' });
  await buildLesson({ seriesId: series.id, title: 'Gather and plan' });
  seat = await buildEnrolment({ seriesId: series.id, userId: student.id, startedAt: ago(5) });
});

/** Looks at every seat as the worker does, `days` after now. */
const look = (days = 0): Promise<void> => tellOpenings(contextOf(null, {}, new Date(NOW.getTime() + days * DAY_MS)));

async function toldParts(): Promise<number[][]> {
  const letters = await Mail.findAll({ where: { template: 'parts-opened' }, order: ['id'] });
  return letters.map(({ data }) => (data as { parts: { number: number }[] }).parts.map(({ number }) => number));
}

describe('nobody is written to', () => {
  test('of parts that were open when the seat began', async () => {
    await buildLesson({ seriesId: series.id, opens: { rule: 'after-seat', days: 0 } });
    await look();
    await look(1);
    expect(await toldParts()).toEqual([]);
  });

  test('of a part that is shut, not published, taken out, or free to read anyway', async () => {
    await buildLesson({ seriesId: series.id, opens: { rule: 'after-seat', days: 9 } });
    await buildLesson({ seriesId: series.id, opens: { rule: 'on-date', wall: '2027-03-01T09:00', zone: 'Europe/Berlin' }, opensAt: new Date('2027-03-01T08:00:00Z') });
    await buildLesson({ seriesId: series.id, publishedVersionId: null });
    await buildLesson({ seriesId: series.id, takenOutAt: ago(1) });
    await buildLesson({ seriesId: series.id, isPreview: true, opens: { rule: 'after-seat', days: 9 } });
    await look();
    expect(await toldParts()).toEqual([]);
  });

  test('whose seat is closed, or who is suspended', async () => {
    await look();
    await buildLesson({ seriesId: series.id });
    await seat.update({ state: 'closed' });
    const other = await buildUser({ suspendedAt: ago(1) });
    await buildEnrolment({ seriesId: series.id, userId: other.id });
    await look();
    await look();
    expect(await toldParts()).toEqual([]);
  });
});

describe('a person with a seat is told once', () => {
  test('of a part whose day has come: not the minute before', async () => {
    await buildLesson({ seriesId: series.id, opens: { rule: 'after-seat', days: 7 } });
    await look();
    await look(1.999);
    expect(await toldParts()).toEqual([]);
    await look(2);
    await look(3);
    expect(await toldParts()).toEqual([[2]]);
  });

  test('of a part that is published after she came', async () => {
    const next = await buildLesson({ seriesId: series.id, publishedVersionId: null });
    await look();
    const version = await Lesson.findOne({ where: { seriesId: series.id, position: 1 }, rejectOnEmpty: true });
    await next.update({ publishedVersionId: version.publishedVersionId });
    await look();
    await look();
    expect(await toldParts()).toEqual([[2]]);
  });

  test('of a part whose rule was changed so that it is open now, and not again when it is shut and opened once more', async () => {
    const later = await buildLesson({ seriesId: series.id, opens: { rule: 'after-seat', days: 90 } });
    await look();
    await later.update({ opens: { rule: 'at-once' } });
    await look();
    await later.update({ opens: { rule: 'after-seat', days: 90 } });
    await look();
    await later.update({ opens: { rule: 'at-once' } });
    await look();
    expect(await toldParts()).toEqual([[2]]);
  });

  test('of several that open together in one letter', async () => {
    for (const days of [7, 7, 12]) await buildLesson({ seriesId: series.id, opens: { rule: 'after-seat', days } });
    await look();
    await look(2);
    await look(7);
    expect(await toldParts()).toEqual([[2, 3], [4]]);
  });

  test('of what opened while no worker was awake', async () => {
    await buildLesson({ seriesId: series.id, opens: { rule: 'after-seat', days: 3 } });
    await look();
    expect(await toldParts()).toEqual([[2]]);
  });

  test('when four workers look at once', async () => {
    for (let index = 0; index < 5; index += 1) await buildEnrolment({ seriesId: series.id, startedAt: ago(5) });
    await buildLesson({ seriesId: series.id, opens: { rule: 'after-seat', days: 3 } });
    await Promise.all([look(), look(), look(), look()]);
    expect(await toldParts()).toEqual(Array.from({ length: 6 }, () => [2]));
    expect(await PartOpening.count({ where: { toldBy: 'letter' } })).toBe(6);
  });

  test('by the verdict’s own letter, when that opened it', async () => {
    const asked = await buildLesson({ seriesId: series.id, checkpoint: { ask: 'Show your warped loom', look: [] } });
    for (let index = 0; index < 2; index += 1) await buildLesson({ seriesId: series.id, opens: { rule: 'after-verdict', lesson: asked.publicId } });
    await buildLesson({ seriesId: series.id, opens: { rule: 'after-verdict', lesson: asked.publicId }, publishedVersionId: null });
    await look();
    const media = await Media.create({ ownerId: student.id, kind: 'photo', state: 'ready', originalName: 'loom.jpg', width: 4, height: 3, files: {}, detail: {} });
    const photo = await ProgressPhoto.create({ enrolmentId: seat.id, lessonId: asked.id, mediaId: media.id });
    await giveVerdict(await contextFor(teacher), VerdictForm.parse({ photo: photo.publicId, verdict: 'weave-on' }));
    await look();
    expect(await toldParts()).toEqual([]);
    const letter = await Mail.findOne({ where: { template: 'verdict' }, rejectOnEmpty: true });
    expect(TEMPLATES.verdict.compose(letter.data, { publicUrl: 'https://fellmark.example' }).blocks[0]).toMatchObject({ words: expect.stringContaining('Weave on. Parts 3 and 4 are open.') });
  });
});

test('the letter says which parts are open and leads to the first', async () => {
  await buildLesson({ seriesId: series.id, title: 'Dress the loom', opens: { rule: 'after-seat', days: 3 } });
  await look();
  const letter = await Mail.findOne({ where: { template: 'parts-opened' }, rejectOnEmpty: true });
  const { subject, blocks } = TEMPLATES['parts-opened'].compose(letter.data, { publicUrl: 'https://fellmark.example' });
  expect([letter.toAddress, subject]).toEqual([student.email, 'Part 2 of Low Tide is open']);
  expect(blocks).toContainEqual({ kind: 'list', items: ['Part 2, Dress the loom'] });
  expect(blocks).toContainEqual({ kind: 'act', label: 'Go to Part 2', href: `https://fellmark.example/series/${series.slug}/2` });
});

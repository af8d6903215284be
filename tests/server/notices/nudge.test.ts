import { beforeEach, describe, expect, test } from 'vitest';
import { LettersForm, NudgeForm } from '#contracts/notices.ts';
import { nudgeWords } from '#core/notices/nudge.ts';
import { AuditEntry, Mail, Notice, NoticeReceipt, WorkroomHelper, type Enrolment, type Series, type User, type Workroom } from '#server/models/index.ts';
import { chooseLetters } from '#server/use-cases/letters/choose-letters.ts';
import { nudgeStudent } from '#server/use-cases/notices/nudge-student.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let ilse: User;
let workroom: Workroom;
let series: Series;
let maud: User;
let seat: Enrolment;

beforeEach(async () => {
  ilse = await buildUser({ name: 'Ilse Marrow' });
  workroom = await buildWorkroom({ ownerId: ilse.id, postalAddress: 'Boat shed 3' });
  series = await buildSeries({ workroomId: workroom.id, title: 'Low Tide: a woven wall hanging' });
  await buildLesson({ seriesId: series.id });
  maud = await buildUser({ name: 'Maud Ellery' });
  seat = await buildEnrolment({ seriesId: series.id, userId: maud.id });
});

const input = (given: Record<string, string> = {}) => NudgeForm.parse({ seat: seat.publicId, words: 'How is it going?\n\nShow me a photo.', ...given });
const at = async (moment: string) => ({ ...(await contextFor(ilse)), clock: { now: () => new Date(moment) } });

describe('a nudge', () => {
  test('is the teacher’s alone, and only for a seat of hers that is held', async () => {
    const wren = await buildUser();
    await WorkroomHelper.create({ workroomId: workroom.id, userId: wren.id });
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    await expect(nudgeStudent(contextOf(null), input())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    for (const user of [wren, other, maud]) await expect(nudgeStudent(await contextFor(user), input())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await seat.update({ state: 'closed' });
    await expect(nudgeStudent(await contextFor(ilse), input())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect([await Notice.count(), await NoticeReceipt.count()]).toEqual([0, 0]);
  });

  test('of nothing, or of too much, is refused', () => {
    for (const words of ['', '   ', 'a'.repeat(100_000)]) expect(NudgeForm.safeParse({ seat: seat.publicId, words }).success).toBe(false);
  });

  test('stands in her page, in the teacher’s own words, and no letter goes unless she asked for nudges', async () => {
    expect(await nudgeStudent(await contextFor(ilse), input())).toEqual({ name: 'Maud Ellery', byLetter: false });
    const [receipt] = await NoticeReceipt.findAll();
    expect(receipt).toMatchObject({ userId: maud.id, kind: 'nudge', byLetter: false, said: { title: 'How is Low Tide going?', from: 'Ilse Marrow, Low Tide' } });
    expect(receipt?.said.blocks).toEqual([{ kind: 'prose', runs: [{ words: 'How is it going?' }] }, { kind: 'prose', runs: [{ words: 'Show me a photo.' }] }]);
    expect([await Mail.count(), await AuditEntry.count({ where: { action: 'nudge-student' } })]).toEqual([0, 1]);
  });

  test('goes by letter once she asked for nudges; asking for notices is not asking for nudges', async () => {
    const choose = async (kind: string) => chooseLetters(await contextFor(maud), LettersForm.parse({ workroom: workroom.publicId, source: 'account', [kind]: 'yes' }));
    await choose('notices');
    await nudgeStudent(await contextFor(ilse), input());
    expect(await Mail.count()).toBe(0);
    await choose('nudges');
    expect(await nudgeStudent(await at('2026-12-05T10:00:00Z'), input())).toMatchObject({ byLetter: true });
    expect((await Mail.findAll()).map(({ toAddress, listKind }) => [toAddress, listKind])).toEqual([[maud.email, 'nudges']]);
  });

  test('goes once in three days, also by two presses at once and in another series of hers', async () => {
    const other = await buildEnrolment({ userId: maud.id, seriesId: (await buildSeries({ workroomId: workroom.id })).id });
    const ctx = await contextFor(ilse);
    const results = await Promise.allSettled([nudgeStudent(ctx, input()), nudgeStudent(ctx, input()), nudgeStudent(ctx, input({ seat: other.publicId }))]);
    expect(results.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
    await expect(nudgeStudent(await at('2026-12-04T09:59:59Z'), input())).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Maud Ellery was nudged within 3 days') });
    await nudgeStudent(await at('2026-12-04T10:00:00Z'), input());
    expect(await NoticeReceipt.count()).toBe(2);
  });

  test('of another workroom does not count', async () => {
    await nudgeStudent(await contextFor(ilse), input());
    const teodor = await buildUser();
    const room = await buildWorkroom({ ownerId: teodor.id, postalAddress: 'Quay 1' });
    const there = await buildEnrolment({ userId: maud.id, seriesId: (await buildSeries({ workroomId: room.id })).id });
    await nudgeStudent(await contextFor(teodor), input({ seat: there.publicId }));
    expect(await NoticeReceipt.count()).toBe(2);
  });

  test('asks once for the postal address that its letter must carry', async () => {
    await workroom.update({ postalAddress: '' });
    await expect(nudgeStudent(await contextFor(ilse), input())).rejects.toMatchObject({ code: 'VALIDATION', fields: { postalAddress: expect.any(String) } });
    expect(await Notice.count()).toBe(0);
    await nudgeStudent(await contextFor(ilse), input({ postalAddress: 'Boat shed 3' }));
    expect((await workroom.reload()).postalAddress).toBe('Boat shed 3');
  });
});

test('the words to begin with can be sent as they stand', async () => {
  await nudgeStudent(await contextFor(ilse), input({ words: nudgeWords({ days: 16, part: { number: 2, title: 'Dress the loom' } }) }));
  expect(JSON.stringify((await NoticeReceipt.findOne())?.said)).toContain('stood still for 16 days at Part 2, Dress the loom');
});

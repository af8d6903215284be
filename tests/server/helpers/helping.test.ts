import { describe, expect, test } from 'vitest';
import { InviteHelperForm } from '#contracts/helpers.ts';
import { actorOfToken, beginSession } from '#server/auth/sessions.ts';
import { AuditEntry, HelperInvitation, Session, WorkroomHelper, type User, type Workroom } from '#server/models/index.ts';
import { helpedWorkrooms, helpersDesk } from '#server/queries/helpers/helpers-desk.ts';
import { openInvitation } from '#server/queries/helpers/open-invitation.ts';
import { acceptInvitation } from '#server/use-cases/helpers/accept-invitation.ts';
import { endHelp } from '#server/use-cases/helpers/end-help.ts';
import { inviteHelper } from '#server/use-cases/helpers/invite-helper.ts';
import { takeBackInvitation } from '#server/use-cases/helpers/take-back-invitation.ts';
import { forgetOldLinks } from '#server/use-cases/people/forget-old-links.ts';
import { actorOf, contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';
import { addressOf, lettersTo, tokenIn } from '../../support/people.ts';

const WREN = 'wren@saltmarsh.example';
const DAY_MS = 86_400_000;

interface Room { teacher: User; workroom: Workroom; ctx: TestContext }
async function room(): Promise<Room> {
  const teacher = await buildUser({ name: 'Ilse Marrow' });
  const workroom = await buildWorkroom({ ownerId: teacher.id });
  return { teacher, workroom, ctx: await contextFor(teacher) };
}
const buildWren = (given: Parameters<typeof buildUser>[0] = {}): Promise<User> => buildUser({ name: 'Wren Okafor', email: WREN, emailKey: WREN, ...given });
const invite = (ctx: TestContext, address = WREN): Promise<string> => inviteHelper(ctx, { email: addressOf(address) });
const accept = (ctx: TestContext, token: string) => acceptInvitation(ctx, { token }, 'a browser');
const helps = (user: User): Promise<number> => WorkroomHelper.count({ where: { userId: user.id } });

describe('an invitation', () => {
  test('is refused to a visitor, a student and a helper', async () => {
    const { workroom } = await room();
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: workroom.id, userId: helper.id });
    await expect(invite(contextOf(null))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    for (const who of [await buildUser(), helper]) await expect(invite(await contextFor(who))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await HelperInvitation.count()).toBe(0);
  });

  test('to oneself, and to who helps already, is refused at its field', async () => {
    const { teacher, workroom, ctx } = await room();
    await expect(invite(ctx, teacher.email.toUpperCase())).rejects.toMatchObject({ fields: { email: expect.stringContaining('your own address') } });
    const wren = await buildWren();
    await WorkroomHelper.create({ workroomId: workroom.id, userId: wren.id });
    await expect(invite(ctx)).rejects.toMatchObject({ fields: { email: 'Wren Okafor helps you already.' } });
    expect(InviteHelperForm.safeParse({ email: 'wren@' }).error?.issues[0]?.message).toContain('The part after the @ is missing');
  });

  test('goes by letter to the address, whether it has an account or not, and keeps a hash only', async () => {
    const { ctx } = await room();
    await invite(ctx);
    const token = await tokenIn('helper-invited', WREN);
    expect(token).toMatch(/^[A-Za-z0-9_-]{43}$/);
    expect((await HelperInvitation.findAll()).map(({ tokenHash }) => tokenHash)).not.toContain(token);
    expect(await lettersTo(WREN)).toMatchObject([{ userId: null, expiresAt: new Date(ctx.clock.now().getTime() + 7 * DAY_MS) }]);
  });

  test('sent twice works by its newest letter only', async () => {
    const { ctx } = await room();
    await invite(ctx);
    const old = await tokenIn('helper-invited', WREN);
    await invite(ctx, 'Wren@Saltmarsh.example');
    const wren = await contextFor(await buildWren());
    await expect(accept(wren, old)).rejects.toMatchObject({ code: 'GONE' });
    await expect(accept(wren, await tokenIn('helper-invited', 'Wren@saltmarsh.example'))).resolves.toMatchObject({ workroomName: 'Saltmarsh Loom Room' });
  });

  test('sent often to one address, or to very many, is stopped', async () => {
    const { ctx } = await room();
    for (let n = 0; n < 5; n += 1) await invite(ctx);
    await expect(invite(ctx)).rejects.toMatchObject({ code: 'RATE_LIMITED', says: expect.stringContaining('Five invitations went to') });
    for (let n = 0; n < 19; n += 1) await invite(ctx, `w${n}@saltmarsh.example`);
    await expect(invite(ctx, 'one-more@saltmarsh.example')).rejects.toMatchObject({ code: 'CONFLICT' });
  });
});

describe('accepting', () => {
  test('makes her a helper once, confirms the address, and begins a short session in the place of all hers', async () => {
    const { workroom, ctx } = await room();
    const wren = await buildWren({ emailConfirmedAt: null });
    const before = await beginSession(wren.id, 'student', '', new Date());
    await invite(ctx);
    const token = await tokenIn('helper-invited', WREN);
    const hers = await contextFor(wren);
    const { session } = await accept(hers, token);
    expect(await actorOfToken(before.token)).toBeNull();
    expect(await actorOfToken(session.token)).toMatchObject({ userId: wren.id, helpsInWorkroomIds: [workroom.id], addressConfirmed: true });
    expect(await Session.findAll()).toMatchObject([{ idleSeconds: 3_600, provedAt: hers.actor?.provedAt }]);
    await expect(accept(hers, token)).rejects.toMatchObject({ code: 'GONE' });
  });

  test('by many clicks at once is one', async () => {
    const { ctx } = await room();
    const wren = await buildWren();
    await invite(ctx);
    const [token, hers] = [await tokenIn('helper-invited', WREN), await contextFor(wren)];
    const answers = await Promise.allSettled(Array.from({ length: 5 }, () => accept(hers, token)));
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
    expect([await helps(wren), await AuditEntry.count({ where: { action: 'accept-invitation' } })]).toEqual([1, 1]);
  });

  test('is refused to a visitor and to another account, and the link stays good for whom it is', async () => {
    const { ctx } = await room();
    await invite(ctx);
    const token = await tokenIn('helper-invited', WREN);
    await expect(accept(contextOf(null), token)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    const other = await buildUser();
    await expect(accept(await contextFor(other), token)).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining(`This invitation is for ${WREN}`) });
    expect(await helps(other)).toBe(0);
    await accept(await contextFor(await buildWren()), token);
  });

  test('looking at it any number of times changes nothing', async () => {
    const { ctx } = await room();
    await invite(ctx);
    const token = await tokenIn('helper-invited', WREN);
    const wren = await actorOf(await buildWren());
    for (const who of [null, wren, await actorOf(await buildUser())]) {
      expect(await openInvitation(token, who, ctx.clock.now())).toMatchObject({ teacherName: 'Ilse Marrow', address: WREN, isForActor: who === wren });
    }
    expect(await openInvitation('nothing', wren, ctx.clock.now())).toBeNull();
    expect(await HelperInvitation.findOne()).toMatchObject({ acceptedAt: null, takenBackAt: null });
  });

  test('comes too late after a week, and after it was taken back', async () => {
    const { ctx } = await room();
    const hers = await contextFor(await buildWren());
    await invite(ctx);
    const token = await tokenIn('helper-invited', WREN);
    hers.clock.set(new Date(ctx.clock.now().getTime() + 7 * DAY_MS));
    await expect(accept(hers, token)).rejects.toMatchObject({ code: 'GONE' });
    expect(await openInvitation(token, null, hers.clock.now())).toBeNull();
    hers.clock.set(ctx.clock.now());
    const invitation = (await HelperInvitation.findOne({ rejectOnEmpty: true })).publicId;
    await expect(takeBackInvitation((await room()).ctx, { invitation })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await takeBackInvitation(ctx, { invitation });
    await expect(accept(hers, token)).rejects.toMatchObject({ code: 'GONE' });
    await expect(takeBackInvitation(ctx, { invitation })).rejects.toMatchObject({ code: 'CONFLICT' });
  });
});

describe('the end of helping', () => {
  async function helped(): Promise<Room & { wren: User }> {
    const made = await room();
    const wren = await buildWren();
    await invite(made.ctx);
    await accept(await contextFor(wren), await tokenIn('helper-invited', WREN));
    return { ...made, wren };
  }

  test('comes at once, keeps her signed in, and is told her by letter', async () => {
    const { workroom, ctx, wren } = await helped();
    const { token } = await beginSession(wren.id, 'trusted', '', new Date());
    await endHelp(ctx, { workroom: workroom.publicId, person: wren.publicId });
    expect(await actorOfToken(token)).toMatchObject({ userId: wren.id, helpsInWorkroomIds: [] });
    expect((await lettersTo(WREN)).map(({ template }) => template)).toEqual(['helper-invited', 'help-ended']);
    await expect(endHelp(ctx, { workroom: workroom.publicId, person: wren.publicId })).rejects.toMatchObject({ code: 'CONFLICT' });
  });

  test('is the teacher’s to say, and her own, and nobody else’s', async () => {
    const { workroom, wren } = await helped();
    const input = { workroom: workroom.publicId, person: wren.publicId };
    const second = await buildUser();
    await WorkroomHelper.create({ workroomId: workroom.id, userId: second.id });
    for (const who of [second, await buildUser(), (await room()).teacher]) await expect(endHelp(await contextFor(who), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(endHelp(contextOf(null), input)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await endHelp(await contextFor(wren), input);
    expect([await helps(wren), await helps(second)]).toEqual([0, 1]);
    expect(await lettersTo(WREN)).toHaveLength(1);
  });

  test('stands with all else in what the teacher reads of it', async () => {
    const { workroom, ctx, wren } = await helped();
    expect(await helpedWorkrooms(await actorOf(wren))).toMatchObject([{ name: 'Saltmarsh Loom Room', teacherName: 'Ilse Marrow' }]);
    await invite(ctx, 'nell@saltmarsh.example');
    await endHelp(ctx, { workroom: workroom.publicId, person: wren.publicId });
    const desk = await helpersDesk(await actorOf(await buildUser()), ctx.clock.now());
    expect(desk).toBeNull();
    const own = ctx.actor === null ? null : await helpersDesk(ctx.actor, ctx.clock.now());
    expect(own).toMatchObject({ helpers: [], invitations: [{ address: 'nell@saltmarsh.example' }] });
    expect(own?.events.map(({ byName, action, whom }) => [byName, action, whom])).toEqual([
      ['Ilse Marrow', 'end-help', 'Wren Okafor'],
      ['Ilse Marrow', 'invite-helper', 'nell@saltmarsh.example'],
      ['Wren Okafor', 'accept-invitation', 'Wren Okafor'],
      ['Ilse Marrow', 'invite-helper', WREN],
    ]);
    const later = await contextFor(wren);
    later.clock.set(new Date(ctx.clock.now().getTime() + 98 * DAY_MS));
    await forgetOldLinks(later);
    expect((await HelperInvitation.findAll()).map(({ address }) => address)).toEqual([WREN]);
  });
});

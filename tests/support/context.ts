/** Contexts for calling use-cases as somebody, at a fixed moment, with fakes for what lies outside. */
import type { Actor, Context } from '#server/context.ts';
import { User, Workroom, WorkroomHelper } from '#server/models/index.ts';
import { services, type Services } from '#server/services.ts';

export interface TestContext extends Context {
  readonly clock: { now(): Date; set(moment: Date): void };
}

export function contextOf(actor: Actor | null, fakes: Partial<Services> = {}, now = new Date('2026-12-01T10:00:00Z')): TestContext {
  let moment = now;
  return {
    actor,
    requestId: 'test',
    ip: '127.0.0.1',
    clock: { now: () => moment, set: (next) => { moment = next; } },
    services: { ...services(), ...fakes },
  };
}

/** The actor that a signed-in `user` would be. */
export async function actorOf(user: User): Promise<Actor> {
  const workroom = await Workroom.findOne({ where: { ownerId: user.id } });
  const helps = await WorkroomHelper.findAll({ where: { userId: user.id } });
  return {
    userId: user.id,
    publicId: user.publicId,
    name: user.name,
    email: user.email,
    addressConfirmed: user.emailConfirmedAt !== null,
    addressRefused: false,
    isSteward: user.isSteward,
    workroomId: workroom?.id ?? null,
    workroomName: workroom?.name ?? null,
    helpsInWorkroomIds: helps.map(({ workroomId }) => workroomId),
    units: user.units,
    timeZone: user.timeZone,
    scheme: user.scheme,
    unreadNotices: 0,
    sessionId: '0'.repeat(64),
    provedAt: new Date('2026-12-01T09:59:00Z'),
  };
}

export async function contextFor(user: User, fakes: Partial<Services> = {}): Promise<TestContext> {
  return contextOf(await actorOf(user), fakes);
}

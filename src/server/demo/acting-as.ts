import { randomUUID } from 'node:crypto';
import { systemClock, type Actor, type Context } from '#server/context.ts';
import { Workroom, WorkroomHelper, type User } from '#server/models/index.ts';
import { services } from '#server/services.ts';

/** A context in which `user` does things herself, so that the demo world is made by the same use-cases as any other. */
export async function actingAs(user: User): Promise<Context & { actor: Actor }> {
  const workroom = await Workroom.findOne({ where: { ownerId: user.id } });
  const helps = await WorkroomHelper.findAll({ where: { userId: user.id } });
  const now = systemClock.now();
  return {
    requestId: `demo-${randomUUID()}`,
    ip: '127.0.0.1',
    clock: systemClock,
    services: services(),
    actor: {
      userId: user.id,
      publicId: user.publicId,
      name: user.name,
      email: user.email,
      addressConfirmed: true,
      addressRefused: false,
      isSteward: user.isSteward,
      workroomId: workroom?.id ?? null,
      workroomName: workroom?.name ?? null,
      helpsInWorkroomIds: helps.map(({ workroomId }) => workroomId),
      units: user.units,
      timeZone: user.timeZone,
      scheme: user.scheme,
      unreadNotices: 0,
      sessionId: '',
      provedAt: now,
    },
  };
}

import type { SitePerson } from '#contracts/site-person.ts';
import type { Actor } from '#server/context.ts';

/** What the frame of a page shows of the person who asks. */
export function presentSitePerson(actor: Actor): SitePerson {
  return {
    name: actor.name,
    publicId: actor.publicId,
    roles: [
      'student',
      ...(actor.workroomId === null ? [] : ['teacher' as const]),
      ...(actor.helpsInWorkroomIds.length === 0 ? [] : ['helper' as const]),
      ...(actor.isSteward ? ['steward' as const] : []),
    ],
    scheme: actor.scheme === 'system' ? null : actor.scheme,
    units: actor.units,
    addressConfirmed: actor.addressConfirmed,
    addressRefused: actor.addressRefused,
    unread: actor.unreadNotices,
    workroom: actor.workroomName,
  };
}

import { Enrolment, Session, User, Workroom } from '#server/models/index.ts';

export interface PersonInOffice {
  readonly publicId: string;
  readonly name: string;
  readonly email: string;
  readonly confirmedAt: Date | null;
  readonly isSteward: boolean;
  readonly suspendedAt: Date | null;
  readonly createdAt: Date;
  readonly timeZone: string;
  readonly workroom: { readonly name: string; readonly handle: string } | null;
  readonly seats: number;
  readonly browsers: number;
}

/** One person as the steward sees her, or null. */
export async function findPersonForOffice(publicId: string): Promise<PersonInOffice | null> {
  const user = await User.findOne({ where: { publicId } });
  if (user === null) return null;
  const [workroom, seats, browsers] = await Promise.all([
    Workroom.findOne({ where: { ownerId: user.id } }),
    Enrolment.count({ where: { userId: user.id } }),
    Session.count({ where: { userId: user.id } }),
  ]);
  const { name, email, emailConfirmedAt, isSteward, suspendedAt, createdAt, timeZone } = user;
  return {
    publicId, name, email, confirmedAt: emailConfirmedAt, isSteward, suspendedAt, createdAt, timeZone, seats, browsers,
    workroom: workroom === null ? null : { name: workroom.name, handle: workroom.handle },
  };
}

/** The invented people of the demo world, and their workrooms. */
import { parseMailAddress } from '#core/mail-address.ts';
import { hashPassword } from '#server/auth/passwords.ts';
import { User, Workroom, WorkroomHelper } from '#server/models/index.ts';

export interface DemoPerson {
  readonly address: string;
  readonly name: string;
  readonly role: string;
}

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { address: 'ilse@saltmarsh.example', name: 'Ilse Marrow', role: 'teacher of Low Tide' },
  { address: 'wren@saltmarsh.example', name: 'Wren Okafor', role: 'helps Ilse at the bench' },
  { address: 'teodor@cordage.example', name: 'Teodor Brandl', role: 'teacher of Three Knotted Cords' },
  { address: 'maud@weavers.example', name: 'Maud Ellery', role: 'student in part 2, her photo waits' },
  { address: 'jonas@weavers.example', name: 'Jonas Pike', role: 'student, nothing done yet' },
  { address: 'amara@weavers.example', name: 'Amara Voss', role: 'has no seat yet' },
  { address: 'pell@office.example', name: 'Pell Harrow', role: 'steward' },
];

export interface DemoFolk {
  readonly users: ReadonlyMap<string, User>;
  readonly saltmarsh: Workroom;
  readonly cordage: Workroom;
}

/** Made last, so that her being there says that everything else is. */
const STEWARD = 'pell@office.example';

export async function makePeople(password: string, now: Date): Promise<DemoFolk> {
  const users = new Map<string, User>();
  for (const person of DEMO_PEOPLE) if (person.address !== STEWARD) users.set(person.address, await makePerson(person, password, now));
  const idOf = (address: string): number => users.get(address)?.id ?? 0;
  const saltmarsh = await Workroom.create({
    ownerId: idOf('ilse@saltmarsh.example'),
    handle: 'saltmarsh',
    name: 'Saltmarsh Loom Room',
    about: 'I teach frame weaving in a room above a boat shed, at the edge of a salt marsh. What I show is what I see from there: water, mud, grass and a great deal of sky. I have taught people to weave for nineteen years, most of them people who were sure that they could not.',
    timeZone: 'Europe/Berlin',
    postalAddress: 'Boat shed 3, Fenmouth',
  });
  const cordage = await Workroom.create({
    ownerId: idOf('teodor@cordage.example'),
    handle: 'cordage',
    name: 'Brandl Cordage',
    about: 'Rope and knots, from the harbour to the wall. I come from a family of riggers; what I teach holds.',
    timeZone: 'Europe/Berlin',
    postalAddress: 'Old Quay 12, Taumund',
  });
  await WorkroomHelper.create({ workroomId: saltmarsh.id, userId: idOf('wren@saltmarsh.example') });
  return { users, saltmarsh, cordage };
}

async function makePerson({ address, name }: DemoPerson, password: string, now: Date): Promise<User> {
  const parsed = parseMailAddress(address);
  if (!parsed.ok) throw new RangeError(address);
  return User.create({
    email: parsed.value.address,
    emailKey: parsed.value.key,
    name,
    passwordHash: await hashPassword(password),
    emailConfirmedAt: now,
    timeZone: 'Europe/Berlin',
    isSteward: address === STEWARD,
  });
}

export async function makeSteward(password: string, now: Date): Promise<void> {
  const steward = DEMO_PEOPLE.find(({ address }) => address === STEWARD);
  if (steward !== undefined) await makePerson(steward, password, now);
}

/** `none`: nobody is here. `half`: a demo world whose making was cut off, and nobody else. */
export async function whoLivesHere(): Promise<'none' | 'half' | 'somebody'> {
  const users = await User.findAll({ attributes: ['email'], limit: DEMO_PEOPLE.length + 1 });
  if (users.length === 0) return 'none';
  const demo = new Set(DEMO_PEOPLE.map(({ address }) => address));
  const half = users.every(({ email }) => demo.has(email)) && !users.some(({ email }) => email === STEWARD);
  return half ? 'half' : 'somebody';
}

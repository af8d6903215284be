/** Addresses, passwords and the post, for tests of having an account. */
import { parseMailAddress, type MailAddress } from '#core/mail-address.ts';
import { hashPassword } from '#server/auth/passwords.ts';
import { Job, Mail, User } from '#server/models/index.ts';
import { writePasswordLink } from '#server/use-cases/people/write-password-link.ts';
import { sendPasswordLink } from '#server/jobs/definitions/people.ts';
import type { Context } from '#server/context.ts';
import { buildUser } from './factories.ts';

export const GOOD_PASSWORD = 'kettle heron estuary';
export const OTHER_PASSWORD = 'nine tides of grey wool';

export function addressOf(text: string): MailAddress {
  const outcome = parseMailAddress(text);
  if (!outcome.ok) throw new Error(`${text} is no address`);
  return outcome.value;
}

let goodHash: Promise<string> | undefined;

/** A person whose password is GOOD_PASSWORD. */
export async function buildUserWithPassword(given: Parameters<typeof buildUser>[0] = {}): Promise<User> {
  goodHash ??= hashPassword(GOOD_PASSWORD);
  return buildUser({ passwordHash: await goodHash, ...given });
}

/** Letters written to an address, oldest first. */
export function lettersTo(address: string): Promise<Mail[]> {
  return Mail.findAll({ where: { toAddress: address }, order: ['id'] });
}

/** The token in the newest letter of a kind. */
export async function tokenIn(template: string, address: string): Promise<string> {
  const letter = await Mail.findOne({ where: { template, toAddress: address }, order: [['id', 'DESC']] });
  const token = letter?.data.token;
  if (typeof token !== 'string') throw new Error(`no ${template} went to ${address}`);
  return token;
}

/** Does what the worker would do about links that were asked for. */
export async function writeAskedLinks(ctx: Context): Promise<void> {
  for (const job of await Job.findAll({ where: { type: sendPasswordLink.type, state: 'ready' } })) {
    await writePasswordLink(ctx, sendPasswordLink.payload.parse(job.payload));
    await job.update({ state: 'done' });
  }
}

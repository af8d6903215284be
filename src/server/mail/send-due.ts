/** One round of the post: claims due letters, lays them out, hands them to the transport, writes down how each ended. */
import { TEMPLATES } from '#server/mail/templates/index.ts';
import { layOut } from '#server/mail/letter.ts';
import { listHeaders } from '#server/mail/list-headers.ts';
import type { MailTransport } from '#server/mail/transport.ts';
import { noteArrival, noteRefusal, whyNotSent } from '#server/mail/addressee.ts';
import { claimDue, finishDead, finishDone, finishDropped, finishLater } from '#server/jobs/leases.ts';
import { Mail } from '#server/models/index.ts';

export interface PostOffice {
  readonly transport: MailTransport;
  readonly from: string;
  readonly publicUrl: string;
  readonly now: () => Date;
  /** 0 to 1; spreads the tries of many letters that failed together. */
  readonly chance: () => number;
}

const LEASE_SECONDS = 120;
const MINUTE = 60;
/** Seconds before each further try. Source of the steps: common practice of mail servers. */
const WAITS = [MINUTE, 5 * MINUTE, 15 * MINUTE, 3_600, 4 * 3_600, 12 * 3_600, 24 * 3_600];

/** @returns how many letters were claimed. */
export async function sendDueMails(office: PostOffice, owner: string, limit = 8): Promise<number> {
  const claims = await claimDue('mails', owner, limit, LEASE_SECONDS);
  await Promise.all(claims.map(({ id, attempts }) => sendOne(office, owner, id, attempts)));
  return claims.length;
}

async function sendOne(office: PostOffice, owner: string, id: number, attempts: number): Promise<void> {
  const mail = await Mail.findByPk(id);
  if (mail === null) return;
  if (mail.expiresAt !== null && mail.expiresAt <= office.now()) {
    await finishDead('mails', owner, id, 'too late to be of use');
    return;
  }
  const why = await whyNotSent(mail);
  if (why !== null) {
    await finishDropped(owner, id, why);
    return;
  }
  const result = await attempt(office, mail);
  if (!result.ok && result.reason === 'address-refused') await noteRefusal(mail.toAddress, result.message);
  if (result.ok) {
    await finishDone('mails', owner, id);
    await noteArrival(mail);
  }
  else if (result.reason === 'later' && attempts <= WAITS.length) await finishLater('mails', owner, id, wait(attempts, office.chance()), result.message);
  else await finishDead('mails', owner, id, result.message);
}

function wait(attempts: number, chance: number): number {
  const seconds = WAITS[attempts - 1] ?? 86_400;
  return Math.round(seconds * (0.8 + 0.4 * chance));
}

async function attempt(office: PostOffice, mail: Mail): ReturnType<MailTransport['sendMail']> {
  try {
    const template = Object.entries(TEMPLATES).find(([name]) => name === mail.template)?.[1];
    if (template === undefined) throw new Error(`no template ${mail.template}`);
    const letter = template.compose(mail.data, office);
    const domain = office.from.split('@')[1] ?? 'fellmark.example';
    return await office.transport.sendMail({
      to: { name: mail.toName, address: mail.toAddress },
      from: { name: 'Fellmark', address: office.from },
      ...layOut(letter, mail.toName, office.publicUrl),
      headers: { 'Content-Language': 'en', ...(letter.list && listHeaders(letter.list, domain)) },
      // The same for every try, so that a copy sent after a lost answer is recognised as one.
      messageId: `<mail-${mail.id}-${mail.createdAt.getTime()}@${domain}>`,
    });
  } catch (error) {
    return { ok: false, reason: 'mail-refused', replyCode: undefined, message: error instanceof Error ? error.message : String(error) };
  }
}

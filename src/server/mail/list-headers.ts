import type { MailingList } from '#server/mail/letter.ts';

/**
 * What lets a mail program show "leave this list" and do it by one press: RFC 2369 §3.2, RFC 8058 §3.1, RFC 2919 §3. The
 * signature that the mail server puts on our letters must cover the first two (RFC 8058 §4). No address to write to is
 * given, since nobody reads mail here.
 */
export function listHeaders({ label, leaveHref }: MailingList, domain: string): Record<string, string> {
  return {
    'List-Unsubscribe': `<${leaveHref}>`,
    'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
    'List-Id': `<${label}.${domain}>`,
  };
}

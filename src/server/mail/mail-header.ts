import { isEnvelopeAddress } from '#core/mail-address.ts';
import type { OutgoingMail } from './transport.ts';

/** Characters, not octets: encoded and folded, a value of this length stays within every line limit of RFC 5322 §2.1.1. */
const LONGEST_VALUE = 200;

/** RFC 5322 §3.6.8, without the signs nobody uses. */
const HEADER_NAME = /^[A-Za-z][A-Za-z0-9-]{0,63}$/;
const MESSAGE_ID = /^<[A-Za-z0-9!#$%&'*+/=?^_`{|}~.-]{1,120}@[A-Za-z0-9.-]{1,120}>$/;

/**
 * Header lines a mail may not set by the back door: each has its own field in {@link OutgoingMail}, or names a recipient.
 */
const RESERVED = new Set([
  'to', 'cc', 'bcc', 'from', 'sender', 'subject', 'date', 'message-id', 'mime-version', 'return-path',
  'content-type', 'content-transfer-encoding', 'resent-to', 'resent-cc', 'resent-bcc',
]);

/**
 * A text from a person made fit for a header: line breaks, tabs and control characters become spaces, what is hidden is
 * dropped, and it is cut to 200 characters at a whole character.
 */
export function cleanHeaderText(text: string): string {
  const flat = text
    .replace(/[\p{Cc}\u2028\u2029]+/gu, ' ')
    // Bidirectional overrides and byte order marks can make a subject read as something else than it is.
    .replace(/[\u200b\u200e\u200f\u202a-\u202e\u2066-\u2069\ufeff]/g, '')
    .replace(/ {2,}/g, ' ')
    .trim();
  const characters = Array.from(flat.toWellFormed());
  return characters.length <= LONGEST_VALUE ? characters.join('') : `${characters.slice(0, LONGEST_VALUE - 1).join('')}…`;
}

/**
 * The further header lines of a mail with their values cleaned. Every mail says that a program wrote it (RFC 3834 §5), so
 * that holiday notes are not sent back.
 * @throws {TypeError} for a name that is no header name, or one that has its own field.
 */
export function cleanHeaders(headers: Readonly<Record<string, string>> = {}): Record<string, string> {
  const cleaned: Record<string, string> = { 'Auto-Submitted': 'auto-generated' };
  for (const [name, value] of Object.entries(headers)) {
    if (!HEADER_NAME.test(name) || RESERVED.has(name.toLowerCase())) throw new TypeError(`${JSON.stringify(name)} is not a header a mail may set`);
    cleaned[name] = cleanHeaderText(value);
  }
  return cleaned;
}

/**
 * Refuses what would reach the envelope or the header block unencoded: our own code made it, so it is a mistake of ours.
 * @throws {TypeError} naming the part.
 */
export function mustBeSendable(mail: OutgoingMail): void {
  if (!isEnvelopeAddress(mail.to.address)) throw new TypeError('The address of the recipient may not go into an envelope');
  if (!isEnvelopeAddress(mail.from.address)) throw new TypeError('The address of the sender may not go into an envelope');
  if (mail.returnPath !== undefined && !isEnvelopeAddress(mail.returnPath)) throw new TypeError('The return path may not go into an envelope');
  if (!MESSAGE_ID.test(mail.messageId)) throw new TypeError('The message id is malformed');
  cleanHeaders(mail.headers);
}

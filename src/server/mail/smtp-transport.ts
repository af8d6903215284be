import { createTransport } from 'nodemailer';
import { cleanHeaders, cleanHeaderText, mustBeSendable } from './mail-header.ts';
import type { MailTransport, OutgoingMail, SendResult } from './transport.ts';

export interface SmtpSettings {
  /** `smtp://host:port` (STARTTLS where offered) or `smtps://…`, with `user:password@` where the server wants it. */
  readonly url: string;
  /** Refuse to send over a connection that was not encrypted. On for every host that is not this machine. */
  readonly requireTls?: boolean;
  readonly timeoutMs?: number;
}

const LOOPBACK = new Set(['127.0.0.1', 'localhost', '[::1]']);
const DEFAULT_TIMEOUT_MS = 30_000;

/** Mail over SMTP. Each mail goes in its own envelope to exactly one recipient. */
export function smtpTransport(settings: SmtpSettings): MailTransport {
  const { hostname, port, protocol, username, password } = new URL(settings.url);
  const secure = protocol === 'smtps:';
  const timeout = settings.timeoutMs ?? DEFAULT_TIMEOUT_MS;
  const transport = createTransport({
    host: hostname.replace(/^\[|\]$/g, ''),
    port: port === '' ? (secure ? 465 : 587) : Number(port),
    secure,
    requireTLS: !secure && (settings.requireTls ?? !LOOPBACK.has(hostname)),
    ...(username === '' ? {} : { auth: { user: decodeURIComponent(username), pass: decodeURIComponent(password) } }),
    connectionTimeout: timeout,
    greetingTimeout: timeout,
    socketTimeout: timeout,
    // A mail is made of words we hand over: no file and no address is ever read on its behalf.
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return {
    async sendMail(mail) {
      mustBeSendable(mail);
      const message = messageOf(mail);
      try {
        const sent = await transport.sendMail(message);
        return { ok: true, response: sent.response };
      } catch (error) {
        return refusalOf(error);
      }
    },
    async close() {
      transport.close();
    },
  };
}

function messageOf(mail: OutgoingMail) {
  return {
    // Addresses as objects and the envelope spelled out: a string would be parsed, and a comma in a name would name a second recipient.
    envelope: { from: mail.returnPath ?? mail.from.address, to: [mail.to.address] },
    from: { name: cleanHeaderText(mail.from.name), address: mail.from.address },
    to: [{ name: cleanHeaderText(mail.to.name), address: mail.to.address }],
    subject: cleanHeaderText(mail.subject),
    text: mail.text,
    html: mail.html,
    headers: cleanHeaders(mail.headers),
    messageId: mail.messageId,
  };
}

/** Sorts what nodemailer throws by what the outbox has to do about it. */
function refusalOf(error: unknown): SendResult {
  if (!(error instanceof Error)) throw error;
  const replyCode = numberIn(error, 'responseCode');
  const command = textIn(error, 'command');
  const message = cleanHeaderText(error.message);
  if (replyCode !== undefined && replyCode >= 500) {
    if (command === 'RCPT TO') return { ok: false, reason: 'address-refused', replyCode, message };
    if (command === 'MAIL FROM' || command === 'DATA') return { ok: false, reason: 'mail-refused', replyCode, message };
  }
  // A 5xx to the greeting or to the sign-in is our own setting gone wrong, not the mail's: it keeps until that is mended.
  return { ok: false, reason: 'later', replyCode, message };
}

function numberIn(error: Error, name: string): number | undefined {
  const value: unknown = Reflect.get(error, name);
  return typeof value === 'number' ? value : undefined;
}

function textIn(error: Error, name: string): string | undefined {
  const value: unknown = Reflect.get(error, name);
  return typeof value === 'string' ? value : undefined;
}

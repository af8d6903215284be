import { randomBytes } from 'node:crypto';
import { simpleParser } from 'mailparser';
import { z } from 'astro/zod';
import { Journal } from '#stand-ins/journal.ts';

/** Oldest mails go when the tray is full. */
const MOST_MAILS = 500;

const CaughtMail = z.object({
  id: z.string(),
  receivedAt: z.string(),
  /** Who the mail is really from and to, whatever its header says. */
  envelope: z.object({ from: z.string(), to: z.array(z.string()) }),
  /** Bare addresses of the header, joined by a comma and a space. */
  from: z.string(),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  html: z.string(),
  /** Lower-case name to unfolded line, still encoded; a list where a line stands more than once. */
  headers: z.record(z.union([z.string(), z.array(z.string())])),
  /** The mail octet for octet, each octet as one character. */
  raw: z.string(),
});
export type CaughtMail = z.infer<typeof CaughtMail>;

/** The mails that were caught, newest first. */
export class MailTray {
  readonly #journal: Journal;
  #mails: CaughtMail[] = [];

  /** @param file where mails are kept between starts; none for a tray that forgets. */
  constructor(file: string | undefined) {
    this.#journal = new Journal(file);
    for (const line of this.#journal.read()) {
      const mail = CaughtMail.safeParse(line.value);
      if (mail.success) this.#mails.push(mail.data);
    }
    this.#mails = this.#mails.slice(-MOST_MAILS);
    this.#journal.compact(this.#mails.map((mail) => ({ kind: 'mail', id: mail.id, value: mail })));
  }

  newestFirst(): readonly CaughtMail[] {
    return this.#mails.toReversed();
  }

  find(id: string): CaughtMail | undefined {
    return this.#mails.find((mail) => mail.id === id);
  }

  /** Empties the tray. */
  clear(): void {
    this.#mails = [];
    this.#journal.compact([]);
  }

  async add(raw: Buffer, envelope: CaughtMail['envelope']): Promise<CaughtMail> {
    const parsed = await simpleParser(raw, { skipImageLinks: true, skipTextToHtml: true });
    const mail: CaughtMail = {
      id: randomBytes(9).toString('base64url'),
      receivedAt: new Date().toISOString(),
      envelope,
      from: addressesIn(parsed.from),
      to: addressesIn(parsed.to),
      subject: parsed.subject ?? '',
      text: parsed.text ?? '',
      html: typeof parsed.html === 'string' ? parsed.html : '',
      headers: headersIn(parsed.headerLines),
      raw: raw.toString('latin1'),
    };
    this.#mails.push(mail);
    if (this.#mails.length > MOST_MAILS) this.#mails.shift();
    this.#journal.append({ kind: 'mail', id: mail.id, value: mail });
    return mail;
  }
}

interface AddressList {
  readonly value: readonly { readonly address?: string | undefined }[];
}

function addressesIn(lists: AddressList | readonly AddressList[] | undefined): string {
  if (lists === undefined) return '';
  const all = 'value' in lists ? [lists] : lists;
  return all.flatMap((list) => list.value.map((entry) => entry.address ?? '')).join(', ');
}

function headersIn(lines: readonly { readonly key: string; readonly line: string }[]): CaughtMail['headers'] {
  const headers: CaughtMail['headers'] = {};
  for (const { key, line } of lines) {
    const value = line.slice(line.indexOf(':') + 1).replace(/\r?\n[ \t]+/g, ' ').trim();
    const before = headers[key];
    headers[key] = before === undefined ? value : [before, value].flat();
  }
  return headers;
}

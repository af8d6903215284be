import type { Socket } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import { z } from 'astro/zod';
import type { MailTray } from './mail-tray.ts';

/**
 * How the server behaves, for trying what the house does when mail goes wrong:
 * `slow` answers late · `greylist` puts a sender off once (451) · `refuse` knows no recipient (550) · `refuse-mail` takes no
 * content (554) · `drop-after-data` keeps the mail, then cuts the line instead of answering · `drop-mid-data` cuts it while the
 * mail comes in · `tls-failure` offers an encryption nobody can trust · `overload` turns everybody away (421).
 */
export const MAIL_MODES = ['ok', 'slow', 'greylist', 'refuse', 'refuse-mail', 'drop-after-data', 'drop-mid-data', 'tls-failure', 'overload'] as const;

export const MailFault = z
  .object({
    mode: z.enum(MAIL_MODES),
    /** After so many mails (tries, for those that are not taken) the server is well again; for ever when left out. */
    times: z.number().int().min(1).max(1000).optional(),
    /** Of `slow`, in milliseconds. */
    delayMs: z.number().int().min(0).max(120_000).default(3000),
  })
  .strict();
export type MailFault = z.infer<typeof MailFault>;

const LARGEST_MAIL = 10 * 1024 * 1024;

/** An SMTP server on this machine that takes every mail and delivers none. */
export class SmtpCatcher {
  readonly #server: SMTPServer;
  readonly #tray: MailTray;
  /** By the port of the other side, so that a session's line can be cut. */
  readonly #sockets = new Map<number, Socket>();
  readonly #putOff = new Set<string>();
  #fault: MailFault = { mode: 'ok', delayMs: 0 };

  constructor(tray: MailTray) {
    this.#tray = tray;
    this.#server = new SMTPServer({
      authOptional: true,
      size: LARGEST_MAIL,
      logger: false,
      disableReverseLookup: true,
      disabledCommands: ['AUTH', 'STARTTLS'],
      onConnect: (session, callback) => {
        callback(this.#greet(session));
      },
      onRcptTo: (recipient, session, callback) => {
        callback(this.#refuseRecipient(recipient.address, session));
      },
      onData: (stream, session, callback) => {
        this.#take(stream, session).then((error) => {
          if (error !== 'cut off') callback(error);
        }, callback);
      },
    });
    this.#server.server.on('connection', (socket: Socket) => {
      const port = socket.remotePort ?? 0;
      this.#sockets.set(port, socket);
      socket.on('close', () => this.#sockets.delete(port));
    });
    // A line that is cut is part of the play.
    this.#server.on('error', () => undefined);
  }

  /** @param port 0 takes a free one. Answers the port that was taken. */
  async listen(port: number): Promise<number> {
    await new Promise<void>((resolve, reject) => {
      this.#server.server.once('error', reject);
      this.#server.listen(port, '127.0.0.1', resolve);
    });
    const address = this.#server.server.address();
    return typeof address === 'object' && address !== null ? address.port : port;
  }

  close(): Promise<void> {
    for (const socket of this.#sockets.values()) socket.destroySoon();
    return new Promise((resolve) => {
      this.#server.close(resolve);
    });
  }

  get fault(): MailFault {
    return this.#fault;
  }

  set fault(fault: MailFault) {
    this.#putOff.clear();
    this.#fault = fault;
  }

  /** Counts one use of the present fault; the last one makes the server well again. */
  #use(): void {
    const { times } = this.#fault;
    if (times === undefined) return;
    this.#fault = times > 1 ? { ...this.#fault, times: times - 1 } : { mode: 'ok', delayMs: 0 };
  }

  #greet(session: SMTPServerSession): Error | null {
    if (this.#fault.mode === 'tls-failure') {
      session.disabledCommands = ['AUTH'];
      this.#use();
    }
    if (this.#fault.mode !== 'overload') return null;
    this.#use();
    return smtpError(421, 'Too many at once, come back later');
  }

  #refuseRecipient(address: string, session: SMTPServerSession): Error | null {
    const { mode } = this.#fault;
    if (mode === 'refuse') {
      this.#use();
      return smtpError(550, 'Nobody of that name lives here');
    }
    if (mode !== 'greylist') return null;
    const sender = session.envelope.mailFrom;
    const pair = `${sender === false ? '' : sender.address} ${address}`;
    if (this.#putOff.has(pair)) return null;
    this.#putOff.add(pair);
    return smtpError(451, 'We have not met; come back in a while');
  }

  async #take(stream: SMTPServerDataStream, session: SMTPServerSession): Promise<Error | null | 'cut off'> {
    const { mode, delayMs } = this.#fault;
    if (mode === 'drop-mid-data') {
      this.#use();
      stream.once('data', () => this.#cut(session));
      stream.resume();
      return 'cut off';
    }
    const raw = await readAll(stream);
    if (stream.sizeExceeded) return smtpError(552, 'This mail is too large');
    if (mode === 'refuse-mail') {
      this.#use();
      return smtpError(554, 'This mail is not wanted');
    }
    if (mode === 'slow') {
      this.#use();
      await wait(delayMs);
    }
    const { mailFrom, rcptTo } = session.envelope;
    await this.#tray.add(raw, { from: mailFrom === false ? '' : mailFrom.address, to: rcptTo.map(({ address }) => address) });
    if (mode !== 'drop-after-data') return null;
    this.#use();
    this.#cut(session);
    return 'cut off';
  }

  #cut(session: SMTPServerSession): void {
    this.#sockets.get(session.remotePort)?.destroy();
  }
}

async function readAll(stream: SMTPServerDataStream): Promise<Buffer> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(Buffer.isBuffer(chunk) ? chunk : Buffer.from(String(chunk)));
  return Buffer.concat(chunks);
}

function smtpError(responseCode: number, message: string): Error {
  return Object.assign(new Error(message), { responseCode });
}

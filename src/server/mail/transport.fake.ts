import { mustBeSendable } from './mail-header.ts';
import type { MailTransport, OutgoingMail, SendResult } from './transport.ts';

/** Keeps mails instead of sending them. Answers wait in a queue; when it is empty, every mail is taken. */
export class FakeMailTransport implements MailTransport {
  readonly sent: OutgoingMail[] = [];
  readonly tried: OutgoingMail[] = [];
  readonly #answers: SendResult[] = [];

  /** What the next mails are answered, in this order. */
  answerNext(...answers: readonly SendResult[]): void {
    this.#answers.push(...answers);
  }

  sentTo(address: string): OutgoingMail[] {
    return this.sent.filter((mail) => mail.to.address === address);
  }

  async sendMail(mail: OutgoingMail): Promise<SendResult> {
    mustBeSendable(mail);
    this.tried.push(mail);
    const answer = this.#answers.shift() ?? { ok: true, response: '250 kept by the fake' };
    if (answer.ok) this.sent.push(mail);
    return answer;
  }

  async close(): Promise<void> {
    // Nothing is open.
  }
}

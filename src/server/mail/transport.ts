/** How a finished mail leaves the house. The outbox calls this port; it never waits inside a database transaction. */

export interface Mailbox {
  /** Shown beside the address; may hold anything a person may be called. */
  readonly name: string;
  /** One bare address, as `core/mail-address.ts` gives it. */
  readonly address: string;
}

export interface OutgoingMail {
  readonly to: Mailbox;
  readonly from: Mailbox;
  readonly subject: string;
  /** Both parts are always sent, so that every reader finds one that suits. */
  readonly text: string;
  readonly html: string;
  /** Further header lines, `Content-Language` for instance. Names are ours, values may come from people. */
  readonly headers?: Readonly<Record<string, string>>;
  /** `<left@right>`. The same for every try of the same mail, so that a copy is recognised as one. */
  readonly messageId: string;
  /** Where reports of failed delivery go; `from.address` unless told otherwise. */
  readonly returnPath?: string;
}

export type SendResult =
  | { readonly ok: true; /** What the server said, for the log. */ readonly response: string }
  | {
      readonly ok: false;
      /**
       * - `later`: nothing is wrong with the mail; try again (no connection, time out, reply 4xx, encryption failed).
       * - `address-refused`: this address takes no mail (5xx to the recipient); trying again is useless and rude.
       * - `mail-refused`: the server will not have this mail (5xx to anything else).
       */
      readonly reason: 'later' | 'address-refused' | 'mail-refused';
      /** SMTP reply code, where there was one. */
      readonly replyCode: number | undefined;
      /** For the log and the steward, never for the recipient. */
      readonly message: string;
    };

export interface MailTransport {
  /**
   * Hands one mail to one recipient.
   * @throws {TypeError} when an address, a header name or the message id could not have come from our own code.
   */
  sendMail(mail: OutgoingMail): Promise<SendResult>;
  /** Closes idle connections; mails under way are finished first. */
  close(): Promise<void>;
}

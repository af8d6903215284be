import { join } from 'node:path';
import { controlAnswerer } from './control.ts';
import { seeOther, serve, type Answerer } from './http.ts';
import { mailAnswerer } from './mail/mail-pages.ts';
import { MailTray } from './mail/mail-tray.ts';
import { SmtpCatcher } from './mail/smtp-catcher.ts';
import { lookAnswerer } from './page.ts';
import { apiAnswerer } from './payment/api.ts';
import { ApiFaults } from './payment/api-faults.ts';
import { apiRoutes } from './payment/api-routes.ts';
import { BuyerDesk } from './payment/buyer-desk.ts';
import { CheckoutDesk } from './payment/checkout-desk.ts';
import { EventLog } from './payment/event-log.ts';
import { IdempotentRequests } from './payment/idempotency.ts';
import { payPageAnswerer } from './payment/pay-page-answerer.ts';
import { PaymentState } from './payment/payment-state.ts';
import { RefundDesk } from './payment/refund-desk.ts';
import { ServiceClock } from './payment/service-clock.ts';
import { WebhookSender } from './payment/webhook-sender.ts';

export interface StandInSettings {
  /** Of pay page, payment interface, mail tray and control; 0 takes a free one. */
  readonly httpPort: number;
  /** Where mail is caught; 0 takes a free one. */
  readonly smtpPort: number;
  /** Folder that keeps what the stand-ins know between starts; none to forget. */
  readonly folder?: string | undefined;
  /** The shop's address for news of payments. */
  readonly webhookUrl: string;
  readonly webhookSecrets: readonly string[];
  readonly retrySeconds?: readonly number[] | undefined;
  /** How long slow payments and refunds take. */
  readonly settleSeconds?: number;
}

export interface StandIns {
  readonly url: string;
  readonly smtpUrl: string;
  readonly tray: MailTray;
  readonly smtp: SmtpCatcher;
  readonly payments: PaymentState;
  readonly webhooks: WebhookSender;
  readonly clock: ServiceClock;
  readonly apiFaults: ApiFaults;
  close(): Promise<void>;
}

const UPKEEP_MS = 500;
const SETTLE_SECONDS = 15;

/** Starts the payment service and the mail server that are none. */
export async function startStandIns(settings: StandInSettings): Promise<StandIns> {
  const kept = (name: string) => (settings.folder === undefined ? undefined : join(settings.folder, name));
  const clock = new ServiceClock();
  const state = new PaymentState(kept('payments.jsonl'));
  const webhooks = new WebhookSender(state, clock, { url: settings.webhookUrl, secrets: settings.webhookSecrets, retrySeconds: settings.retrySeconds });
  const log = new EventLog(state, clock, (event) => {
    webhooks.enqueue(event);
  });
  let url = '';
  const checkouts = new CheckoutDesk(state, clock, log, () => `${url}/pay/`);
  const settleSeconds = settings.settleSeconds ?? SETTLE_SECONDS;
  const buyers = new BuyerDesk(state, clock, log, checkouts, settleSeconds);
  const refunds = new RefundDesk(state, clock, log, settleSeconds);
  const upkeep = () => {
    checkouts.expireDue();
    buyers.settleDue();
    refunds.settleDue();
  };
  const apiFaults = new ApiFaults();
  const tray = new MailTray(kept('mail.jsonl'));
  const smtp = new SmtpCatcher(tray);

  const answerers: Answerer[] = [
    apiAnswerer({ routes: apiRoutes({ state, checkouts, refunds }), idempotency: new IdempotentRequests(state, clock), faults: apiFaults, upkeep }),
    payPageAnswerer({ state, clock, buyers, upkeep }),
    mailAnswerer(tray),
    controlAnswerer({ state, clock, webhooks, apiFaults, buyers, refunds, smtp, tray, upkeep }),
    lookAnswerer(),
    ({ path }) => (path === '/' ? seeOther('/mail') : undefined),
  ];
  const smtpPort = await smtp.listen(settings.smtpPort);
  const server = await serve(settings.httpPort, answerers).catch(async (error: unknown) => {
    await smtp.close();
    throw error;
  });
  url = `http://127.0.0.1:${server.port}`;
  const timer = setInterval(upkeep, UPKEEP_MS);
  webhooks.wake();
  return {
    url,
    smtpUrl: `smtp://127.0.0.1:${smtpPort}`,
    tray,
    smtp,
    payments: state,
    webhooks,
    clock,
    apiFaults,
    async close() {
      clearInterval(timer);
      webhooks.stop();
      await Promise.all([server.close(), smtp.close()]);
    },
  };
}

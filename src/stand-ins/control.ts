import { z } from 'astro/zod';
import { jsonReply, type Answerer, type Asked, type Reply } from './http.ts';
import { MailFault, type SmtpCatcher } from './mail/smtp-catcher.ts';
import type { MailTray } from './mail/mail-tray.ts';
import { ApiFault, type ApiFaults } from './payment/api-faults.ts';
import type { BuyerDesk } from './payment/buyer-desk.ts';
import type { PaymentState } from './payment/payment-state.ts';
import type { RefundDesk } from './payment/refund-desk.ts';
import type { ServiceClock } from './payment/service-clock.ts';
import { WebhookFaults } from './payment/webhook-faults.ts';
import type { WebhookSender } from './payment/webhook-sender.ts';

export interface Controlled {
  readonly state: PaymentState;
  readonly clock: ServiceClock;
  readonly webhooks: WebhookSender;
  readonly apiFaults: ApiFaults;
  readonly buyers: BuyerDesk;
  readonly refunds: RefundDesk;
  readonly smtp: SmtpCatcher;
  readonly tray: MailTray;
  readonly upkeep: () => void;
}

const Advance = z.object({ advanceSeconds: z.number().int().min(0).max(400 * 86_400) }).strict();
const Settle = z.object({ id: z.string(), outcome: z.enum(['succeeded', 'failed']) }).strict();
const Faults = z.object({ faults: z.array(ApiFault).max(100) }).strict();
const Clear = z.object({}).strict();

/**
 * Answers `/control/…`: how trials set the stand-ins' behaviour. JSON only, so that no page of another origin can post here
 * without being asked for leave first, which is never given.
 */
export function controlAnswerer(controlled: Controlled): Answerer {
  const { webhooks, smtp, apiFaults, clock } = controlled;
  const controls: Record<string, { read: () => unknown; change: (body: unknown) => unknown }> = {
    '/control/webhooks': {
      read: () => ({ ...webhooks.faults, deliveries: webhooks.counts() }),
      change: (body) => (webhooks.faults = WebhookFaults.parse(body)),
    },
    '/control/mail': {
      read: () => smtp.fault,
      change: (body) => (smtp.fault = MailFault.parse(body)),
    },
    '/control/mail/clear': {
      read: () => ({ mails: controlled.tray.newestFirst().length }),
      change: (body) => {
        Clear.parse(body);
        controlled.tray.clear();
        return { mails: 0 };
      },
    },
    '/control/payments': {
      read: () => ({ faults: apiFaults.waiting }),
      change: (body) => {
        apiFaults.set(Faults.parse(body).faults);
        return { faults: apiFaults.waiting };
      },
    },
    '/control/clock': {
      read: () => ({ now: new Date(clock.nowMs()).toISOString() }),
      change: (body) => {
        clock.advance(Advance.parse(body).advanceSeconds);
        controlled.upkeep();
        webhooks.wake();
        return { now: new Date(clock.nowMs()).toISOString() };
      },
    },
    '/control/settle': {
      read: () => ({ waiting: onTheirWay(controlled.state) }),
      change: (body) => settle(controlled, Settle.parse(body)),
    },
  };
  return (asked) => {
    if (!asked.path.startsWith('/control/')) return undefined;
    const control = controls[asked.path];
    if (!control) return jsonReply({ problem: 'There is no such control', controls: Object.keys(controls) }, 404);
    return asked.method === 'POST' ? changed(asked, control.change) : jsonReply(control.read());
  };
}

function changed(asked: Asked, change: (body: unknown) => unknown): Reply {
  if (!/^application\/json\b/.test(asked.headers['content-type'] ?? '')) return jsonReply({ problem: 'Send application/json' }, 415);
  try {
    return jsonReply(change(JSON.parse(asked.body)));
  } catch (error) {
    if (error instanceof z.ZodError) return jsonReply({ problem: 'This does not work', issues: error.issues }, 422);
    if (error instanceof SyntaxError) return jsonReply({ problem: 'This is not JSON' }, 400);
    throw error;
  }
}

/** Payments and refunds that are not over yet. */
function onTheirWay(state: PaymentState): string[] {
  return [...state.checkouts.oldestFirst(), ...state.refunds.oldestFirst()].filter(({ settling }) => settling !== null).map(({ id }) => id);
}

/** Ends a slow payment or refund now. */
function settle({ state, buyers, refunds }: Controlled, { id, outcome }: z.infer<typeof Settle>): unknown {
  const paid = outcome === 'succeeded';
  const checkout = state.checkouts.get(id);
  if (checkout?.settling) buyers.settle(checkout, paid);
  const refund = state.refunds.get(id);
  if (refund?.settling) refunds.settle(refund, paid);
  return { waiting: onTheirWay(state) };
}

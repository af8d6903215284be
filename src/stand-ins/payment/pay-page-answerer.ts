import { pageReply, seeOther, type Answerer, type Asked, type Reply } from '#stand-ins/http.ts';
import { pagePolicy } from '#stand-ins/page.ts';
import type { BuyerDesk, PayResult } from './buyer-desk.ts';
import { buyerIn, emptyTyped, filledWith, readAccount, readCard, readTyped, wrongAddress, type Typed, type Wrong } from './pay-form.ts';
import { bankPage, overPage, payPage, unknownPage } from './pay-page.ts';
import type { CheckoutRecord, PaymentState } from './payment-state.ts';
import type { ServiceClock } from './service-clock.ts';

export interface PayPages {
  readonly state: PaymentState;
  readonly clock: ServiceClock;
  readonly buyers: BuyerDesk;
  readonly upkeep: () => void;
}

/** The generic refusal behind the Decline button: the documented card that is always turned down. */
const DECLINED_CARD = '4000000000000002';

/** Answers `/pay/<checkout>` and `/pay/<checkout>/bank`, by plain forms. */
export function payPageAnswerer(pages: PayPages): Answerer {
  return (asked) => {
    const match = /^\/pay\/(\w{1,100})(\/bank)?$/.exec(asked.path);
    if (!match) return undefined;
    pages.upkeep();
    const record = pages.state.checkouts.get(match[1] ?? '');
    if (!record) return pageReply(unknownPage(), { status: 404, policy: pagePolicy() });
    if (record.session.status !== 'open') {
      const back = record.session.status === 'complete' ? successAddress(record) : record.session.cancel_url;
      return pageReply(overPage(record, back), { policy: policyFor(record) });
    }
    if (match[2] !== undefined) return bankAnswer(pages, record, asked);
    return asked.method === 'POST' ? formAnswer(pages, record, asked) : show(record, emptyTyped(record.session.customer_email ?? ''));
  };
}

function bankAnswer({ buyers }: PayPages, record: CheckoutRecord, asked: Asked): Reply {
  if (record.challenge === null) return seeOther(`/pay/${record.id}`);
  if (asked.method !== 'POST') return pageReply(bankPage(record), { policy: policyFor(record) });
  const { buyer } = record.challenge;
  const result = buyers.answerBank(record, new URLSearchParams(asked.body).get('do') === 'yes');
  return goOn(record, { ...emptyTyped(buyer.email), name: buyer.name, country: buyer.country }, result);
}

function formAnswer(pages: PayPages, record: CheckoutRecord, asked: Asked): Reply {
  const form = new URLSearchParams(asked.body);
  const typed = readTyped(form);
  const now = new Date(pages.clock.nowMs());
  const fill = form.get('fill');
  if (fill !== null) return show(record, filledWith(typed, fill, now.getUTCFullYear()));
  switch (form.get('do')) {
    case 'close':
      return seeOther(record.session.cancel_url ?? `/pay/${record.id}`);
    case 'decline':
      return goOn(record, typed, pages.buyers.payByCard(record, { buyer: buyerIn(typed), number: DECLINED_CARD, expMonth: 12, expYear: now.getUTCFullYear() + 3 }));
    case 'debit':
      return debit(pages, record, typed);
    case 'free':
      return takeForNothing(pages, record, typed);
    default:
      return payByCard(pages, record, typed, now);
  }
}

function payByCard({ buyers }: PayPages, record: CheckoutRecord, typed: Typed, now: Date): Reply {
  const card = readCard(typed, now);
  if (!card.ok) return show(record, typed, card.wrong);
  return goOn(record, typed, buyers.payByCard(record, { buyer: buyerIn(typed), number: card.number, expMonth: card.expMonth, expYear: card.expYear }));
}

function debit({ buyers }: PayPages, record: CheckoutRecord, typed: Typed): Reply {
  const account = readAccount(typed);
  if (!account.ok) return show(record, typed, account.wrong);
  return goOn(record, typed, buyers.payByAccount(record, { buyer: buyerIn(typed), iban: account.iban, paid: account.paid }));
}

function takeForNothing({ buyers }: PayPages, record: CheckoutRecord, typed: Typed): Reply {
  if (record.session.amount_total !== 0) return show(record, typed);
  const wrong = wrongAddress(typed);
  if (wrong.email !== undefined) return show(record, typed, wrong);
  return goOn(record, typed, buyers.takeForNothing(record, buyerIn(typed)));
}

function goOn(record: CheckoutRecord, typed: Typed, result: PayResult): Reply {
  if (result.kind === 'done') return seeOther(successAddress(record));
  if (result.kind === 'bank-asks') return seeOther(`/pay/${record.id}/bank`);
  return show(record, typed, {}, result.message);
}

function show(record: CheckoutRecord, typed: Typed, wrong: Wrong = {}, refused?: string): Reply {
  return pageReply(payPage({ record, typed, wrong, refused }), { policy: policyFor(record) });
}

/** A form's answer may lead to the shop, so the policy must name the shop. */
function policyFor(record: CheckoutRecord): string {
  const targets = [record.session.success_url, record.session.cancel_url].flatMap((url) => (url === null ? [] : [new URL(url).origin]));
  return pagePolicy([...new Set(targets)]);
}

function successAddress({ session }: CheckoutRecord): string {
  return (session.success_url ?? '').replaceAll(/\{CHECKOUT_SESSION_ID\}|%7BCHECKOUT_SESSION_ID%7D/gi, session.id);
}

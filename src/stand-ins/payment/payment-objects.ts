import type Stripe from 'stripe';
import type { Buyer } from './payment-state.ts';
import { addressIn } from './session-object.ts';

export interface NewIntent {
  readonly id: string;
  readonly secret: string;
  readonly created: number;
  readonly amount: number;
  readonly currency: string;
  readonly description: string | null;
  readonly metadata: Stripe.Metadata;
  readonly methodTypes: string[];
  readonly statementSuffix: string | null;
}

/** What the stand-in never does with a payment, as the service shows one where it was not done. */
const INTENT_NOT_OFFERED = {
  allowed_payment_method_types: null,
  amount_capturable: 0,
  amount_details: { tip: {} },
  application: null,
  application_fee_amount: null,
  automatic_payment_methods: null,
  customer: null,
  customer_account: null,
  excluded_payment_method_types: null,
  managed_payments: null,
  on_behalf_of: null,
  payment_method_configuration_details: null,
  payment_method_options: {},
  payment_record: null,
  processing: null,
  receipt_email: null,
  review: null,
  setup_future_usage: null,
  shipping: null,
  source: null,
  statement_descriptor: null,
  transfer_data: null,
  transfer_group: null,
} satisfies Partial<Stripe.PaymentIntent>;

/** A payment before anything was tried. */
export function newIntent(facts: NewIntent): Stripe.PaymentIntent {
  return {
    ...INTENT_NOT_OFFERED,
    id: facts.id,
    object: 'payment_intent',
    amount: facts.amount,
    amount_received: 0,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic_async',
    client_secret: facts.secret,
    confirmation_method: 'automatic',
    created: facts.created,
    currency: facts.currency,
    description: facts.description,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    metadata: facts.metadata,
    next_action: null,
    payment_method: null,
    payment_method_types: facts.methodTypes,
    statement_descriptor_suffix: facts.statementSuffix,
    status: 'requires_payment_method',
  };
}

/** What a buyer pays with. */
export type PaidWith =
  | { readonly kind: 'card'; readonly brand: string; readonly last4: string; readonly expMonth: number; readonly expYear: number; readonly asked: boolean }
  | { readonly kind: 'account'; readonly last4: string; readonly country: string };

export interface NewCharge {
  readonly id: string;
  readonly created: number;
  readonly intent: Stripe.PaymentIntent;
  readonly buyer: Buyer;
  readonly paidWith: PaidWith;
  readonly methodId: string;
  readonly status: 'succeeded' | 'pending' | 'failed';
  readonly refusal: { readonly code: string; readonly declineCode: string | null; readonly message: string } | null;
  readonly transactionId: string | null;
  readonly receiptUrl: string;
}

const CHARGE_NOT_OFFERED = {
  application: null,
  application_fee: null,
  application_fee_amount: null,
  customer: null,
  failure_balance_transaction: null,
  fraud_details: {},
  on_behalf_of: null,
  radar_options: {},
  receipt_number: null,
  review: null,
  shipping: null,
  source: null,
  source_transfer: null,
  statement_descriptor: null,
  transfer_data: null,
  transfer_group: null,
} satisfies Partial<Stripe.Charge>;

export function newCharge(facts: NewCharge): Stripe.Charge {
  const { intent, status, buyer } = facts;
  const taken = status !== 'failed';
  return {
    ...CHARGE_NOT_OFFERED,
    id: facts.id,
    object: 'charge',
    amount: intent.amount,
    amount_captured: taken ? intent.amount : 0,
    amount_refunded: 0,
    balance_transaction: facts.transactionId,
    billing_details: { address: addressIn(buyer.country), email: buyer.email, name: buyer.name, phone: null, tax_id: null },
    calculated_statement_descriptor: 'STAND-IN',
    captured: taken,
    created: facts.created,
    currency: intent.currency,
    description: intent.description,
    disputed: false,
    failure_code: facts.refusal?.code ?? null,
    failure_message: facts.refusal?.message ?? null,
    livemode: false,
    metadata: intent.metadata,
    outcome: outcomeOf(status, facts.refusal),
    paid: status === 'succeeded',
    payment_intent: intent.id,
    payment_method: facts.methodId,
    payment_method_details: methodDetails(facts.paidWith, intent.amount),
    receipt_email: intent.receipt_email,
    receipt_url: taken ? facts.receiptUrl : null,
    refunded: false,
    statement_descriptor_suffix: intent.statement_descriptor_suffix,
    status,
  };
}

function outcomeOf(status: NewCharge['status'], refusal: NewCharge['refusal']): Stripe.Charge.Outcome {
  const refused = status === 'failed';
  return {
    advice_code: refused ? 'try_again_later' : null,
    network_advice_code: null,
    network_decline_code: refused ? '01' : null,
    network_status: refused ? 'declined_by_network' : 'approved_by_network',
    reason: refusal?.declineCode ?? refusal?.code ?? null,
    risk_level: 'normal',
    risk_score: 20,
    seller_message: refused ? 'The bank did not return any further details with this decline.' : 'Payment complete.',
    type: refused ? 'issuer_declined' : 'authorized',
  };
}

function methodDetails(paidWith: PaidWith, amount: number): Stripe.Charge.PaymentMethodDetails {
  if (paidWith.kind === 'account') {
    return {
      type: 'sepa_debit',
      sepa_debit: { bank_code: null, branch_code: null, country: paidWith.country, fingerprint: null, last4: paidWith.last4, mandate: null },
    };
  }
  return {
    type: 'card',
    card: {
      amount_authorized: amount,
      authorization_code: null,
      brand: paidWith.brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
      country: 'DE',
      electronic_commerce_indicator: paidWith.asked ? '05' : null,
      exp_month: paidWith.expMonth,
      exp_year: paidWith.expYear,
      fingerprint: null,
      funding: 'credit',
      installments: null,
      last4: paidWith.last4,
      mandate: null,
      network: paidWith.brand,
      network_transaction_id: null,
      regulated_status: 'unregulated',
      three_d_secure: paidWith.asked
        ? {
            authentication_flow: 'challenge',
            electronic_commerce_indicator: '05',
            exemption_indicator: null,
            result: 'authenticated',
            result_reason: null,
            transaction_id: null,
            version: '2.2.0',
          }
        : null,
      transaction_link_id: null,
      wallet: null,
    },
  };
}

/** The service's share of a payment, as the stand-in plays it: 1.5 % rounded half up, and 25 minor units. */
export function serviceFee(amount: number): number {
  return Math.round(amount * 0.015) + 25;
}

const DAYS_UNTIL_AVAILABLE = 2;

export interface NewTransaction {
  readonly id: string;
  readonly created: number;
  readonly amount: number;
  readonly fee: number;
  readonly currency: string;
  readonly source: string;
  readonly type: keyof typeof REPORTED_AS;
}

/** Kinds of balance transaction used here, and the group the service's reports put each in. */
const REPORTED_AS = { charge: 'charge', payment: 'charge', refund: 'refund', payment_refund: 'refund', refund_failure: 'refund_failure' } as const;

/** One line of the account with the service; money given back is negative. */
export function newTransaction(facts: NewTransaction): Stripe.BalanceTransaction {
  return {
    id: facts.id,
    object: 'balance_transaction',
    amount: facts.amount,
    available_on: facts.created + DAYS_UNTIL_AVAILABLE * 86_400,
    balance_type: 'payments',
    created: facts.created,
    currency: facts.currency,
    description: null,
    exchange_rate: null,
    fee: facts.fee,
    fee_details: facts.fee === 0 ? [] : [{ amount: facts.fee, application: null, currency: facts.currency, description: 'Processing fees', type: 'stripe_fee' }],
    net: facts.amount - facts.fee,
    reporting_category: REPORTED_AS[facts.type],
    source: facts.source,
    status: 'pending',
    type: facts.type,
  };
}

export interface NewRefund {
  readonly id: string;
  readonly created: number;
  readonly amount: number;
  readonly charge: Stripe.Charge;
  readonly reason: Stripe.Refund['reason'];
  readonly metadata: Stripe.Metadata;
  readonly status: 'succeeded' | 'pending';
  readonly transactionId: string;
}

export function newRefund(facts: NewRefund): Stripe.Refund {
  const intent = facts.charge.payment_intent;
  return {
    id: facts.id,
    object: 'refund',
    amount: facts.amount,
    balance_transaction: facts.transactionId,
    charge: facts.charge.id,
    created: facts.created,
    currency: facts.charge.currency,
    customer: null,
    customer_account: null,
    destination_details: { type: 'card', card: { reference_status: 'pending', reference_type: 'acquirer_reference_number', type: 'refund' } },
    metadata: facts.metadata,
    payment_intent: typeof intent === 'string' ? intent : (intent?.id ?? null),
    payment_method: facts.charge.payment_method,
    ...(facts.status === 'pending' ? { pending_reason: 'processing' as const } : {}),
    reason: facts.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: facts.status,
    transfer_reversal: null,
  };
}

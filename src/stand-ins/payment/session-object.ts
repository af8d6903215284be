import type Stripe from 'stripe';

export interface NewSession {
  readonly id: string;
  readonly created: number;
  readonly expiresAt: number;
  readonly currency: string;
  readonly total: number;
  readonly url: string;
  readonly successUrl: string;
  readonly cancelUrl: string | null;
  readonly clientReferenceId: string | null;
  readonly customerEmail: string | null;
  readonly metadata: Stripe.Metadata;
  readonly locale: Stripe.Checkout.Session['locale'];
  readonly paymentMethodTypes: string[];
  readonly submitMessage: string | null;
  readonly adaptivePricing: boolean;
}

/** What the stand-in never offers, as the service shows a checkout that does not use it. */
const NOT_OFFERED = {
  after_expiration: null,
  allow_promotion_codes: null,
  allowed_payment_method_types: null,
  automatic_tax: { enabled: false, liability: null, provider: null, status: null },
  billing_address_collection: null,
  client_secret: null,
  collected_information: { business_name: null, individual_name: null, shipping_details: null },
  consent: null,
  consent_collection: null,
  currency_conversion: null,
  custom_fields: [],
  customer: null,
  customer_account: null,
  discounts: [],
  integration_identifier: null,
  invoice: null,
  invoice_creation: {
    enabled: false,
    invoice_data: { account_tax_ids: null, custom_fields: null, description: null, footer: null, issuer: null, metadata: {}, rendering_options: null },
  },
  managed_payments: null,
  origin_context: null,
  payment_link: null,
  payment_method_configuration_details: null,
  permissions: null,
  phone_number_collection: { enabled: false },
  recovered_from: null,
  saved_payment_method_options: null,
  setup_intent: null,
  shipping_address_collection: null,
  shipping_cost: null,
  shipping_options: [],
  submit_type: null,
  subscription: null,
  wallet_options: null,
} satisfies Partial<Stripe.Checkout.Session>;

/** A checkout as it begins, in the service's full form. */
export function newSession(facts: NewSession): Stripe.Checkout.Session {
  const submit = facts.submitMessage === null ? null : { message: facts.submitMessage };
  return {
    ...NOT_OFFERED,
    id: facts.id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: facts.adaptivePricing },
    amount_subtotal: facts.total,
    amount_total: facts.total,
    cancel_url: facts.cancelUrl,
    client_reference_id: facts.clientReferenceId,
    created: facts.created,
    currency: facts.currency,
    custom_text: { after_submit: null, shipping_address: null, submit, terms_of_service_acceptance: null },
    customer_creation: 'if_required',
    customer_details: facts.customerEmail === null ? null : customerDetails({ email: facts.customerEmail, name: null, country: null }),
    customer_email: facts.customerEmail,
    expires_at: facts.expiresAt,
    livemode: false,
    locale: facts.locale,
    metadata: facts.metadata,
    mode: 'payment',
    payment_intent: null,
    payment_method_collection: 'if_required',
    payment_method_options: { card: { request_three_d_secure: 'automatic' } },
    payment_method_types: facts.paymentMethodTypes,
    payment_status: facts.total === 0 ? 'no_payment_required' : 'unpaid',
    status: 'open',
    success_url: facts.successUrl,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: facts.url,
  };
}

export function customerDetails(buyer: { readonly email: string; readonly name: string | null; readonly country: string | null }): Stripe.Checkout.Session.CustomerDetails {
  return {
    address: buyer.country === null ? null : addressIn(buyer.country),
    business_name: null,
    email: buyer.email,
    individual_name: null,
    name: buyer.name,
    phone: null,
    tax_exempt: 'none',
    tax_ids: [],
  };
}

export function addressIn(country: string): Stripe.Address {
  return { city: null, country, line1: null, line2: null, postal_code: null, state: null };
}

export interface NewLineItem {
  readonly id: string;
  readonly priceId: string;
  readonly productId: string;
  readonly created: number;
  readonly currency: string;
  readonly name: string;
  readonly unitAmount: number;
  readonly quantity: number;
  readonly taxBehavior: Stripe.Price['tax_behavior'];
}

export function newLineItem(facts: NewLineItem): Stripe.LineItem {
  const total = facts.unitAmount * facts.quantity;
  return {
    id: facts.id,
    object: 'item',
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: total,
    amount_tax: 0,
    amount_total: total,
    currency: facts.currency,
    description: facts.name,
    metadata: {},
    price: {
      id: facts.priceId,
      object: 'price',
      active: false,
      billing_scheme: 'per_unit',
      created: facts.created,
      currency: facts.currency,
      custom_unit_amount: null,
      livemode: false,
      lookup_key: null,
      metadata: {},
      nickname: null,
      product: facts.productId,
      recurring: null,
      tax_behavior: facts.taxBehavior,
      tiers_mode: null,
      transform_quantity: null,
      type: 'one_time',
      unit_amount: facts.unitAmount,
      unit_amount_decimal: null,
    },
    quantity: facts.quantity,
  };
}

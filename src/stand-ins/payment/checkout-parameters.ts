import { z } from 'astro/zod';
import { isCurrency } from '#core/money/currency.ts';
import { expandable, mailAddress, metadata, neverTrue, text, truth, webAddress, whole } from './parameters.ts';

/** The largest single amount the service takes, in minor units. */
const MOST_MINOR = 99_999_999;

const currency = text(3).refine((code) => code === code.toLowerCase() && isCurrency(code.toUpperCase()), {
  message: 'Invalid currency',
  params: { code: 'currency_not_supported' },
});

const lineItem = z
  .object({
    quantity: whole(1, 999_999),
    price_data: z
      .object({
        currency,
        unit_amount: whole(0, MOST_MINOR),
        tax_behavior: z.enum(['exclusive', 'inclusive', 'unspecified']).optional(),
        product_data: z
          .object({
            name: text(250),
            description: text(5000).optional(),
            images: z.array(webAddress()).max(8).optional(),
            metadata: metadata.optional(),
            tax_code: text(50).optional(),
          })
          .strict(),
      })
      .strict(),
    metadata: metadata.optional(),
  })
  .strict();

/**
 * What may be asked of a new checkout. The service takes more; what the stand-in does not do it does not take either, so that
 * nobody relies on a promise that is not kept here.
 */
export const createCheckoutParameters = z
  .object({
    ...expandable,
    mode: z.enum(['payment']),
    ui_mode: z.enum(['hosted_page']).optional(),
    line_items: z.array(lineItem).min(1).max(100),
    success_url: webAddress(),
    cancel_url: webAddress().optional(),
    client_reference_id: text(200).optional(),
    customer_email: mailAddress.optional(),
    expires_at: whole(0, 99_999_999_999).optional(),
    locale: text(10).optional(),
    metadata: metadata.optional(),
    payment_intent_data: z
      .object({ description: text(1000).optional(), metadata: metadata.optional(), statement_descriptor_suffix: text(22).optional() })
      .strict()
      .optional(),
    payment_method_types: z.array(z.enum(['card', 'sepa_debit'])).min(1).optional(),
    custom_text: z.object({ submit: z.object({ message: text(1200) }).strict().optional() }).strict().optional(),
    adaptive_pricing: z.object({ enabled: truth }).strict().optional(),
    allow_promotion_codes: neverTrue.optional(),
    automatic_tax: z.object({ enabled: neverTrue }).strict().optional(),
    invoice_creation: z.object({ enabled: neverTrue }).strict().optional(),
  })
  .strict();

export type CreateCheckoutParameters = z.output<typeof createCheckoutParameters>;

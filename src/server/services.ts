/** The ports a use-case may call, with their real adapters built from the settings. Tests hand in fakes. */
import { resolve } from 'node:path';
import { config } from '#server/config.ts';
import { DiskMediaStore, type MediaStore } from '#server/media/store.ts';
import type { PaymentService } from '#server/payments/payment-service.ts';
import { StripePaymentService } from '#server/payments/stripe-payment-service.ts';

export interface Services {
  readonly media: MediaStore;
  readonly payments: PaymentService;
}

let kept: Services | undefined;

/** The services of this process. */
export function services(): Services {
  kept ??= build();
  return kept;
}

function build(): Services {
  const { uploadsFolder, payments } = config();
  return {
    media: new DiskMediaStore(resolve(uploadsFolder)),
    payments: new StripePaymentService({ secretKey: payments.key, webhookSecrets: payments.webhookSecrets, url: payments.url }),
  };
}

/** A buyer at the payment service that is none, for tests of what stands around it. */
import { expect } from 'vitest';
import type { TypedLoom } from '#core/trial/typed-loom.ts';
import type { Series, User } from '#server/models/index.ts';
import type { Checkout } from '#server/payments/payment-service.ts';
import { FakePaymentService } from '#server/payments/payment-service.fake.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import { contextFor, contextOf, type TestContext } from './context.ts';
import { buildSeries, buildUser } from './factories.ts';

export const NO_ANSWER = { kind: 'unreachable', message: 'no answer' } as const;
export const AGREED = { startAtOnce: true, withdrawalGivenUp: true };

export interface BuyerTrial {
  readonly student: User;
  readonly series: Series;
  readonly payments: FakePaymentService;
  readonly ctx: TestContext;
  begin(loom?: TypedLoom): Promise<{ to: string }>;
  /** The checkout that was opened last. */
  checkout(): Checkout;
}

export async function buyer(): Promise<BuyerTrial> {
  const [student, series, payments] = [await buildUser(), await buildSeries(), new FakePaymentService()];
  const ctx = await contextFor(student, { payments });
  return {
    student, series, payments, ctx,
    begin: (loom) => beginCheckout(ctx, { series: series.slug, ...AGREED, loom: loom ?? null }),
    checkout: () => [...payments.checkouts.values()].at(-1) ?? expect.fail('no checkout'),
  };
}

/** Who looks at checkouts: nobody in particular. */
export const worker = (payments: FakePaymentService): TestContext => contextOf(null, { payments });

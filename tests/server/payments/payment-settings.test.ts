import { describe, expect, test } from 'vitest';
import { LIVE_HOST, problemsOfPaymentSettings, type PaymentSettings } from '#server/payments/payment-settings.ts';

const live: PaymentSettings = { secretKey: 'sk_live_1', host: LIVE_HOST, production: true, webhookSecrets: ['whsec_1'] };
const trial: PaymentSettings = { secretKey: 'sk_test_1', host: '127.0.0.1', production: false, webhookSecrets: [] };

describe('payment settings', () => {
  test.each<[string, PaymentSettings]>([
    ['a live key at the service itself', live],
    ['a test key at the stand-in', trial],
    ['a test key at the service itself, out of production', { ...trial, host: LIVE_HOST }],
    ['two secrets while one takes the other’s place', { ...live, webhookSecrets: ['whsec_1', 'whsec_2'] }],
  ])('let the house start with %s', (_what, settings) => {
    expect(problemsOfPaymentSettings(settings)).toEqual([]);
  });

  test.each<[string, PaymentSettings, RegExp]>([
    ['a live key that would go to the stand-in', { ...live, host: '127.0.0.1' }, /live payment key would be sent to 127\.0\.0\.1/],
    ['a live key that would go to the stand-in, even out of production', { ...live, host: '127.0.0.1', production: false }, /live payment key/],
    ['a restricted live key that would go elsewhere', { ...live, secretKey: 'rk_live_1', host: 'evil.example' }, /live payment key/],
    ['a test key in production', { ...trial, production: true, webhookSecrets: ['whsec_1'] }, /test payment key/],
    ['no webhook secret in production', { ...live, webhookSecrets: [] }, /webhook secret/],
    ['a webhook secret with a line break in it', { ...live, webhookSecrets: ['whsec_1\n'] }, /no spaces/],
    ['no key', { ...trial, secretKey: '' }, /missing/],
    ['a publishable key', { ...trial, secretKey: 'pk_test_1' }, /not a secret key/],
  ])('stop the house with %s', (_what, settings, reason) => {
    expect(problemsOfPaymentSettings(settings).join('; ')).toMatch(reason);
  });
});

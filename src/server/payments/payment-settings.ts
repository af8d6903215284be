/** The one host where real money moves. */
export const LIVE_HOST = 'api.stripe.com';

export interface PaymentSettings {
  readonly secretKey: string;
  /** Host that payments are asked of. */
  readonly host: string;
  /** People outside use this house. */
  readonly production: boolean;
  readonly webhookSecrets: readonly string[];
}

/**
 * What stands against starting with these settings; empty when nothing does. A live key must never leave for another
 * host, and a house in production must neither play with test money nor believe unsigned news.
 */
export function problemsOfPaymentSettings({ secretKey, host, production, webhookSecrets }: PaymentSettings): string[] {
  const live = /^[sr]k_live_/.test(secretKey);
  const test = /^[sr]k_test_/.test(secretKey);
  const problems: string[] = [];
  if (!live && !test) problems.push('The payment key is missing or is not a secret key');
  if (live && host !== LIVE_HOST) problems.push(`A live payment key would be sent to ${host}`);
  if (production && test) problems.push('A test payment key cannot take money in production');
  if (production && webhookSecrets.length === 0) problems.push('Without a webhook secret, news of payments cannot be told from forgeries');
  if (webhookSecrets.some((secret) => !/^whsec_\S+$/.test(secret))) problems.push('A webhook secret begins with whsec_ and holds no spaces');
  return problems;
}

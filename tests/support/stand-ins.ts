import { createServer, type Server } from 'node:http';
import { StripePaymentService, API_VERSION } from '#server/payments/stripe-payment-service.ts';
import type { CheckoutRequest } from '#server/payments/payment-service.ts';
import { startStandIns, type StandIns, type StandInSettings } from '#stand-ins/stand-ins.ts';
import Stripe from 'stripe';

export const WEBHOOK_SECRET = 'whsec_trial';
const TEST_KEY = 'sk_test_trial';

export interface Received {
  readonly body: string;
  readonly signature: string;
  readonly event: Stripe.Event;
}

/** A shop that listens for news, and says what it is told to. */
export class Listener {
  /** What was taken with a 200. */
  readonly received: Received[] = [];
  /** What came, taken or not. */
  readonly tried: Received[] = [];
  /** Status of the next answers; 200 when none waits. */
  readonly answers: number[] = [];
  readonly #server: Server;
  #waiting: (() => void)[] = [];

  private constructor(server: Server) {
    this.#server = server;
  }

  static async start(): Promise<Listener> {
    const server = createServer();
    const listener = new Listener(server);
    server.on('request', (request, response) => {
      const chunks: Buffer[] = [];
      request.on('data', (chunk: Buffer) => chunks.push(chunk));
      request.on('end', () => {
        const status = listener.answers.shift() ?? 200;
        const body = Buffer.concat(chunks).toString('utf8');
        const news = { body, signature: String(request.headers['stripe-signature']), event: JSON.parse(body) as Stripe.Event };
        listener.tried.push(news);
        if (status < 300) listener.received.push(news);
        response.writeHead(status).end();
        for (const wake of listener.#waiting.splice(0)) wake();
      });
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    return listener;
  }

  get url(): string {
    const address = this.#server.address();
    return `http://127.0.0.1:${typeof address === 'object' && address !== null ? address.port : 0}/api/payments/events`;
  }

  types(): string[] {
    return this.received.map(({ event }) => event.type);
  }

  /** Waits until `done` holds of what was received. */
  async until(done: (received: readonly Received[]) => boolean, withinMs = 5000): Promise<void> {
    const end = Date.now() + withinMs;
    while (!done(this.received)) {
      if (Date.now() > end) throw new Error(`Not received in time: only ${this.types().join(', ')}`);
      await new Promise<void>((resolve) => {
        const timer = setTimeout(resolve, 25);
        this.#waiting.push(() => {
          clearTimeout(timer);
          resolve();
        });
      });
    }
  }

  close(): Promise<void> {
    return new Promise((resolve) => {
      this.#server.close(() => {
        resolve();
      });
      this.#server.closeAllConnections();
    });
  }
}

export interface Trial {
  readonly standIns: StandIns;
  readonly listener: Listener;
  readonly payments: StripePaymentService;
  /** The service's own library, as anybody uses it. */
  readonly stripe: Stripe;
  close(): Promise<void>;
}

export async function startTrial(change: Partial<StandInSettings> = {}): Promise<Trial> {
  const listener = await Listener.start();
  const standIns = await startStandIns({ httpPort: 0, smtpPort: 0, webhookUrl: listener.url, webhookSecrets: [WEBHOOK_SECRET], retrySeconds: [0.05, 0.1, 0.2, 0.4], ...change });
  return {
    standIns,
    listener,
    payments: new StripePaymentService({ secretKey: TEST_KEY, webhookSecrets: [WEBHOOK_SECRET], url: standIns.url, wait: async () => undefined }),
    stripe: library(standIns.url),
    async close() {
      await standIns.close();
      await listener.close();
    },
  };
}

export function library(url: string, key = TEST_KEY): Stripe {
  const { hostname, port } = new URL(url);
  return new Stripe(key, { host: hostname, port, protocol: 'http', apiVersion: API_VERSION, maxNetworkRetries: 0, telemetry: false });
}

let orders = 0;

export function checkoutRequest(change: Partial<CheckoutRequest> = {}): CheckoutRequest {
  orders += 1;
  return {
    orderId: `order${orders}`,
    attempt: 1,
    currency: 'EUR',
    lines: [{ name: 'Low Tide: a seat', amountMinor: 6800, quantity: 1 }],
    successUrl: 'http://127.0.0.1:4321/orders/done?session={CHECKOUT_SESSION_ID}',
    cancelUrl: 'http://127.0.0.1:4321/series/low-tide',
    expiresAt: new Date((Math.floor(Date.now() / 1000) + 35 * 60) * 1000),
    ...change,
  };
}

/** A buyer without a browser: posts the pay page's form and says where it leads. */
export async function buyerDoes(address: string, fields: Readonly<Record<string, string>>): Promise<{ status: number; location: string | null; text: string }> {
  const response = await fetch(address, { method: 'POST', body: new URLSearchParams(fields), redirect: 'manual' });
  return { status: response.status, location: response.headers.get('location'), text: await response.text() };
}

export const CARD = { do: 'pay', email: 'amara@weavers.example', number: '4242 4242 4242 4242', expiry: '12/34', cvc: '123', name: 'Amara Voss', country: 'DE' };

/** The value of an answer that must have succeeded. */
export function valueOf<T>(answer: { readonly ok: true; readonly value: T } | { readonly ok: false; readonly failure: unknown }): T {
  if (!answer.ok) throw new Error(`Expected a value, got ${JSON.stringify(answer.failure)}`);
  return answer.value;
}

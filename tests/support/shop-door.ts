/**
 * The shop as the payment service knows it: an address for its news that does what the real endpoint does, and a worker
 * that goes on until nothing is left to do. For tests of buying through the library and the stand-in.
 */
import { createServer } from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import { REGISTERED } from '#server/jobs/handlers/index.ts';
import { runDueJobs } from '#server/jobs/run-due.ts';
import type { Context } from '#server/context.ts';
import { recordPaymentEvent } from '#server/use-cases/checkout/record-payment-event.ts';
import type { StandInSettings } from '#stand-ins/stand-ins.ts';
import { contextOf } from './context.ts';
import { startTrial, type Trial } from './stand-ins.ts';

export interface ShopDoor extends Trial {
  /** Nobody in particular, with the real adapter at the stand-in. */
  readonly ctx: Context;
  /** Works until no news is on its way and no job is due. */
  untilQuiet(): Promise<void>;
}

const TRIES = 60;
const LONGEST_MS = 15_000;

export async function openShopDoor(change: Partial<StandInSettings> = {}): Promise<ShopDoor> {
  const shop: { ctx?: Context } = {};
  const door = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on('data', (chunk: Buffer) => chunks.push(chunk));
    request.on('end', () => {
      const signature = request.headers['stripe-signature'];
      void (async () => {
        if (shop.ctx === undefined) return 503;
        const receipt = await recordPaymentEvent(shop.ctx, Buffer.concat(chunks).toString('utf8'), typeof signature === 'string' ? signature : null);
        return receipt.ok ? 200 : 400;
      })().catch(() => 503).then((status) => response.writeHead(status).end());
    });
  });
  await new Promise<void>((resolve) => door.listen(0, '127.0.0.1', resolve));
  const address = door.address();
  const port = typeof address === 'object' && address !== null ? address.port : 0;
  const trial = await startTrial({ webhookUrl: `http://127.0.0.1:${port}/api/payments/events`, retrySeconds: Array.from({ length: TRIES }, () => 0.05), ...change });
  const nobody = contextOf(null, { payments: trial.payments }, new Date());
  shop.ctx = nobody;
  return {
    ...trial,
    ctx: nobody,
    async untilQuiet() {
      const end = Date.now() + LONGEST_MS;
      for (let quiet = 0; quiet < 2;) {
        const worked = await runDueJobs(nobody, 'worker', REGISTERED);
        quiet = worked === 0 && trial.standIns.webhooks.counts().waiting === 0 ? quiet + 1 : 0;
        if (worked === 0) await pause(20);
        if (Date.now() > end) throw new Error(`Still at work: ${JSON.stringify(trial.standIns.webhooks.counts())}`);
      }
    },
    async close() {
      await trial.close();
      await new Promise<void>((resolve) => {
        door.close(() => { resolve(); });
        door.closeAllConnections();
      });
    },
  };
}

/** Plays the payment service and the mail server for demonstrations and trials, on this machine only. */
import { join } from 'node:path';
import { config } from '#server/config.ts';
import { startStandIns, type StandIns } from '#stand-ins/stand-ins.ts';

try {
  const { port, dataFolder, publicUrl, smtpUrl, payments } = config();
  const running = await startStandIns({
    httpPort: port + 1,
    smtpPort: Number(new URL(smtpUrl).port),
    folder: join(dataFolder, 'stand-ins'),
    webhookUrl: `${publicUrl}/api/payments/events`,
    webhookSecrets: payments.webhookSecrets,
  });
  console.log(`stand-ins ready: pay page and mail tray on ${running.url}, mail on ${running.smtpUrl}`);
  stopOnSignal(running);
} catch (error) {
  console.error(`stand-ins cannot start: ${reasonOf(error)}`);
  process.exitCode = 1;
}

function stopOnSignal(running: StandIns): void {
  let stopping = false;
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.on(signal, () => {
      if (stopping) process.exit(1);
      stopping = true;
      void running.close();
    });
  }
}

function reasonOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const taken = 'code' in error && error.code === 'EADDRINUSE' && 'port' in error;
  return taken ? `port ${String(error.port)} is taken by another program` : error.message;
}

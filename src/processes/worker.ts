/** Works through the queue and the post. Any number of these may run. */
import { config } from '#server/config.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { CHORES } from '#server/jobs/chores.ts';
import { REGISTERED } from '#server/jobs/handlers/index.ts';
import { work } from '#server/jobs/worker.ts';
import { smtpTransport } from '#server/mail/smtp-transport.ts';

const stop = new AbortController();
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => { stop.abort(); });

const transport = smtpTransport({ url: config().smtpUrl });
console.log('worker ready');
await work({
  jobs: REGISTERED,
  office: { transport, from: config().mailFrom, publicUrl: config().publicUrl, now: () => new Date(), chance: Math.random },
  chores: CHORES,
  signal: stop.signal,
});
await transport.close();
await sequelize.close();

/**
 * The web process: our own HTTP server round the built site. The site carries its own copy of src/server, with its own
 * pool of connections; so nothing here may touch models.
 */
import type { IncomingMessage, RequestListener, ServerResponse } from 'node:http';
import { createServer } from 'node:http';
import { mkdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { config } from '#server/config.ts';
import { SLOWEST_BODY_SECONDS } from '#server/web/front/body-limits.ts';
import { servingFront } from '#server/web/front/front.ts';
import { gracefulStop } from '#server/web/front/graceful-stop.ts';
import { createMetrics } from '#server/web/front/metrics.ts';
import { refuse } from '#server/web/front/refuse.ts';
import { readinessChecks } from '#server/web/readiness-checks.ts';

interface BuiltSite {
  handler(request: IncomingMessage, response: ServerResponse): Promise<void>;
}

const settings = config();
mkdirSync(settings.uploadsFolder, { recursive: true });
const site = (await import(new URL('../server/entry.mjs', import.meta.url).href)) as BuiltSite;
const metrics = createMetrics();
const readiness = readinessChecks(settings);

const listener: RequestListener = (request, response) => {
  front(request, response, (error) => {
    if (error === undefined) void site.handler(request, response);
    else refuse(request, response, 500, 'We could not do this. Nothing you made is lost.');
  });
};
// Longer than a proxy keeps its connections, so that it is never the one to find them closed.
const server = createServer({ keepAliveTimeout: 65_000, headersTimeout: 66_000, requestTimeout: (SLOWEST_BODY_SECONDS + 30) * 1_000 }, listener);
// Without this, Node tells the client to go on before its body's size has been looked at.
server.on('checkContinue', listener);
const watch = createServer((_request, response) => {
  response.writeHead(200, { 'Content-Type': 'text/plain; version=0.0.4; charset=utf-8' });
  response.end(metrics.text());
});

const { isStopping, stop } = gracefulStop([server, watch], { drainMs: settings.drainSeconds * 1_000, finishMs: 25_000 });
const front = servingFront({
  publicUrl: settings.publicUrl,
  uploadsFolder: settings.uploadsFolder,
  trustedProxies: settings.trustedProxies,
  loopback: settings.demo,
  clientFolder: fileURLToPath(new URL('../client', import.meta.url)),
  readiness: readiness.checks,
  isStopping,
  count: metrics.count,
});

async function end(): Promise<void> {
  await stop();
  await readiness.close();
  process.exit(0);
}
for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.on(signal, () => {
    if (isStopping()) process.exit(1);
    void end();
  });
}

server.listen(settings.port, settings.host, () => { console.log(`web listens on ${settings.host}:${settings.port}`); });
watch.listen(settings.port + 2, settings.host);

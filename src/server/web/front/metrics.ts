/** What the web process did, in the Prometheus text format (version 0.0.4), for whoever watches it. */
import { monitorEventLoopDelay } from 'node:perf_hooks';
import type { Handler } from '#server/web/front/handler.ts';
import { pathOf } from '#server/web/front/handler.ts';

const BUCKETS_SECONDS = [0.005, 0.01, 0.025, 0.05, 0.1, 0.25, 0.5, 1, 2.5, 5, 10, 30] as const;
const NANOSECONDS = 1e9;

interface Series {
  count: number;
  sumSeconds: number;
  /** Requests that took at most the bucket's time, one number a bucket. */
  readonly within: number[];
}

export interface Metrics {
  /** Counts every request that passes. */
  readonly count: Handler;
  /** All metrics as text. */
  text(): string;
}

/** Paths are grouped into a few kinds, or every address ever asked for would become a series of its own. */
export function kindOf(path: string): string {
  if (path.startsWith('/_astro/')) return 'static';
  if (path.startsWith('/api/')) return 'api';
  if (path.startsWith('/media/')) return 'media';
  return 'page';
}

/** The metrics of one process. */
export function createMetrics(): Metrics {
  const series = new Map<string, Series>();
  const delay = monitorEventLoopDelay({ resolution: 20 });
  delay.enable();
  let inFlight = 0;
  return {
    count: (request, response, next) => {
      const start = performance.now();
      const labels = `kind="${kindOf(pathOf(request))}",method="${methodLabel(request.method)}"`;
      inFlight += 1;
      response.once('close', () => {
        inFlight -= 1;
        record(series, `${labels},status="${response.statusCode}"`, (performance.now() - start) / 1_000);
      });
      next();
    },
    text: () => {
      const lines = [
        ...histogramText(series),
        '# TYPE fellmark_http_requests_in_flight gauge',
        `fellmark_http_requests_in_flight ${inFlight}`,
        '# TYPE fellmark_event_loop_delay_seconds gauge',
        `fellmark_event_loop_delay_seconds{quantile="0.5"} ${delay.percentile(50) / NANOSECONDS}`,
        `fellmark_event_loop_delay_seconds{quantile="0.99"} ${delay.percentile(99) / NANOSECONDS}`,
        '# TYPE process_resident_memory_bytes gauge',
        `process_resident_memory_bytes ${process.memoryUsage.rss()}`,
        '# TYPE process_uptime_seconds gauge',
        `process_uptime_seconds ${process.uptime()}`,
      ];
      // Each reading tells of the time since the last one.
      delay.reset();
      return `${lines.join('\n')}\n`;
    },
  };
}

function methodLabel(method: string | undefined): string {
  return /^(?:GET|HEAD|POST|PUT|PATCH|DELETE|OPTIONS)$/.test(method ?? '') ? String(method) : 'other';
}

function record(series: Map<string, Series>, labels: string, seconds: number): void {
  let one = series.get(labels);
  if (one === undefined) {
    one = { count: 0, sumSeconds: 0, within: BUCKETS_SECONDS.map(() => 0) };
    series.set(labels, one);
  }
  one.count += 1;
  one.sumSeconds += seconds;
  for (const [at, bound] of BUCKETS_SECONDS.entries()) {
    if (seconds <= bound) one.within[at] = (one.within[at] ?? 0) + 1;
  }
}

function histogramText(series: ReadonlyMap<string, Series>): string[] {
  const name = 'fellmark_http_request_duration_seconds';
  const lines = [`# HELP ${name} From the request's arrival to the end of its answer.`, `# TYPE ${name} histogram`];
  for (const [labels, { count, sumSeconds, within }] of series) {
    for (const [at, bound] of BUCKETS_SECONDS.entries()) lines.push(`${name}_bucket{${labels},le="${bound}"} ${within[at] ?? 0}`);
    lines.push(`${name}_bucket{${labels},le="+Inf"} ${count}`, `${name}_sum{${labels}} ${sumSeconds}`, `${name}_count{${labels}} ${count}`);
  }
  return lines;
}

// Lesson texts are parsed in threads of their own. A parser's work can be made to grow out of all proportion; the
// limits of core/lesson-text keep it small as far as we know, and this keeps it away from everybody else when we are
// wrong: a thread that takes too long or too much memory is stopped, its text refused, and the next one goes on.
import { Worker } from 'node:worker_threads';
import { LIMITS } from '#core/lesson-text/limits.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { AppError } from '#server/errors.ts';
import type { ParseResult, ThreadMessage } from './serve-parses.ts';
import { threadEntry } from './thread-entry.ts';

export interface ParsePoolOptions {
  /** File the threads run. */
  entry?: URL;
  threads?: number;
  /** Texts that may wait for a thread; one more is turned away. */
  queue?: number;
  /** Time one text may take. */
  killAfterMs?: number;
  /** Time a thread may take to come up. */
  startWithinMs?: number;
  memoryMb?: number;
}

interface Job {
  source: string;
  resolve: (result: ParseResult) => void;
  reject: (error: unknown) => void;
}

interface Thread {
  worker: Worker;
  ready: boolean;
  job: Job | undefined;
  timer: NodeJS.Timeout;
}

const BUSY = 'Many lessons are being read just now. Nothing was lost; try again in a moment.';

/** A few parsing threads and the texts that wait for them. */
export class ParsePool {
  readonly #options: Required<ParsePoolOptions>;
  readonly #threads = new Set<Thread>();
  readonly #waiting: Job[] = [];
  #closed = false;

  constructor(options: ParsePoolOptions = {}) {
    this.#options = { entry: options.entry ?? threadEntry(), threads: 2, queue: 20, killAfterMs: 2_000, startWithinMs: 15_000, memoryMb: 256, ...options };
  }

  /**
   * Parses a lesson's source as `parseLessonText` does. A text that takes too long or too much memory is refused like
   * any other. Throws AppError UNAVAILABLE when too many texts wait already, or no thread comes up.
   */
  parse(source: string): Promise<ParseResult> {
    if (this.#closed) return Promise.reject(new AppError('UNAVAILABLE', { message: 'The parsing threads are closed.' }));
    // Refused by its length alone; not worth carrying over to a thread.
    if (source.length > 2 * LIMITS.sourceLength) return Promise.resolve(parseLessonText(source));
    if (this.#waiting.length >= this.#options.queue) return Promise.reject(new AppError('UNAVAILABLE', { says: BUSY, retryAfterSeconds: 2 }));
    return new Promise((resolve, reject) => {
      this.#waiting.push({ source, resolve, reject });
      this.#serve();
    });
  }

  /** Stops all threads. Texts still waiting are turned away. */
  async close(): Promise<void> {
    this.#closed = true;
    const threads = [...this.#threads];
    for (const thread of threads) this.#drop(thread, () => new AppError('UNAVAILABLE', { message: 'The parsing threads were closed.' }));
    for (const job of this.#waiting.splice(0)) job.reject(new AppError('UNAVAILABLE', { says: BUSY }));
    await Promise.all(threads.map((thread) => thread.worker.terminate()));
  }

  /** Gives waiting texts to idle threads, and starts threads as long as there are too few. */
  #serve(): void {
    for (const thread of this.#threads) {
      if (!thread.ready || thread.job !== undefined) continue;
      const job = this.#waiting.shift();
      if (job === undefined) return;
      this.#give(thread, job);
    }
    const starting = [...this.#threads].filter((thread) => !thread.ready).length;
    if (this.#waiting.length > starting && this.#threads.size < this.#options.threads) this.#start();
  }

  #start(): void {
    const worker = new Worker(this.#options.entry, {
      execArgv: [],
      resourceLimits: { maxOldGenerationSizeMb: this.#options.memoryMb, maxYoungGenerationSizeMb: this.#options.memoryMb / 4, stackSizeMb: 4 },
    });
    const timer = setTimeout(() => {
      this.#failToStart(thread, new Error('A parsing thread did not come up in time.'));
    }, this.#options.startWithinMs);
    const thread: Thread = { worker, ready: false, job: undefined, timer };
    this.#threads.add(thread);
    worker.on('message', (message: ThreadMessage) => {
      this.#hear(thread, message);
    });
    worker.on('error', (error) => {
      if (!thread.ready) this.#failToStart(thread, error);
      else if (isOutOfMemory(error)) this.#stop(thread);
      else this.#drop(thread, () => error);
    });
    worker.on('exit', () => {
      this.#drop(thread, () => new Error('A parsing thread ended by itself.'));
    });
    this.#serve();
  }

  #hear(thread: Thread, message: ThreadMessage): void {
    clearTimeout(thread.timer);
    if (message.kind === 'ready') thread.ready = true;
    else {
      const { job } = thread;
      thread.job = undefined;
      job?.resolve(message.result);
    }
    // An idle thread does not keep the process alive.
    thread.worker.unref();
    this.#serve();
  }

  #give(thread: Thread, job: Job): void {
    thread.job = job;
    thread.worker.ref();
    thread.timer = setTimeout(() => {
      this.#stop(thread);
    }, this.#options.killAfterMs);
    thread.worker.postMessage(job.source);
  }

  /** Ends a thread whose text was too much, and refuses that text. */
  #stop(thread: Thread): void {
    const { job } = thread;
    thread.job = undefined;
    job?.resolve(tooSlow());
    this.#drop(thread, () => undefined);
  }

  /** One waiting text pays for a thread that does not start; else all would wait for ever. */
  #failToStart(thread: Thread, cause: unknown): void {
    if (!this.#threads.has(thread)) return;
    this.#waiting.shift()?.reject(new AppError('UNAVAILABLE', { message: 'No parsing thread comes up.', cause }));
    this.#drop(thread, () => cause);
  }

  #drop(thread: Thread, reason: () => unknown): void {
    if (!this.#threads.delete(thread)) return;
    clearTimeout(thread.timer);
    thread.job?.reject(reason());
    thread.job = undefined;
    void thread.worker.terminate();
    if (!this.#closed) this.#serve();
  }
}

function tooSlow(): ParseResult {
  return { ok: false, problems: [{ line: 1, column: 1, code: 'too-slow', reason: 'This text takes too long to read. Look for very long runs of signs such as *, [ or `, and divide the text into two parts.' }] };
}

function isOutOfMemory(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY';
}

let kept: ParsePool | undefined;

/** Parses a lesson's source in the threads of this process. See `ParsePool.parse`. */
export function readLessonText(source: string): Promise<ParseResult> {
  kept ??= new ParsePool();
  return kept.parse(source);
}

import type { TextRemarks } from '#contracts/workroom.ts';

/** The limits of a text keep its reading far below this; a reading that takes longer is given up, and the next one tried anew. */
const LONGEST_READING_MS = 5_000;

interface Asked {
  readonly source: string;
  readonly answer: (remarks: TextRemarks | null) => void;
}

/** Reads texts one at a time and as they stand last: of several that wait, only the newest is read. */
export class Reader {
  #worker: Worker | null = null;
  #now: Asked | null = null;
  #next: Asked | null = null;
  #timer: ReturnType<typeof setTimeout> | undefined;

  /** Null when a newer text came in the meantime, or when this one could not be read. */
  read(source: string): Promise<TextRemarks | null> {
    return new Promise((answer) => {
      this.#next?.answer(null);
      this.#next = { source, answer };
      this.#begin();
    });
  }

  close(): void {
    this.#stop();
    this.#next?.answer(null);
    this.#next = null;
  }

  #begin(): void {
    if (this.#now !== null || this.#next === null) return;
    this.#now = this.#next;
    this.#next = null;
    this.#worker ??= this.#hire();
    this.#timer = setTimeout(() => this.#stop(), LONGEST_READING_MS);
    this.#worker.postMessage(this.#now.source);
  }

  #hire(): Worker {
    const worker = new Worker(new URL('./reading-worker.ts', import.meta.url), { type: 'module' });
    worker.onmessage = ({ data }: MessageEvent<TextRemarks>) => this.#end(data);
    worker.onerror = () => this.#stop();
    return worker;
  }

  #stop(): void {
    this.#worker?.terminate();
    this.#worker = null;
    this.#end(null);
  }

  #end(remarks: TextRemarks | null): void {
    clearTimeout(this.#timer);
    const done = this.#now;
    this.#now = null;
    done?.answer(this.#next === null ? remarks : null);
    this.#begin();
  }
}

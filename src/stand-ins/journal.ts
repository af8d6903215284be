import { appendFileSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { z } from 'astro/zod';

const Line = z.object({ kind: z.string(), id: z.string(), value: z.unknown() });

/** One thing as it stands after a change; `value: null` takes it away. */
export interface JournalLine {
  readonly kind: string;
  readonly id: string;
  readonly value: unknown;
}

/**
 * A file of JSON lines that grows by one line for every change, so that what a stand-in knows outlives its process.
 * Without a file name nothing is kept.
 */
export class Journal {
  readonly #file: string | undefined;

  constructor(file: string | undefined) {
    this.#file = file;
    if (file !== undefined) mkdirSync(dirname(file), { recursive: true });
  }

  /** The last line of every thing, oldest thing first. A line cut off by a crash is passed over. */
  read(): JournalLine[] {
    if (this.#file === undefined || !existsSync(this.#file)) return [];
    const last = new Map<string, JournalLine>();
    for (const text of readFileSync(this.#file, 'utf8').split('\n')) {
      const line = readLine(text);
      if (!line) continue;
      const name = `${line.kind} ${line.id}`;
      if (line.value === null) last.delete(name);
      else last.set(name, line);
    }
    return [...last.values()];
  }

  append(line: JournalLine): void {
    if (this.#file !== undefined) appendFileSync(this.#file, `${JSON.stringify(line)}\n`);
  }

  /** Writes the file anew with these lines only, in one step. */
  compact(lines: readonly JournalLine[]): void {
    if (this.#file === undefined) return;
    const next = `${this.#file}.next`;
    writeFileSync(next, lines.map((line) => `${JSON.stringify(line)}\n`).join(''));
    renameSync(next, this.#file);
  }
}

function readLine(text: string): JournalLine | undefined {
  if (text === '') return undefined;
  try {
    const { kind, id, value } = Line.parse(JSON.parse(text));
    return { kind, id, value };
  } catch {
    return undefined;
  }
}

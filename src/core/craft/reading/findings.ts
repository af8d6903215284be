/**
 * What was found while reading and reckoning a person's input: problems that stop the
 * work and warnings that come with the answer.
 *
 * Which code stands for what:
 * - `E_NUM` not a finite number: missing, text, boolean, NaN, infinite, an unreadable count
 * - `E_RANGE` a number, a text's length or a list's length outside what works
 * - `E_COUNT` a whole number expected
 * - `E_ENUM` not one of the known choices; also an unknown key, a missing or wrongly made
 *   text, list or group of values, and a yarn role the piece does not have
 * - `E_JAM` yarns too thick for the room they have
 * - `E_FIT` does not fit: piece and loom, bands and height, shape and band
 * - `E_PARITY` a pinned number of ends that the pattern or doubling forbids
 */
import type { Outcome, Problem } from '#core/outcome.ts';
import { fail, succeed } from '#core/outcome.ts';
import { inchesText, MM_PER_INCH, toInches } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

export type ErrorCode = 'E_NUM' | 'E_RANGE' | 'E_ENUM' | 'E_JAM' | 'E_FIT' | 'E_PARITY' | 'E_COUNT';

/** Every craft has warnings of its own: a stable name for programs, told apart from problems by its first letter. */
export type WarningCode = `W_${string}`;

export class Findings {
  readonly #problems: Map<string, Problem>;
  readonly #warnings: Problem[];
  readonly #prefix: string;

  private constructor(
    /** Those in which messages name lengths. */
    readonly units: Units,
    problems: Map<string, Problem>,
    warnings: Problem[],
    prefix: string,
  ) {
    this.#problems = problems;
    this.#warnings = warnings;
    this.#prefix = prefix;
  }

  static in(units: Units): Findings {
    return new Findings(units, new Map(), [], '');
  }

  /** The same findings, for a part that lies at `path` and knows nothing of what lies round it. */
  within(path: string): Findings {
    return new Findings(this.units, this.#problems, this.#warnings, `${this.#prefix}${path}`);
  }

  /** One problem for each place: the first one found there stands. */
  reject(code: ErrorCode, path: string, message: string): void {
    const full = `${this.#prefix}${path}`;
    if (!this.#problems.has(full)) this.#problems.set(full, { code, path: full, message });
  }

  warn(code: WarningCode, path: string, message: string): void {
    this.#warnings.push({ code, path: `${this.#prefix}${path}`, message });
  }

  get count(): number {
    return this.#problems.size;
  }

  get warnings(): readonly Problem[] {
    return this.#warnings;
  }

  /** What `read` answers, or undefined if it found a problem on its way. */
  soundly<T>(read: () => T): T | undefined {
    const before = this.count;
    const value = read();
    return this.count === before ? value : undefined;
  }

  /** The value with all warnings, or all problems. A missing value needs at least one problem. */
  outcome<T>(value: T | undefined): Outcome<T> {
    if (this.count > 0 || value === undefined) return fail([...this.#problems.values()]);
    return succeed(value, this.#warnings);
  }

  /** A length for a message: millimetres below ten centimetres, metres from five, else centimetres; or inches. */
  length(mm: number, round: Rounding = 'nearest'): string {
    if (this.units === 'in') {
      const inches = round === 'down' ? Math.floor((mm / MM_PER_INCH) * 16 + 1e-9) / 16 : mm / MM_PER_INCH;
      return `${inchesText(toInches(inches, 16, round === 'up' ? 'up' : 'nearest'))} in`;
    }
    const whole = ROUNDINGS[round];
    if (mm < 100) return `${String(whole(mm * 10) / 10)} mm`;
    return mm < 5000 ? `${String(whole(mm) / 10)} cm` : `${String(whole(mm / 10) / 100)} m`;
  }
}

type Rounding = 'nearest' | 'up' | 'down';

const ROUNDINGS: Readonly<Record<Rounding, (x: number) => number>> = {
  nearest: Math.round,
  up: (x) => Math.ceil(x - 1e-9),
  down: (x) => Math.floor(x + 1e-9),
};

/** JSON pointer of a key or index below `path` (RFC 6901). */
export function below(path: string, key: string | number): string {
  return `${path}/${String(key).replaceAll('~', '~0').replaceAll('/', '~1')}`;
}

/**
 * What core functions answer when a person's input may be wrong: the value with
 * its warnings, or the problems that stand in the way. Exceptions are kept for
 * programmers' mistakes.
 */

/** One thing that is wrong, or worth knowing, about one place of the input. */
export interface Problem {
  /** Stable name for programs: `E_…` stops the work, `W_…` comes along with the answer. */
  readonly code: string;
  /** JSON pointer (RFC 6901) to the value meant; `''` is the whole input. */
  readonly path: string;
  /** One or two plain sentences for the person: what is wrong and what works. */
  readonly message: string;
}

export interface Success<T> {
  readonly ok: true;
  readonly value: T;
  readonly warnings: readonly Problem[];
}

export interface Failure {
  readonly ok: false;
  /** At least one. */
  readonly problems: readonly Problem[];
}

export type Outcome<T> = Success<T> | Failure;

export function succeed<T>(value: T, warnings: readonly Problem[] = []): Success<T> {
  return { ok: true, value, warnings };
}

export function fail(problems: readonly Problem[]): Failure {
  return { ok: false, problems };
}

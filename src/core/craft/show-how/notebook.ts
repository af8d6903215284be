/** The workings of one reckoning, written down in the order in which they were got. */
import type { Working, WorkingInput, WorkingUnit } from '#core/craft/show-how/working.ts';
import { leastTrust, type Trust } from '#core/craft/trust.ts';

interface Step extends Omit<Working, 'trust'> {
  /** Of the formula itself; `counted`, which is exact, when missing. */
  readonly trust?: Trust;
}

export class Notebook {
  readonly #workings = new Map<string, Working>();

  /** @throws if another working has that id, which is a programmer's mistake */
  note({ trust, ...step }: Step): Working {
    if (this.#workings.has(step.id)) throw new Error(`two workings are called ${step.id}`);
    const weighing = step.inputs.filter(({ weighs }) => weighs !== false);
    const working: Working = { ...step, trust: leastTrust(trust ?? 'counted', ...weighing.map((input) => input.trust)) };
    this.#workings.set(step.id, working);
    return working;
  }

  get workings(): readonly Working[] {
    return [...this.#workings.values()];
  }
}

type Weight = Pick<WorkingInput, 'weighs'>;

/** Settled by doing it, or so slight that it does not make the result less sure. */
export const WEIGHS_NOTHING: Weight = { weighs: false };

/** What an earlier working gave. */
export function from(symbol: string, { id, name, value, unit, trust }: Working, weight: Weight = {}): WorkingInput {
  return { symbol, name, value, unit, from: id, trust, ...weight };
}

interface Number {
  readonly symbol: string;
  readonly name: string;
  readonly value: number;
  readonly unit: WorkingUnit;
}

/** What the person gave at `path`. */
export function given(number: Number, path: string, trust: Trust, weight: Weight = {}): WorkingInput {
  return { ...number, path, trust, ...weight };
}

/** A default, or a number a rule brings along. */
export function standing(number: Number, { source, trust }: Standing, weight: Weight = {}): WorkingInput {
  return { ...number, source, trust, ...weight };
}

/** Where a number or a formula that nobody gave comes from. */
export interface Standing {
  readonly source: string;
  readonly trust: Trust;
}

/** Numbers added up, each under its own symbol; nothing at all comes to 0. */
export function sumOf(inputs: readonly WorkingInput[]): string {
  return inputs.length === 0 ? '0' : inputs.map(({ symbol }) => symbol).join(' + ');
}

/** Holding workings to what they say: the formula's text gives the value, and every input comes from somewhere. */
import { compile, type EvalFunction } from 'mathjs';
import { expect } from 'vitest';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import type { Outcome } from '#core/outcome.ts';

export function workingsOf(outcome: Outcome<readonly Working[]>): readonly Working[] {
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  return outcome.value;
}

const compiled = new Map<string, EvalFunction>();

function evaluated({ formula, inputs }: Working): number {
  const code = compiled.get(formula) ?? compile(formula);
  compiled.set(formula, code);
  const value: unknown = code.evaluate(Object.fromEntries(inputs.map((input) => [input.symbol, input.value])));
  return Number(value);
}

/** What stands at a JSON pointer. */
function at(question: unknown, pointer: string): unknown {
  const keys = pointer.split('/').slice(1).map((key) => key.replaceAll('~1', '/').replaceAll('~0', '~'));
  return keys.reduce<unknown>((value, key) => (typeof value === 'object' && value !== null ? (value as Record<string, unknown>)[key] : undefined), question);
}

function originFault(input: WorkingInput, earlier: ReadonlyMap<string, Working>, question: unknown): string | undefined {
  const origins = [input.from, input.path, input.source].filter((origin) => origin !== undefined);
  if (origins.length !== 1) return `${input.symbol} comes from ${String(origins.length)} places`;
  if (input.path !== undefined && at(question, input.path) !== input.value) return `${input.symbol} is not what was given at ${input.path}`;
  if (input.from === undefined) return undefined;
  const source = earlier.get(input.from);
  if (source === undefined) return `${input.symbol} comes from ${input.from}, which is not known yet`;
  return source.value === input.value && source.unit === input.unit && source.trust === input.trust ? undefined : `${input.symbol} is not ${input.from}`;
}

/** Every fault of the workings of this question, in words. */
export function faultsOf(workings: readonly Working[], question: unknown): readonly string[] {
  const earlier = new Map<string, Working>();
  return workings.flatMap((working) => {
    const symbols = working.inputs.map(({ symbol }) => symbol);
    const faults = working.inputs.flatMap((input) => originFault(input, earlier, question) ?? []);
    if (new Set(symbols).size < symbols.length) faults.push('two inputs have one symbol');
    const idle = symbols.filter((symbol) => !new RegExp(`\\b${symbol}\\b`, 'u').test(working.formula));
    if (idle.length > 0) faults.push(`${idle.join()} is not in the formula`);
    const value = evaluated(working);
    if (!(Math.abs(value - working.value) <= 1e-9 * Math.max(1, Math.abs(working.value)))) faults.push(`${working.formula} gives ${String(value)}, not ${String(working.value)}`);
    earlier.set(working.id, working);
    return faults.map((fault) => `${working.id}: ${fault}`);
  });
}

/** Every number of a plan or an answer, by its path in it. */
export function numbersIn(value: unknown, path = ''): readonly (readonly [string, number])[] {
  if (typeof value === 'number') return [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => numbersIn(inner, path === '' ? key : `${path}.${key}`));
}

export function expectReachable(workings: readonly Working[], answer: unknown, except = /^$/u): void {
  const byId = new Map(workings.map((working) => [working.id, working.value]));
  const missing = numbersIn(answer).filter(([path, value]) => !except.test(path) && byId.get(path) !== value);
  expect(missing.map(([path, value]) => `${path} = ${String(value)}, here ${String(byId.get(path))}`)).toEqual([]);
}

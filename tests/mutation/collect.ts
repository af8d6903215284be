/**
 * Stands in for Vitest in the mutation run: the same words, which only collect what there is to run. Tests of the craft
 * use no more of Vitest than this; hooks are not among it.
 */
import { chai, JestAsymmetricMatchers, JestChaiExpect, JestExtend } from '@vitest/expect';
import fc from 'fast-check';
import { cases } from '../support/random-cases.ts';

interface CollectedTest {
  /** `tests/reference/crimp.test.ts > jamming > ends closer than both yarns together`, with its number. */
  readonly id: string;
  readonly run: () => unknown;
}

type Body = (...given: unknown[]) => unknown;

export const collected: CollectedTest[] = [];
let path: readonly string[] = [];

/** What is defined from now on belongs to this file. */
export function beginFile(name: string): void {
  path = [name];
}

function group(name: string, define: () => unknown): void {
  const outer = path;
  path = [...outer, name];
  define();
  path = outer;
}

function add(name: string, run: () => unknown): void {
  collected.push({ id: [...path, name, `#${String(collected.length)}`].join(' > '), run });
}

const forEach = (define: (name: string, body: () => unknown) => void) => (rows: readonly unknown[]) => (name: string, body: Body): void => {
  for (const row of rows) define(name, () => (Array.isArray(row) ? body(...(row as unknown[])) : body(row)));
};

export const describe = Object.assign(group, { each: forEach(group) });
export const test = Object.assign(add, { each: forEach(add) });
export const it = test;

/** One case that fails is enough to notice a change; the smallest such case is not looked for. */
fc.configureGlobal({ endOnFailure: true, numRuns: cases(100) });

for (const plugin of [JestExtend, JestChaiExpect, JestAsymmetricMatchers]) chai.use(plugin);
export const { expect } = chai;

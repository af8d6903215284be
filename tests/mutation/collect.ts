/**
 * Stands in for Vitest in the mutation run: the same words, which only collect what there is to run. Tests of the craft
 * use no more of Vitest than this; hooks are not among it.
 */
import { chai, JestAsymmetricMatchers, JestChaiExpect, JestExtend } from '@vitest/expect';
import fc from 'fast-check';
import { cases } from '../support/random-cases.ts';

interface CollectedTest {
  /** `tests/reference/crimp.test.ts > jamming > ends closer than both yarns together`, numbered from its second case on. */
  readonly id: string;
  readonly run: () => unknown;
}

type Body = (...given: unknown[]) => unknown;

export const collected: CollectedTest[] = [];
let path: readonly string[] = [];
/** How often each name came: the number is of the name, so that a test added elsewhere leaves what is known of this one. */
const times = new Map<string, number>();

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
  const full = [...path, name].join(' > ');
  const before = times.get(full) ?? 0;
  times.set(full, before + 1);
  collected.push({ id: before === 0 ? full : `${full} #${String(before + 1)}`, run });
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

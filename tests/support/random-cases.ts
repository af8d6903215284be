/**
 * How many random cases a property tries: `usual`, or the share of it that FELLMARK_TEST_CASES asks for. The mutation
 * run asks for few, as it runs the tests once for every changed line.
 */
export function cases(usual: number): number {
  return Math.ceil(usual * Number(process.env.FELLMARK_TEST_CASES ?? 1));
}

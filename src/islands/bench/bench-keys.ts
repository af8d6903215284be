/** Every key of the bench with what it does: the one list that is obeyed and shown. */

export const BENCH_KEYS = [
  { key: 'w', cap: 'W', says: 'Weave on' },
  { key: 'm', cap: 'M', says: 'Mend first' },
  { key: 'z', cap: 'Z', says: 'Take the last verdict back, within ten seconds' },
  { key: 'j', cap: 'J', says: 'Next photo' },
  { key: 'k', cap: 'K', says: 'Back to the one before' },
  { key: 'n', cap: 'N', says: 'The next of several photos shown together' },
  { key: 'p', cap: 'P', says: 'Put a pin; arrows move it, with Shift further; Enter goes to its words' },
  { key: 't', cap: 'T', says: 'Write to the student' },
  { key: 'c', cap: 'C', says: 'Lay an earlier photo beside it; again for one before that' },
  { key: 'r', cap: 'R', says: 'Turn by a quarter' },
  { key: '+', cap: '+', says: 'Closer; arrows move the photo then' },
  { key: '-', cap: '−', says: 'Further' },
  { key: '0', cap: '0', says: 'The whole photo' },
  { key: '?', cap: '?', says: 'This list' },
] as const;

export type BenchKey = (typeof BENCH_KEYS)[number]['key'];

/** The key of the bench that was pressed, by what it prints; undefined for others. */
export function benchKeyOf(printed: string): BenchKey | undefined {
  const meant = printed === '=' ? '+' : printed.toLowerCase();
  return BENCH_KEYS.find(({ key }) => key === meant)?.key;
}

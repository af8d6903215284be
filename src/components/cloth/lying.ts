/** The lying strip in a row of the table of students, in pixels. */
export const LYING = { length: 150, thickness: 26 } as const;

export const lyingId = (series: number, state: 'woven' | 'bare'): string => `lying-${String(series)}-${state}`;

/** Objects whose missing values are truly missing, not keys that hold undefined. */
type KeysThatMayMiss<T> = { [K in keyof T]-?: undefined extends T[K] ? K : never }[keyof T];

export type Present<T> = Omit<T, KeysThatMayMiss<T>> & { [K in KeysThatMayMiss<T>]?: Exclude<T[K], undefined> };

export function present<T extends object>(record: T): Present<T>;
export function present(record: object): object {
  return Object.fromEntries(Object.entries(record).filter(([, value]) => value !== undefined));
}

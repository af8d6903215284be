/** What may come after a finished series: more by its teacher, else what uses the same techniques. Nothing is promoted. */

export interface SeriesToFollow {
  readonly slug: string;
  readonly handle: string;
  readonly techniques: readonly string[];
}

export interface Suggested<S extends SeriesToFollow> {
  readonly series: S;
  readonly byTeacher: boolean;
  /** Techniques of both, as the suggested one writes them. */
  readonly shared: readonly string[];
}

const plain = (technique: string): string => technique.trim().toLowerCase();

/**
 * The teacher's own first, then by the number of techniques in common, else in the order given. One that has neither in
 * common with what was finished is not suggested, nor one she has.
 * @param had slugs of what she has a seat in, the finished one among them
 */
export function nextSeries<S extends SeriesToFollow>(finished: SeriesToFollow, open: readonly S[], had: ReadonlySet<string>, most: number): Suggested<S>[] {
  const learned = new Set(finished.techniques.map(plain));
  return open
    .filter(({ slug }) => slug !== finished.slug && !had.has(slug))
    .map((series) => ({ series, byTeacher: series.handle === finished.handle, shared: series.techniques.filter((technique) => learned.has(plain(technique))) }))
    .filter(({ byTeacher, shared }) => byTeacher || shared.length > 0)
    .toSorted((a, b) => Number(b.byTeacher) - Number(a.byTeacher) || b.shared.length - a.shared.length)
    .slice(0, most);
}

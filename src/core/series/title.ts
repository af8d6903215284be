/** A series' title may carry a second half after a colon: "Low Tide: a woven wall hanging in seven parts". */
export interface TitleHalves {
  readonly name: string;
  /** Begins with a capital; empty when there is no colon. */
  readonly rest: string;
}

export function titleHalves(title: string): TitleHalves {
  const at = title.indexOf(': ');
  if (at <= 0) return { name: title, rest: '' };
  const rest = title.slice(at + 2).trim();
  return { name: title.slice(0, at).trim(), rest: `${rest.charAt(0).toUpperCase()}${rest.slice(1)}` };
}

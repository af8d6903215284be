/** What somebody is told, said once: laid out as a letter and drawn in her page from the same pieces. */

/** A stretch of words in one look. `href` is a path of this site or an address elsewhere. */
export interface Run {
  readonly words: string;
  readonly strong?: true | undefined;
  readonly href?: string | undefined;
}

export type SaidBlock =
  | { readonly kind: 'words'; readonly words: string }
  | { readonly kind: 'rows'; readonly rows: readonly (readonly [label: string, value: string])[] }
  | { readonly kind: 'list'; readonly items: readonly string[] }
  /** A paragraph a person wrote, with links and stress. */
  | { readonly kind: 'prose'; readonly runs: readonly Run[] }
  | { readonly kind: 'points'; readonly items: readonly (readonly Run[])[] };

/** `answer`: to a question of hers. `folder`: of a series, which came in or did not. */
export const TOLD_KINDS = ['notice', 'nudge', 'opening', 'verdict', 'seat', 'answer', 'folder'] as const;
export type ToldKind = (typeof TOLD_KINDS)[number];

export interface Said {
  readonly title: string;
  /** Who says it: `Ilse Marrow, Low Tide`. Empty for the house itself. */
  readonly from: string;
  readonly blocks: readonly SaidBlock[];
  /** The one thing to do; a path of this site. */
  readonly act: { readonly label: string; readonly href: string } | null;
}

// The states a thing can be in, each with its class and its glyph.
import type { GlyphName } from '#islands/ui/glyphs.ts';

export type FlagKind = 'waits' | 'on' | 'mend' | 'opens' | 'held' | 'here';

export const flagKinds: Readonly<Record<FlagKind, { readonly class: string; readonly glyph: GlyphName }>> = {
  waits: { class: 'flag flag-wait', glyph: 'waits' },
  on: { class: 'flag flag-on', glyph: 'on' },
  mend: { class: 'flag flag-mend', glyph: 'mend' },
  opens: { class: 'flag flag-opens', glyph: 'opens' },
  held: { class: 'flag flag-held', glyph: 'held' },
  here: { class: 'flag flag-here', glyph: 'here' },
};

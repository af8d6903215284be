import { glyphs, glyphSizes, type GlyphName, type GlyphSize } from '#islands/ui/glyphs.ts';

/** One glyph of the house, 20 px unless told; decorative unless it has a label. */
export function Glyph({ name, size = 20, label }: { name: GlyphName; size?: GlyphSize; label?: string }) {
  const said = label === undefined ? { 'aria-hidden': true } : { role: 'img', 'aria-label': label };
  return (
    <svg className={glyphSizes[size]} viewBox="0 0 20 20" {...said}>
      <path d={glyphs[name]} />
    </svg>
  );
}

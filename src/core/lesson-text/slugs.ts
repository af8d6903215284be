// Names for headings, made from their words.

/** Words as a name: small letters and digits of any script, joined by hyphens, at most 64 characters. */
export function slugOf(words: string): string {
  const joined = words
    .normalize('NFC')
    .toLowerCase()
    .replace(/['\u2019]/gu, '')
    .replace(/[^\p{L}\p{N}]+/gu, '-');
  const cut = joined.startsWith('-') ? joined.slice(1) : joined;
  const short = [...cut].slice(0, 64).join('');
  const slug = short.endsWith('-') ? short.slice(0, -1) : short;
  return slug === '' ? 'section' : slug;
}

/** Words as a name of plain letters `a` to `z`, digits and single hyphens within, of at most `most` characters; `otherwise` when nothing is left. */
export function plainSlug(words: string, most: number, otherwise: string): string {
  return slugOf(words).replace(/[^a-z0-9-]/g, '').replace(/-{2,}/g, '-').slice(0, most).replace(/^-|-$/g, '') || otherwise;
}

/** The slug of `words`, with a number behind it when `taken` has it already; adds it to `taken`. */
export function uniqueSlug(words: string, taken: Set<string>): string {
  const base = slugOf(words);
  let slug = base;
  for (let number = 2; taken.has(slug); number += 1) slug = `${base}-${String(number)}`;
  taken.add(slug);
  return slug;
}

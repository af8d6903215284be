/**
 * Which bands of the piece each part weaves, as told by the parts' own texts: a part that speaks of a band's rows, knots
 * or height weaves it. A part that only plans speaks of all bands at once, so the part that speaks of the fewest wins.
 */
import type { PartStretch } from '#core/craft/cloth/parts-strip.ts';
import type { Piece } from '#core/craft/crafts.ts';

const BAND_KEY = /^band\.([a-z0-9-]+)\./;

function bandsNamed(amountKeys: readonly string[]): ReadonlySet<string> {
  return new Set(amountKeys.flatMap((key) => BAND_KEY.exec(key)?.[1] ?? []));
}

/**
 * One stretch for each part, bands by their place in the piece. Parts never weave backwards: a band belongs to the part
 * of the band before it, or to a later one. A band of which no text speaks is woven with the one before it.
 * @param amountKeys of each part's text, in the order of the parts
 * @returns null when no text names a band, so that nothing can be told
 */
export function bandsByPart(bands: readonly { readonly name?: string | undefined }[], amountKeys: readonly (readonly string[])[]): PartStretch[] | null {
  const named = amountKeys.map(bandsNamed);
  const found = bands.map(({ name }) => (name === undefined ? undefined : mostGiven(name, named)));
  const first = found.find((part) => part !== undefined);
  if (first === undefined) return null;
  const stretches: number[][] = amountKeys.map(() => []);
  let at = first;
  found.forEach((part, index) => {
    at = Math.max(at, part ?? at);
    stretches[at]?.push(index);
  });
  return stretches.map((own) => ({ bands: own }));
}

/** The part that speaks of this band and of the fewest others. */
function mostGiven(name: string, named: readonly ReadonlySet<string>[]): number | undefined {
  let best: number | undefined;
  named.forEach((bands, part) => {
    if (bands.has(name) && (best === undefined || bands.size < (named[best]?.size ?? 0))) best = part;
  });
  return best;
}

/** The same, of a piece of any craft: null also where the craft knows no bands. */
export function stretchesOf(piece: Piece, amountKeys: readonly (readonly string[])[]): PartStretch[] | null {
  return 'bands' in piece ? bandsByPart(piece.bands, amountKeys) : null;
}

// What a drawn cloth holds: the paths in a colour, whether they stand where they are used or are kept in `defs`.

export interface DrawnStroke {
  readonly d: string;
  readonly dash: readonly number[];
}

/** All strokes in a colour, as they come in the drawing. */
export function strokesIn(svg: string, colour: string): DrawnStroke[] {
  const kept = new Map([...svg.matchAll(/<path id="([^"]+)" d="([^"]+)"\/>/g)].map(([, id = '', d = '']) => [id, d]));
  return [...svg.matchAll(/<(?:use href="#([^"]+)"|path d="([^"]+)") ([^>]*)>/g)].flatMap(([, id, d, look = '']) => {
    if (!look.includes(`stroke="${colour}"`)) return [];
    const [, dash = ''] = /stroke-dasharray="([^"]+)"/.exec(look) ?? [];
    return [{ d: d ?? kept.get(id ?? '') ?? '', dash: dash === '' ? [] : dash.split(' ').map(Number) }];
  });
}

/** How many separate lines a path has. */
export const linesOf = (d: string): number => d.split('M').length - 1;

/** Where the lines of a path begin, in pixels from the left. */
export const begins = (d: string): number[] => [...d.matchAll(/M(-?[\d.]+) /g)].map(([, x]) => Number(x));

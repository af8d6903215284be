import { plainSlug } from '#core/lesson-text/slugs.ts';
import { SeriesMedia } from '#server/models/index.ts';

/** A name for a new video or picture that nothing in the series has yet, made of its title: `rya-fringe`, `rya-fringe-2`. */
export async function freeName(seriesId: number, title: string, nameless = 'video'): Promise<string> {
  const base = plainSlug(title, 56, nameless);
  const taken = new Set((await SeriesMedia.findAll({ where: { seriesId }, attributes: ['name'] })).map(({ name }) => name));
  for (let number = 1; ; number += 1) {
    const name = number === 1 ? base : `${base}-${number}`;
    if (!taken.has(name)) return name;
  }
}

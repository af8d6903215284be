/** Which drawn part of a preview belongs to a place in the text. */
import { uniqueSlug } from '#core/lesson-text/slugs.ts';
import { headingAnchor, stepAnchor } from '#core/lesson-text/tree.ts';

/** Id of the heading or step that stands last before `place`; null when none does. */
export function anchorAt(source: string, place: number): string | null {
  const taken = new Set<string>();
  let anchor: string | null = null;
  for (const [, heading, step] of source.slice(0, lineEnd(source, place)).matchAll(/^(?:#{2,4}[ \t]+(.+)|<Step\s[^>]*?id="([\w-]+)")/gm)) {
    if (heading !== undefined) anchor = headingAnchor(uniqueSlug(heading.replace(/[*_`~]|<[^>]*>/g, ''), taken));
    else if (step !== undefined) anchor = stepAnchor(step);
  }
  return anchor;
}

function lineEnd(source: string, place: number): number {
  const end = source.indexOf('\n', place);
  return end === -1 ? source.length : end;
}

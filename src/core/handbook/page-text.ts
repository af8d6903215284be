/** A handbook page taken apart: its sections, the addresses of their headings, its plain words. */

export interface HandbookSection {
  /** Address of the heading on its page; undefined before the first one. */
  readonly id: string | undefined;
  readonly heading: string;
  /** What is read under it, without marks, tags and addresses. */
  readonly words: string;
}

/**
 * The id a heading gets on its page. Written as the page's own renderer writes it (GitHub's way: small letters, hyphens
 * for spaces, other signs left out); a heading that is said twice on a page gets a number there and is not to be linked.
 */
export function headingId(heading: string): string {
  return heading.trim().toLowerCase().replaceAll(/[^\p{L}\p{N}\s_-]/gu, '').replaceAll(/\s/gu, '-');
}

const HEADING = /^#{2,3} (?<heading>.+)$/u;

/** Sections of a page's MDX in their order, the stretch before the first heading among them. */
export function sectionsOf(body: string): HandbookSection[] {
  const sections: { heading: string; lines: string[] }[] = [{ heading: '', lines: [] }];
  for (const line of body.split('\n')) {
    const heading = HEADING.exec(line)?.groups?.['heading'];
    if (heading === undefined) sections.at(-1)?.lines.push(line);
    else sections.push({ heading: plainWords(heading), lines: [] });
  }
  return sections
    .map(({ heading, lines }) => ({ id: heading === '' ? undefined : headingId(heading), heading, words: plainWords(lines.join('\n')) }))
    .filter(({ heading, words }) => heading !== '' || words !== '');
}

/** What is read of a stretch of MDX: captions and titles of its tags, the words of links, no marks. */
function plainWords(source: string): string {
  return source
    .replaceAll(/<\w+[^>]*?caption="([^"]*)"[^>]*>/gu, ' $1 ')
    .replaceAll(/<\w+[^>]*?title="([^"]*)"[^>]*>/gu, ' $1. ')
    .replaceAll(/<[^>]*>/gu, ' ')
    .replaceAll(/\[([^\]]*)\]\([^)]*\)/gu, '$1')
    .replaceAll(/^\|[-|: ]+\|$/gmu, ' ')
    .replaceAll(/^\| *(.*?) *\|$/gmu, (_, cells: string) => `${cells.replaceAll(/ *\| */gu, ', ')}.`)
    .replaceAll(/^\s*(?:\d+\.|-)\s/gmu, ' ')
    .replaceAll(/[*_`#|]/gu, ' ')
    .replaceAll(/\s+/gu, ' ')
    .trim();
}

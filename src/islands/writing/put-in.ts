/** What the buttons above a lesson's text put into it, and where. */
import { slugOf } from '#core/lesson-text/slugs.ts';

export type Snippet =
  | { readonly kind: 'step' | 'caution' | 'tip' | 'heading' }
  | { readonly kind: 'amount'; readonly key: string }
  | { readonly kind: 'figure'; readonly of: string }
  | { readonly kind: 'picture'; readonly name: string; readonly alt?: string }
  | { readonly kind: 'video'; readonly name: string };

/** The tag for a file of the series, by its name as lists hold it: `video/dress-the-loom`. */
export function snippetOfMedia(value: string): Snippet {
  const [kind, name = ''] = value.split('/');
  return kind === 'video' ? { kind, name } : { kind: 'picture', name };
}

/** A change of the text: `text` takes the place of `from` to `to`, and `selectFrom` to `selectTo` is then to be typed over. */
export interface PutIn {
  readonly from: number;
  readonly to: number;
  readonly text: string;
  readonly selectFrom: number;
  readonly selectTo: number;
}

interface Piece {
  /** On lines of its own, with empty lines round it. */
  readonly ownLines: boolean;
  readonly before: string;
  readonly inner: string;
  readonly after: string;
}

/** Puts a snippet where the selection stands; words that are selected go into it. */
export function putIn(source: string, selection: { readonly from: number; readonly to: number }, snippet: Snippet): PutIn {
  const words = source.slice(selection.from, selection.to).trim();
  const { ownLines, before, inner, after } = pieceOf(snippet, words, source);
  const { from, to } = ownLines && words === '' ? endOfStretch(source, selection.to) : selection;
  const lead = ownLines ? '\n'.repeat(missingBreaks(source.slice(0, from), /\n*$/)) : '';
  const tail = ownLines ? '\n'.repeat(missingBreaks(source.slice(to), /^\n*/)) : '';
  const selectFrom = from + lead.length + before.length;
  return { from, to, text: `${lead}${before}${inner}${after}${tail}`, selectFrom, selectTo: selectFrom + inner.length };
}

/** How many ends of line are wanting to make an empty line; none at the ends of the text. */
function missingBreaks(text: string, atEdge: RegExp): number {
  return text.trim() === '' ? 0 : Math.max(0, 2 - (atEdge.exec(text)?.[0].length ?? 0));
}

/** A block goes after the paragraph in which the caret stands, never into a sentence. */
function endOfStretch(source: string, place: number): { from: number; to: number } {
  const lineStart = source.lastIndexOf('\n', place - 1) + 1;
  const lineEnd = source.indexOf('\n', place);
  if (source.slice(lineStart, lineEnd === -1 ? undefined : lineEnd).trim() === '') return { from: place, to: place };
  const gap = source.indexOf('\n\n', place);
  const end = gap === -1 ? source.trimEnd().length : gap;
  return { from: Math.max(end, place), to: Math.max(end, place) };
}

function pieceOf(snippet: Snippet, words: string, source: string): Piece {
  const block = (before: string, inner: string, after: string): Piece => ({ ownLines: true, before, inner, after });
  switch (snippet.kind) {
    case 'step':
      return block(`<Step id="${stepName(words, source)}">\n`, words === '' ? 'Say what the hand does.' : words, '\n</Step>');
    case 'caution':
      return block('<Caution title="What can hurt">\n', words === '' ? 'Say what can hurt, what to do, and where to ask.' : words, '\n</Caution>');
    case 'tip':
      return block('<Tip title="If it does not go well">\n', words === '' ? 'Say what helps.' : words, '\n</Tip>');
    case 'heading':
      return block('## ', words === '' ? 'A heading' : words.replaceAll('\n', ' '), '');
    case 'amount':
      return { ownLines: false, before: `<Amount of="${snippet.key}"/>`, inner: '', after: '' };
    case 'figure':
      return block(`<Figure of="${snippet.of}" caption="`, 'What it shows', '"/>');
    case 'picture':
      if (snippet.alt !== undefined) return block(`<Picture name="${snippet.name}" alt="${inQuotes(snippet.alt)}"/>`, '', '');
      return block(`<Picture name="${snippet.name}" alt="`, 'What it shows, for those who do not see it', '"/>');
    case 'video':
      return block(`<Video name="${snippet.name}"/>`, '', '');
  }
}

/** Words as they can stand between the quotes of an attribute. */
function inQuotes(words: string): string {
  return words.replaceAll('&', '&amp;').replaceAll('"', '&quot;').replace(/\s+/g, ' ');
}

/** A name that no other step of the text has: students' ticks hang on it. */
function stepName(words: string, source: string): string {
  const short = slugOf(words.split(/\s+/).slice(0, 4).join(' ')).replace(/[^a-z0-9-]/g, '').replace(/^-+|-+$/g, '').slice(0, 40);
  const base = words === '' || short === '' ? 'step' : short;
  const isTaken = (name: string): boolean => source.includes(`id="${name}"`);
  if (base !== 'step' && !isTaken(base)) return base;
  for (let number = base === 'step' ? 1 : 2; ; number += 1) if (!isTaken(`${base}-${number}`)) return `${base}-${number}`;
}

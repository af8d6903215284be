/** What the workroom calls things that the database has short names for. */
import type { Missing, MissingPlace } from '#core/series/missing.ts';
import type { DeskPart, SeriesDesk, TextState } from '#server/queries/workroom/series-desk.ts';

export const LEVEL_OPTIONS = [
  { value: 'beginner', label: 'First steps: no loom touched before' },
  { value: 'some-practice', label: 'Some rows behind you: one piece woven' },
  { value: 'sure-hand', label: 'Practised hands: shapes and tension come by themselves' },
] as const satisfies readonly { value: SeriesDesk['level']; label: string }[];

export const TEXT_WORDS: Readonly<Record<TextState, string>> = {
  empty: 'Nothing written yet',
  'never-published': 'Written, not published yet',
  changed: 'Changed since published',
  'as-published': 'As students read it',
};

export const pathOfSeries = (slug: string): string => `/workroom/series/${slug}`;
export const pathOfPart = (slug: string, part: string, page: '' | '/settings' | '/gather' | '/video' | '/preview' | '/versions' = ''): string => `${pathOfSeries(slug)}/parts/${part}${page}`;
export const pathOfLine = (slug: string, part: string, line: string): string => `${pathOfPart(slug, part, '/gather')}#line-${line}`;
export const pathOfVideo = (slug: string, name: string): string => `${pathOfSeries(slug)}/videos/${name}`;

/** Where a missing thing is mended. */
export function pathOfMissing(slug: string, place: MissingPlace, part: DeskPart | undefined, { line, item }: Pick<Missing, 'line' | 'item'> = {}): string {
  const own = pathOfSeries(slug);
  switch (place) {
    case 'words':
      return `${own}#words`;
    case 'price':
      return `${own}#f-price`;
    case 'piece':
      return `${own}/piece`;
    case 'parts':
      return `${own}#parts`;
    case 'text':
      return part === undefined ? `${own}#parts` : `${pathOfPart(slug, part.publicId)}${line === undefined ? '' : `?line=${line}`}#write`;
    case 'list':
      return part === undefined ? `${own}#parts` : item === undefined ? pathOfPart(slug, part.publicId, '/gather') : pathOfLine(slug, part.publicId, item);
    case 'settings':
      return part === undefined ? `${own}#parts` : `${pathOfPart(slug, part.publicId, '/settings')}#opens`;
  }
}

/** The link's word for each place. */
export const PLACE_WORDS: Readonly<Record<MissingPlace, string>> = {
  words: 'Write it',
  price: 'Set the price',
  piece: 'Open the piece',
  parts: 'Go to the parts',
  text: 'Open the text',
  list: 'Open the list',
  settings: 'Open the settings',
};

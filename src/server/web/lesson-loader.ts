/**
 * Lessons as a live collection of the site. The loader only fetches: it knows no person, so a page asks the policy
 * first and then names the version that may be read.
 */
import { publishedText, publishedTexts, type PublishedText } from '#server/queries/lessons/published-text.ts';

export interface LessonEntry {
  readonly id: string;
  readonly data: PublishedText & Record<string, unknown>;
  readonly cacheHint: { readonly tags: string[] };
}

export interface LessonQueries {
  readonly publishedText: typeof publishedText;
  readonly publishedTexts: typeof publishedTexts;
}

/** Loads a text by `{ version }`, or all published texts of a series by `{ seriesId }`. What fails is returned, not thrown. */
export function lessonLoader(queries: LessonQueries = { publishedText, publishedTexts }) {
  return {
    name: 'lessons',
    async loadEntry({ filter }: { filter: { version: number } }) {
      try {
        const text = await queries.publishedText(filter.version);
        return text === null ? undefined : entryOf(text);
      } catch (error) {
        return { error: asError(error) };
      }
    },
    async loadCollection({ filter }: { filter?: { seriesId: number } }) {
      if (filter === undefined) return { error: new RangeError('Lessons are asked for by their series.') };
      try {
        return { entries: (await queries.publishedTexts(filter.seriesId)).map(entryOf) };
      } catch (error) {
        return { error: asError(error) };
      }
    },
  };
}

function entryOf(text: PublishedText): LessonEntry {
  return { id: String(text.versionId), data: { ...text }, cacheHint: { tags: [`lesson-version-${String(text.versionId)}`] } };
}

function asError(error: unknown): Error {
  return error instanceof Error ? error : new Error('A lesson could not be loaded.', { cause: error });
}

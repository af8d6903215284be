/**
 * Finds pages of the handbook by words. Every word that is asked for has to be there, itself or a word like it; where it
 * stands tells how much it weighs: title, heading, summary, text. A word the handbook does not know is taken for the
 * nearest one it knows.
 */
import type { HandbookSection } from '#core/handbook/page-text.ts';
import { nearestWord } from '#core/handbook/nearest-word.ts';
import { isFormOf, wordsAlike } from '#core/handbook/words-alike.ts';
import { stemsIn } from '#core/questions/like-words.ts';

export interface SearchablePage {
  readonly id: string;
  readonly title: string;
  readonly summary: string;
  readonly sections: readonly HandbookSection[];
}

export interface FoundPage {
  readonly id: string;
  readonly title: string;
  /** The section that says most of it, unless the page as a whole does. */
  readonly part?: { readonly id: string; readonly heading: string };
  /** A sentence or two that hold what was asked, cut into stretches that do and that do not. */
  readonly excerpt: readonly Stretch[];
}

export interface Stretch {
  readonly words: string;
  readonly asked: boolean;
}

export interface Finding {
  /** Pages with every word, the best first. */
  readonly found: readonly FoundPage[];
  /** Where none has every word: those that have some. */
  readonly closest: readonly FoundPage[];
  /** Words that were read as others, because the handbook knows none like them. */
  readonly readAs: readonly { readonly typed: string; readonly as: string }[];
  /** Nothing of what was typed can be looked for. */
  readonly empty: boolean;
}

/** What a word weighs by where it stands. */
const WEIGHT = { title: 12, heading: 5, summary: 4, text: 1 } as const;
/** A word like the one asked for, against itself. */
const ALIKE_SHARE = 0.5;
/** A whole word, against the beginning of a longer one. */
const WHOLE_BONUS = 1.25;
/** A page that has all words in one place, against one that has them here and there. */
const TOGETHER_BONUS = 2;
const MOST_CLOSEST = 5;
const LONGEST_EXCERPT = 220;

interface Field {
  readonly weight: number;
  readonly words: readonly string[];
  /** Undefined for title and summary. */
  readonly section?: number;
}

interface IndexedPage {
  readonly page: SearchablePage;
  readonly fields: readonly Field[];
}

export interface HandbookIndex {
  readonly pages: readonly IndexedPage[];
  readonly vocabulary: ReadonlySet<string>;
}

/** Small letters without accents: `Macramé` and `macrame` are one word. */
export const plainLetters = (text: string): string => text.normalize('NFD').replaceAll(/\p{M}/gu, '').toLowerCase();
const wordsOf = (text: string): string[] => plainLetters(text).match(/[\p{L}\p{N}]+/gu) ?? [];

/** Reads all pages once; searching them afterwards takes a millisecond or two. */
export function indexPages(pages: readonly SearchablePage[]): HandbookIndex {
  const indexed = pages.map((page): IndexedPage => ({
    page,
    fields: [
      { weight: WEIGHT.title, words: wordsOf(page.title) },
      { weight: WEIGHT.summary, words: wordsOf(page.summary) },
      ...page.sections.flatMap(({ heading, words }, section) => [{ weight: WEIGHT.heading, words: wordsOf(heading), section }, { weight: WEIGHT.text, words: wordsOf(words), section }]),
    ],
  }));
  return { pages: indexed, vocabulary: new Set(indexed.flatMap(({ fields }) => fields.flatMap(({ words }) => words))) };
}

/** A word that is asked for: its stem, and others that mean the same. */
interface Asked {
  readonly stem: string;
  readonly alike: readonly string[];
}

/** @param text as it was typed */
export function findPages({ pages, vocabulary }: HandbookIndex, text: string): Finding {
  const typed = stemsIn(plainLetters(text));
  const known = typed.map((stem) => ({ typed: stem, as: isKnown(stem, vocabulary) ? stem : (nearestWord(stem, vocabulary) ?? stem) }));
  const asked = known.map(({ as }): Asked => ({ stem: as, alike: wordsAlike(as) }));
  const weighed = asked.map((word) => pages.map((page) => weigh(page, word)));
  const rare = weighed.map((scores) => rarity(scores, pages.length));
  const ranked = pages
    .map((page, index) => {
      const scores = weighed.map((each, word) => (each[index] ?? 0) * (rare[word] ?? 0));
      const sum = scores.reduce((all, score) => all + score, 0);
      return { page, matched: scores.filter((score) => score > 0).length, score: hasTogether(page, asked) ? TOGETHER_BONUS * sum : sum };
    })
    .filter(({ matched }) => matched > 0)
    .sort((a, b) => b.matched - a.matched || b.score - a.score || (a.page.page.id < b.page.page.id ? -1 : 1));
  const show = (of: typeof ranked): FoundPage[] => of.map(({ page }) => shown(page, asked));
  const found = ranked.filter(({ matched }) => matched === asked.length);
  return {
    found: show(found),
    closest: found.length > 0 ? [] : show(ranked.slice(0, MOST_CLOSEST)),
    readAs: known.filter(({ typed: one, as }) => one !== as),
    empty: typed.length === 0,
  };
}

function isKnown(stem: string, vocabulary: ReadonlySet<string>): boolean {
  if (wordsAlike(stem).length > 0) return true;
  for (const word of vocabulary) if (word.startsWith(stem)) return true;
  return false;
}

/** Words that few pages hold tell more of what is meant. */
function rarity(scores: readonly number[], pages: number): number {
  return Math.log(1 + pages / Math.max(1, scores.filter((score) => score > 0).length));
}

/** Whether a section, or title and summary, have every word. */
function hasTogether({ fields }: IndexedPage, asked: readonly Asked[]): boolean {
  const places = new Set(fields.map(({ section }) => section));
  return [...places].some((place) => asked.every((word) => fields.some((field) => field.section === place && weighField(field, word) > 0)));
}

function weigh({ fields }: IndexedPage, asked: Asked): number {
  return fields.reduce((sum, field) => sum + weighField(field, asked), 0);
}

/** A word said ten times in one field counts little more than three times. */
function weighField({ weight, words }: Field, { stem, alike }: Asked): number {
  const hits = words.map((word) => hitOf(word, stem, alike)).filter((hit) => hit > 0);
  return hits.length === 0 ? 0 : weight * Math.max(...hits) * (1 + Math.log2(hits.length) / 2);
}

function hitOf(word: string, stem: string, alike: readonly string[]): number {
  if (word.startsWith(stem)) return word.length - stem.length <= 1 ? WHOLE_BONUS : 1;
  return alike.some((other) => isFormOf(word, other)) ? ALIKE_SHARE : 0;
}

function shown(page: IndexedPage, asked: readonly Asked[]): FoundPage {
  const { id, title, summary, sections } = page.page;
  const scores = sections.map((_, section) => asked.reduce((sum, word) => sum + page.fields.filter((field) => field.section === section).reduce((all, field) => all + weighField(field, word), 0), 0));
  const whole = page.fields.filter(({ section }) => section === undefined).reduce((sum, field) => sum + asked.reduce((all, word) => all + weighField(field, word), 0), 0);
  const best = scores.indexOf(Math.max(...scores));
  const section = sections[best];
  if (section?.id === undefined || whole >= (scores[best] ?? 0)) return { id, title, excerpt: excerptOf(whole > 0 ? summary : (section?.words ?? summary), asked) };
  return { id, title, part: { id: section.id, heading: section.heading }, excerpt: excerptOf(section.words || summary, asked) };
}

const hits = (text: string, asked: readonly Asked[]): number => asked.filter(({ stem, alike }) => wordsOf(text).some((word) => hitOf(word, stem, alike) > 0)).length;

/** The sentence that holds most of what was asked, and those after it as long as there is room. */
function excerptOf(text: string, asked: readonly Asked[]): Stretch[] {
  const sentences = text.split(/(?<=[.?])\s+/u);
  const most = Math.max(...sentences.map((sentence) => hits(sentence, asked)));
  const [first = '', ...after] = sentences.slice(sentences.findIndex((sentence) => hits(sentence, asked) === most));
  let excerpt = first;
  for (const sentence of after) {
    if (excerpt.length + sentence.length > LONGEST_EXCERPT) break;
    excerpt += ` ${sentence}`;
  }
  return stretchesOf(excerpt.length > 2 * LONGEST_EXCERPT ? excerpt.slice(0, excerpt.lastIndexOf(' ', 2 * LONGEST_EXCERPT)) : excerpt, asked);
}

function stretchesOf(text: string, asked: readonly Asked[]): Stretch[] {
  const stretches: { words: string; asked: boolean }[] = [];
  for (const piece of text.split(/(?<=[\p{L}\p{N}])(?![\p{L}\p{N}\p{M}])|(?<![\p{L}\p{N}\p{M}])(?=[\p{L}\p{N}])/u)) {
    const isAsked = hits(piece, asked) > 0;
    const last = stretches.at(-1);
    if (last?.asked === isAsked) last.words += piece;
    else stretches.push({ words: piece, asked: isAsked });
  }
  return stretches;
}

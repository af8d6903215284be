/** Which two texts of a part are compared, and what each is called. */
import { momentWords } from '#core/moment-words.ts';
import type { EarlierText } from '#server/queries/workroom/lesson-texts.ts';

/** `draft` stands for the text as it is now. Unasked: from what students read, else from the newest, to the text of now. */
export function comparedTexts(asked: URLSearchParams, texts: readonly EarlierText[], publishedNumber: number | null): { from: string; to: string } {
  const start = publishedNumber === null ? texts[0]?.key : `v${publishedNumber}`;
  return { from: asked.get('from') ?? start ?? 'draft', to: asked.get('to') ?? 'draft' };
}

/** `Version 3, 5 May 2027, 14:02, by Ilse Marrow`; `Set aside` for one that was never published. */
export function textName(timeZone: string): (text: EarlierText) => string {
  return ({ number, at, authorName }) => `${number === null ? 'Set aside' : `Version ${number}`}, ${momentWords(at, timeZone)}${authorName === null ? '' : `, by ${authorName}`}`;
}

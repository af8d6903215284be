/**
 * Finds what was asked before in like words. The stem of a word is its beginning, without the commonest English
 * endings, so that *warping* finds *warp* and *warped*; nothing here knows what a word means.
 */

/** Words of every question that tell nothing of what is asked. */
const COMMON = new Set((
  'about after all also and any are back been before but can cannot could did does doing done dont every for from get gets give goes going got had has have her here him his how '
  + 'into its just keep know like look made make many may mean more much must need not now off once one only our out over part please put right same say see she should some still step '
  + 'such take than that the their them then there these they thing this those too use used very want was way well were what when where which while who why will with would yes you your'
).split(' '));
/** No stem is shorter: the full-text index keeps no shorter words. */
const SHORTEST = 3;
const LONGEST = 40;
const MOST_WORDS = 12;
/** Whether a word in small letters stands in every sentence. */
export const isCommonWord = (word: string): boolean => COMMON.has(word);
const lengthOf = (word: string): number => [...word].length;

/** The stems of the words in `text` that tell what is asked, each once, at most twelve. */
export function stemsIn(text: string): string[] {
  const words = text.normalize('NFC').toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? [];
  const stems = words.filter((word) => lengthOf(word) >= SHORTEST && lengthOf(word) <= LONGEST && !COMMON.has(word)).map(stemOf);
  return [...new Set(stems)].slice(0, MOST_WORDS);
}

/** The beginning of a word in small letters, without the commonest endings. */
export function stemOf(word: string): string {
  const stem = word.replace(/(?:ings?|ed|es|s|e)$/u, '');
  return lengthOf(stem) >= SHORTEST ? stem : word;
}

/** How many of `stems` begin a word of `text`. */
export function stemsShared(stems: readonly string[], text: string): number {
  const words = text.normalize('NFC').toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? [];
  return stems.filter((stem) => words.some((word) => word.startsWith(stem))).length;
}

/** How many stems a text must share to be worth showing: of one or two all, of more at least two and two in five. */
export function enoughShared(stemCount: number): number {
  return stemCount <= 2 ? Math.max(1, stemCount) : Math.max(2, Math.ceil(stemCount * 0.4));
}

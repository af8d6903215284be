/** Numbers as people type them: `12,5`, `12.5`, `4 7/8`, `4⅞`. Comma and point are both decimal marks; nothing separates thousands. */

const VULGAR: ReadonlyMap<string, string> = new Map([
  ['½', '1/2'],
  ['¼', '1/4'],
  ['¾', '3/4'],
  ['⅛', '1/8'],
  ['⅜', '3/8'],
  ['⅝', '5/8'],
  ['⅞', '7/8'],
]);

const DECIMAL = /^\d+(?:[.,]\d+)?$|^[.,]\d+$/;
const FRACTION = /^(?:(?<whole>\d+)[ -])?(?<numerator>\d+) ?\/ ?(?<denominator>\d+)$/;

/** With fraction signs written out, gaps narrowed to one space and none at the ends. */
export function spellOut(text: string): string {
  const spelled = text.replace(/[½¼¾⅛⅜⅝⅞]/gu, (sign) => ` ${VULGAR.get(sign) ?? sign}`);
  return spelled.replace(/[\s\u2044]+/gu, (gap) => (gap.includes('\u2044') ? '/' : ' ')).trim();
}

function readFraction(text: string, otherwise: string): number | string {
  const { whole = '0', numerator, denominator } = FRACTION.exec(text)?.groups ?? {};
  if (numerator === undefined || denominator === undefined) return otherwise;
  if (Number(denominator) === 0) return 'A fraction cannot have 0 below its line.';
  return Number(whole) + Number(numerator) / Number(denominator);
}

/** The number of a text that is spelled out, or why it is none; `otherwise` says how it should be written. */
export function readTypedNumber(text: string, otherwise: string): number | string {
  if (text.includes('/')) return readFraction(text, otherwise);
  if (DECIMAL.test(text)) return Number(text.replace(',', '.'));
  if (/[.,].*[.,]/u.test(text)) return 'Write one comma or point only, and leave out marks between thousands.';
  return otherwise;
}

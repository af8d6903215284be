// Characters that have no business in a lesson: control codes, marks that turn the direction of what follows (they
// can make a sentence read differently from what is stored), and halves of characters. Checked both in the source
// and in what the parser makes of it, since an entity such as `&#x202E;` only shows itself there.

/** How a character code is treated in a lesson's text. */
export type CharacterKind = 'fine' | 'control' | 'direction' | 'unseen';

/** Kind of one UTF-16 code unit; surrogates are judged in pairs by `findBadCharacter`. */
export function characterKind(code: number): CharacterKind {
  if (code < 0x20) return code === 0x09 || code === 0x0a ? 'fine' : 'control';
  if (code < 0x7f) return 'fine';
  if (code <= 0x9f) return 'control';
  if (code < 0x200b) return code === 0xad ? 'unseen' : 'fine';
  if (code <= 0x200d || code === 0x2060 || code === 0xfeff) return 'unseen';
  if ((code >= 0x202a && code <= 0x202e) || (code >= 0x2066 && code <= 0x2069)) return 'direction';
  return 'fine';
}

/** True when `code`, at `index` of `text`, is half a character without its other half. */
export function isLoneHalf(text: string, index: number, code: number): boolean {
  if (code < 0xd800 || code > 0xdfff) return false;
  if (code <= 0xdbff) {
    const next = text.charCodeAt(index + 1);
    return !(next >= 0xdc00 && next <= 0xdfff);
  }
  const before = text.charCodeAt(index - 1);
  return !(before >= 0xd800 && before <= 0xdbff);
}

/** The first character that is refused in a text that has already been decoded, or undefined. */
export function findBadCharacter(text: string): { index: number; code: number } | undefined {
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    const kind = characterKind(code);
    if (kind === 'control' || kind === 'direction' || isLoneHalf(text, index, code)) return { index, code };
  }
  return undefined;
}

/** A character's number the way people look it up: `U+202E`. */
export function characterName(code: number): string {
  return `U+${code.toString(16).toUpperCase().padStart(4, '0')}`;
}

/** The sentence about a refused character. */
export function badCharacterReason(code: number): string {
  const kind = characterKind(code);
  if (kind === 'direction') return `Here stands a hidden mark that turns the writing direction (${characterName(code)}). Take it out, and type the words again.`;
  if (kind === 'control') return `Here stands a control character that cannot be shown (${characterName(code)}). Take it out; it often comes along with pasted text.`;
  return `Here stands half a character (${characterName(code)}). Take it out, and type the character again.`;
}

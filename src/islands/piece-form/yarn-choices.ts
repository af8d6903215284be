import { textOf, type Texts, type TypedPiece } from '#core/craft/piece-form/typed-piece.ts';

/** The word that tells a yarn from its sisters: the last of its label. */
function shade(texts: Texts): string {
  return textOf(texts, 'label').split(',').at(-1)?.trim() ?? '';
}

/** `ground, Slack Water` */
export function yarnWords(texts: Texts, index: number): string {
  const role = textOf(texts, 'role').trim();
  return [role === '' ? `Yarn ${String(index + 1)}` : role, shade(texts)].filter((word) => word !== '').join(', ');
}

export const yarnOf = (yarns: TypedPiece['yarns'], id: string): Texts | undefined => yarns.find((yarn) => String(yarn.id) === id)?.texts;

/** The yarns a band can be woven with; where its own was taken out, an empty choice first. */
export function yarnChoices(yarns: TypedPiece['yarns'], chosen: string): { value: string; label: string }[] {
  const known = yarns.map(({ id, texts }, index) => ({ value: String(id), label: yarnWords(texts, index) }));
  return known.some(({ value }) => value === chosen) ? known : [{ value: '', label: 'Choose a yarn' }, ...known];
}

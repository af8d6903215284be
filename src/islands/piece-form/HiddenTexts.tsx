import type { Texts } from '#core/craft/piece-form/typed-piece.ts';

interface HiddenTextsProps {
  readonly texts: Texts;
  readonly prefix: string;
  /** Keys that have a field of their own now. */
  readonly shown: ReadonlySet<string>;
}

/** What was typed for a choice that is not made just now goes along unseen, so that it is there when one comes back. */
export function HiddenTexts({ texts, prefix, shown }: HiddenTextsProps) {
  return Object.entries(texts).filter(([key, text]) => text !== '' && !shown.has(key)).map(([key, text]) => <input key={key} type="hidden" name={`${prefix}${key}`} value={text} />);
}

import type { AmountPart } from '#core/units/format-amount.ts';

/** The stretches of an amount's text, fractions and units in spans of their own. */
export function Parts({ parts }: { parts: readonly AmountPart[] }) {
  return parts.map(({ kind, text }, index) => {
    if (kind === 'fraction') return <span key={index} className="frac">{text}</span>;
    return kind === 'unit' ? <span key={index} className="unit">{text}</span> : text;
  });
}

/** A yarn as it is told, and as it is answered. */
import { choice, closed, exactlyOne, number, ref, text, whole, type Schema } from '#contracts/reckon-api/schema.ts';

const WAYS = ['tex', 'metresPer100g', 'count', 'class'] as const;

/** What else a label tells. */
export const YARN_TRAITS = {
  label: text('What it is called.', { minLength: 1, maxLength: 120 }),
  colour: text('For the drawing.', { pattern: '^#[0-9a-fA-F]{6}$' }),
  strands: whole('Strands taken together as one thread; 1 when missing. All else is told of one strand.', { min: 1, max: 100 }),
  ashenhurstK: number('K of Ashenhurst’s rule; 0.84 for weft, 0.90 for warp and for a yarn by itself when missing.', { min: 0.75, max: 1 }),
  wrapsPerInch: number('Snug wraps in an inch, measured over 5 cm or more.', { min: 1, max: 60 }),
  freeDiameterMm: number('Thickness of a strand lying free, measured; instead of wraps, for what cannot be wrapped.', { above: 0, max: 200 }),
  ball: closed('A ball as it is sold.', { metres: number('Metres.', { above: 0, max: 1_000_000 }), grams: number('Grams.', { above: 0, max: 1_000_000 }) }),
  fibre: text('Such as wool. Silk counted as cotton is read by a rule of its own.', { minLength: 1, maxLength: 60 }),
} as const;

export const YARN_SCHEMAS: Readonly<Record<string, Schema>> = {
  Yarn: closed(
    'A yarn: how thick it is, said in exactly one way, and what else is known. Metres and grams of a ball override a count.',
    {
      tex: number('Grams in a kilometre.', { min: 1, max: 200_000 }),
      metresPer100g: number('Metres in 100 g, as most labels say.', { min: 0.5, max: 100_000 }),
      count: closed('A count as it stands on the label.', {
        text: text('Such as 16, 8/2 or 2/16.', { minLength: 1, maxLength: 20, pattern: '^\\s*\\d{1,6}(?:[.,]\\d{1,6})?\\s*(?:/\\s*\\d{1,4}\\s*)?$' }),
        system: choice('The system it is counted in.', 'ne-cotton', 'spun-silk', 'ne-worsted', 'nm', 'lea', 'run', 'denier', 'dtex', 'jute', 'yorkshire', 'grain'),
      }),
      class: whole('Shops’ class from 0, lace, to 7, jumbo: a rough guess, for a yarn of which nothing else is known.', { min: 0, max: 7 }),
      ...YARN_TRAITS,
    },
    [...WAYS, ...Object.keys(YARN_TRAITS)],
    { ...exactlyOne(...WAYS.map((way) => [way])), not: { required: ['wrapsPerInch', 'freeDiameterMm'] } },
  ),
  YarnQuestion: closed('One yarn in every count.', { what: { const: 'yarn' }, yarn: ref('Yarn') }),
  YarnAnswer: closed('Counts are those of one strand, both diameters those of all its strands together.', {
    tex: number('Grams in a kilometre.'),
    denier: number('Grams in 9 km.'),
    nm: number('Kilometres in a kilogram.'),
    neCotton: number('Hanks of 840 yd in a pound.'),
    neWorsted: number('Hanks of 560 yd in a pound.'),
    lea: number('Hanks of 300 yd in a pound.'),
    run: number('Hanks of 1600 yd in a pound.'),
    yardsPerPound: number('Yards in a pound.'),
    metresPer100g: number('Metres in 100 g.'),
    plies: whole('Plies the count tells; 1 where it tells none.', { min: 1 }),
    compressedDiameterMm: number('Beaten down or under tension, by Ashenhurst’s rule.', { above: 0 }),
    loftDiameterMm: number('Lying free: by the wraps, else 1.43 times the compressed diameter.', { above: 0 }),
    warnings: ref('Warnings'),
  }),
};

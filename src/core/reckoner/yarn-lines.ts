/** What is told of one yarn, line by line: every count, both thicknesses, the class of shops. */
import type { YarnAnswer } from '#core/craft/reckoning/reckon-yarn.ts';
import type { CountSystem, Yarn } from '#core/craft/piece.ts';
import type { Trust } from '#core/craft/trust.ts';
import { classesByLength, classesByWraps } from '#core/craft/yarn/classes.ts';
import { countFromTex } from '#core/craft/yarn/count.ts';
import { readCount } from '#core/craft/yarn/count-text.ts';
import { loud, type AnswerLine } from '#core/reckoner/answer-line.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

const OUNCES_PER_POUND = 16;

const number = (label: string, value: number, how: string, unit?: string): AnswerLine => ({
  label,
  value: unit === undefined ? { kind: 'number', value } : { kind: 'number', value, unit },
  how,
  trust: 'label',
});

const OTHER_COUNTS: readonly (readonly [label: string, system: CountSystem, how: string, unit?: string])[] = [
  ['Yorkshire skein', 'yorkshire', '256 yd skeins in a pound: 1937.7 ÷ tex'],
  ['Jute pounds', 'jute', 'pounds in a spyndle of 14 400 yd: tex ÷ 34.45', 'lb'],
  ['American grain', 'grain', 'grains in 120 yd: tex ÷ 0.5905', 'gr'],
  ['Decitex', 'dtex', 'grams in 10 km: 10 × tex', 'dtex'],
];

/** The same thickness in every count. */
export function countLines(yarn: YarnAnswer, units: Units): AnswerLine[] {
  const metres = number('Metres in 100 g', yarn.metresPer100g, '100 000 ÷ tex', 'm');
  const yards = number('Yards in a pound', yarn.yardsPerPound, '496 055 ÷ tex', 'yd');
  return [
    loud(number('Tex', yarn.tex, 'grams in a kilometre', 'tex')),
    units === 'cm' ? loud(metres) : metres,
    number('Yards in an ounce', yarn.yardsPerPound / OUNCES_PER_POUND, '31 003 ÷ tex', 'yd'),
    units === 'in' ? loud(yards) : yards,
    number('Nm', yarn.nm, 'kilometres in a kilogram: 1000 ÷ tex'),
    number('Cotton and spun-silk count', yarn.neCotton, '840 yd hanks in a pound: 590.5 ÷ tex'),
    number('Worsted count', yarn.neWorsted, '560 yd hanks in a pound: 885.8 ÷ tex'),
    number('Linen lea', yarn.lea, '300 yd hanks in a pound: 1653.5 ÷ tex'),
    number('Woollen run', yarn.run, '1600 yd hanks in a pound: 310 ÷ tex'),
    number('Denier', yarn.denier, 'grams in 9 km: 9 × tex', 'den'),
    ...OTHER_COUNTS.map(([label, system, how, unit]) => number(label, countFromTex(yarn.tex, system), how, unit)),
  ];
}

/** How a count with two numbers was read; nothing where there was one number. */
export function plyLines({ count: told, fibre }: Yarn, yarn: YarnAnswer): AnswerLine[] {
  const read = told?.text.includes('/') === true ? readCount(told.text, told.system, fibre) : undefined;
  if (read === undefined) return [];
  const words = read.doubt === 'silk' || told?.system === 'spun-silk' ? `${String(yarn.plies)} plies, counted together as ${String(read.count)}` : `${String(yarn.plies)} ${yarn.plies === 1 ? 'ply' : 'plies'} of ${String(read.count)}`;
  return [{ label: `“${told?.text ?? ''}” is read as`, value: { kind: 'words', words }, how: 'by the custom of that trade, for which of the two numbers tells the plies', trust: 'label' }];
}

/** How thick it lies, and which class a shop would call it. */
export function thicknessLines(yarn: YarnAnswer, typed: Yarn): AnswerLine[] {
  const strands = typed.strands ?? 1;
  const together = strands > 1 ? ' together' : '';
  const measured = typed.wrapsPerInch !== undefined;
  const loftTrust: Trust = measured ? 'measured' : 'formula';
  const classes = measured ? classesByWraps(typed.wrapsPerInch) : classesByLength(yarn.metresPer100g);
  const mm = (value: number): AnswerLine['value'] => ({ kind: 'number', value, unit: 'mm' });
  return [
    { label: `Thickness${together}, beaten down`, value: mm(yarn.compressedDiameterMm), how: '25.4 mm ÷ threads in an inch, which are K × √ yards in a pound (Ashenhurst)', trust: 'formula' },
    loud({ label: `Thickness${together}, lying free`, value: mm(yarn.loftDiameterMm), how: measured ? '25.4 mm ÷ your wraps in an inch' : '1.43 × the beaten thickness; wraps you count are better', trust: loftTrust }),
    {
      label: 'Wraps in an inch',
      value: { kind: 'number', value: typed.wrapsPerInch ?? (MM_PER_INCH * Math.sqrt(strands)) / yarn.loftDiameterMm },
      how: measured ? 'as you counted' : '25.4 mm ÷ the thickness of one strand lying free',
      trust: loftTrust,
    },
    loud({
      label: 'Shops’ class',
      value: { kind: 'words', words: classes.length === 0 ? 'between two classes' : classes.map(({ number: digit, name }) => `${String(digit)} ${name}`).join(' or ') },
      how: measured ? 'by wraps, in a table whose classes overlap' : 'by metres in 100 g, in a table whose classes overlap',
      trust: 'class',
    }),
  ];
}

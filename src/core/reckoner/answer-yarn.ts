/** One yarn in every way of counting it. */
import { reckon } from '#core/craft/reckon.ts';
import type { YarnAnswer } from '#core/craft/reckoning/reckon-yarn.ts';
import type { Trust } from '#core/craft/trust.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { classesByLength, classesByWraps } from '#core/craft/yarn/classes.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import { NO_ANSWER, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { YARN_FIELDS, type FormReader } from '#core/reckoner/read-fields.ts';
import { fieldOfYarn } from '#core/reckoner/field-of-path.ts';

const OUNCES_PER_POUND = 16;

function counts(yarn: YarnAnswer): AnswerLine[] {
  const number = (label: string, value: number, how: string, unit?: string): AnswerLine => ({
    label,
    value: unit === undefined ? { kind: 'number', value } : { kind: 'number', value, unit },
    how,
    trust: 'label',
  });
  return [
    number('Tex', yarn.tex, 'grams in a kilometre', 'tex'),
    number('Metres in 100 g', yarn.metresPer100g, '100 000 ÷ tex', 'm'),
    number('Yards in an ounce', yarn.yardsPerPound / OUNCES_PER_POUND, '31 003 ÷ tex', 'yd'),
    number('Yards in a pound', yarn.yardsPerPound, '496 055 ÷ tex', 'yd'),
    number('Nm', yarn.nm, 'kilometres in a kilogram: 1000 ÷ tex'),
    number('Cotton count', yarn.neCotton, '840 yd hanks in a pound: 590.5 ÷ tex'),
    number('Worsted count', yarn.neWorsted, '560 yd hanks in a pound: 885.8 ÷ tex'),
    number('Linen lea', yarn.lea, '300 yd hanks in a pound: 1653.5 ÷ tex'),
    number('Woollen run', yarn.run, '1600 yd hanks in a pound: 310 ÷ tex'),
    number('Denier', yarn.denier, 'grams in 9 km: 9 × tex', 'den'),
  ];
}

function thickness(yarn: YarnAnswer, typed: Yarn): AnswerLine[] {
  const strands = typed.strands ?? 1;
  const together = strands > 1 ? ' together' : '';
  const measured = typed.wrapsPerInch !== undefined;
  const loftTrust: Trust = measured ? 'measured' : 'formula';
  const classes = measured ? classesByWraps(typed.wrapsPerInch) : classesByLength(yarn.metresPer100g);
  const mm = (value: number): AnswerLine['value'] => ({ kind: 'number', value, unit: 'mm' });
  return [
    { label: `Thickness${together}, beaten down`, value: mm(yarn.compressedDiameterMm), how: '25.4 mm ÷ threads in an inch, which are K × √ yards in a pound (Ashenhurst)', trust: 'formula' },
    { label: `Thickness${together}, lying free`, value: mm(yarn.loftDiameterMm), how: measured ? '25.4 mm ÷ your wraps in an inch' : '1.43 × the beaten thickness; wraps you count are better', trust: loftTrust },
    {
      label: 'Wraps in an inch',
      value: { kind: 'number', value: typed.wrapsPerInch ?? (MM_PER_INCH * Math.sqrt(strands)) / yarn.loftDiameterMm },
      how: measured ? 'as you counted' : '25.4 mm ÷ the thickness of one strand lying free',
      trust: loftTrust,
    },
    {
      label: 'Shop’s class',
      value: { kind: 'words', words: classes.length === 0 ? 'between two classes' : classes.map(({ number, name }) => `${String(number)} ${name}`).join(' or ') },
      how: measured ? 'by wraps, in a table whose classes overlap' : 'by metres in 100 g, in a table whose classes overlap',
      trust: 'class',
    },
  ];
}

export function answerYarn(typed: Yarn | undefined, reader: FormReader): Section {
  if (typed === undefined) return NO_ANSWER;
  const outcome = reckon({ what: 'yarn', yarn: typed }, reader.units);
  if (!outcome.ok) {
    for (const { path, message } of outcome.problems) reader.refuse(fieldOfYarn(path.replace(/^\/yarn/u, '')), message);
    return NO_ANSWER;
  }
  if (!('denier' in outcome.value) || !reader.isSound(...YARN_FIELDS)) return NO_ANSWER;
  return { lines: [...counts(outcome.value), ...thickness(outcome.value, typed)], notes: outcome.warnings.map(({ message }) => message) };
}

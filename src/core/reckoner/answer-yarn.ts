/** One yarn in every way of counting it. */
import { reckon } from '#core/craft/reckon.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { explainYarn } from '#core/craft/show-how/explain.ts';
import { NO_ANSWER, named, written, type Section } from '#core/reckoner/answer-line.ts';
import { fieldOfYarn } from '#core/reckoner/field-of-path.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { YARN_FIELDS } from '#core/reckoner/read-fields.ts';
import { countLines, plyLines, thicknessLines } from '#core/reckoner/yarn-lines.ts';

const STEPS: Readonly<Record<string, string>> = {
  Tex: 'tex', 'Metres in 100 g': 'metresPer100g', 'Yards in a pound': 'yardsPerPound', Nm: 'nm', 'Cotton and spun-silk count': 'neCotton', 'Worsted count': 'neWorsted',
  'Linen lea': 'lea', 'Woollen run': 'run', Denier: 'denier', 'Thickness, beaten down': 'compressedDiameterMm', 'Thickness together, beaten down': 'compressedDiameterMm',
  'Thickness, lying free': 'loftDiameterMm', 'Thickness together, lying free': 'loftDiameterMm',
};

export function answerYarn(typed: Yarn | undefined, reader: FormReader): Section {
  const needs = YARN_FIELDS;
  if (typed === undefined) return { ...NO_ANSWER, needs };
  const outcome = reckon({ what: 'yarn', yarn: typed }, reader.units);
  if (!outcome.ok) {
    for (const { path, message } of outcome.problems) reader.refuse(fieldOfYarn(path.replace(/^\/yarn/u, '')), message);
    return { ...NO_ANSWER, needs };
  }
  if (!('denier' in outcome.value) || !reader.isSound(...YARN_FIELDS)) return { ...NO_ANSWER, needs };
  const lines = [...plyLines(typed, outcome.value), ...countLines(outcome.value, reader.units), ...thicknessLines(outcome.value, typed)];
  return { lines: lines.map((line) => named(line, STEPS)), notes: outcome.warnings, needs, asked: [typed, reader.units], workings: () => written(explainYarn(typed, reader.units)) };
}

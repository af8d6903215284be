/**
 * The questions the public reckoner answers, each told by its `what`. Numbers are not
 * rounded; warnings come inside the answers that can have any.
 */
import type { Plan } from '#core/craft/crafts.ts';
import { planInFields } from '#core/craft/plan.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { reckonLengthText, type LengthTextAnswer } from '#core/craft/reckoning/reckon-length-text.ts';
import { reckonShape, type ShapeAnswer } from '#core/craft/reckoning/reckon-shape.ts';
import { reckonRya, reckonSoumak, type RyaAnswer, type SoumakAnswer } from '#core/craft/reckoning/reckon-stitches.ts';
import { reckonTakeUp, type TakeUpAnswer } from '#core/craft/reckoning/reckon-take-up.ts';
import { reckonYarn, type YarnAnswer } from '#core/craft/reckoning/reckon-yarn.ts';
import type { Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export interface Answers {
  readonly yarn: YarnAnswer;
  readonly 'take-up': TakeUpAnswer;
  readonly soumak: SoumakAnswer;
  readonly rya: RyaAnswer;
  readonly shape: ShapeAnswer;
  readonly 'length-text': LengthTextAnswer;
  readonly piece: Plan;
}

export type Question = keyof Answers;

const RECKONERS: { readonly [Q in Question]: (fields: Fields) => Answers[Q] | undefined } = {
  yarn: reckonYarn,
  'take-up': reckonTakeUp,
  soumak: reckonSoumak,
  rya: reckonRya,
  shape: reckonShape,
  'length-text': reckonLengthText,
  piece: (fields) => {
    const plan = planInFields(Fields.of(fields.take('piece'), '', 'The piece', fields.findings.within('/piece')));
    fields.end();
    return plan;
  },
};

const QUESTIONS = ['yarn', 'take-up', 'soumak', 'rya', 'shape', 'length-text', 'piece'] as const satisfies readonly Question[];

/** Answers one question. Never throws for what a person may send. */
export function reckon(input: unknown, units: Units = 'cm'): Outcome<Answers[Question]> {
  const findings = Findings.in(units);
  const fields = Fields.of(input, '', 'A question', findings);
  const what = fields.choice('what', 'What to reckon', QUESTIONS);
  return findings.outcome(findings.count > 0 ? undefined : RECKONERS[what](fields));
}

/** All a piece comes to, as plain lines: for tests that keep what was once found right. */
import { amountKeysOf, amountOf } from '#core/craft/amounts.ts';
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';
import { planPiece } from '#core/craft/plan.ts';
import { explainPiece } from '#core/craft/show-how/explain.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import type { Outcome, Problem } from '#core/outcome.ts';
import { amountText } from '#core/units/format-amount.ts';
import { thousandths } from './kept.ts';

const told = (found: readonly Problem[]): string[] => found.map(({ code, path, message }) => `${code} ${path}: ${message}`);
const short = (value: number | readonly number[]): string => JSON.stringify(thousandths(value));

function inputText({ symbol, value, unit, from, path, source, trust, weighs }: WorkingInput): string {
  const origin = from === undefined ? path === undefined ? `says ${source ?? ''}` : `given at ${path}` : `from ${from}`;
  return `  ${symbol} = ${short(value)} ${unit}, ${origin}, ${trust}${weighs === false ? ', weighs nothing' : ''}`;
}

/** A working in a line, and one for each thing that goes into it. */
export function tellWorkings(workings: Outcome<readonly Working[]>): string[] {
  if (!workings.ok) return told(workings.problems);
  return workings.value.flatMap(({ id, formula, value, unit, trust, margin, inputs }) => [
    `${id} = ${short(value)} ${unit}: ${formula} (${trust}${margin === undefined ? '' : `, margin ${short(margin)}`})`,
    ...inputs.map(inputText),
  ]);
}

function amountsOf(piece: Piece, plan: Plan): string[] {
  return amountKeysOf(piece, plan).map((key) => {
    const amount = amountOf(key, piece, plan);
    if (!amount.ok) return key;
    const { label, howReckoned: { formula, inputs, trust } } = amount.value;
    const said = inputs.map(({ name, value }) => `${name}: ${JSON.stringify(thousandths(value))}`);
    return [`${key}: ${label}, ${amountText(amount.value, 'cm')} (${amountText(amount.value, 'in')}); ${formula}, ${trust}`, ...said].join('; ');
  });
}

/** Its plan with its workings, amounts, materials and words. Throws where it cannot be made. */
export function tellPiece(piece: Piece): object {
  const planned = planPiece(piece as unknown);
  if (!planned.ok) throw new Error(told(planned.problems).join('\n'));
  const plan = planned.value;
  const craft = craftOf(piece);
  return {
    warnings: told(planned.warnings),
    plan: thousandths({ ...plan, warnings: undefined, cautions: undefined }),
    amounts: amountsOf(piece, plan),
    materials: thousandths(craft.materials({ piece, plan })),
    words: [craft.summary({ piece, plan }, 'cm'), craft.size({ piece, plan }, 'cm')],
    workings: tellWorkings(explainPiece(piece)),
  };
}

/** Only what is refused and what is warned of. */
export function tellFindings(piece: unknown): string[] {
  const planned = planPiece(piece);
  return told(planned.ok ? planned.warnings : planned.problems);
}

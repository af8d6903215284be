/** Every figure, with a piece that fills it. */
import { CRAFT_NAMES, CRAFTS, craftOf, type CraftName, type Piece, type Plan } from '#core/craft/crafts.ts';
import type { Figure, FigureInput, FigureStep } from '#core/craft/figures/figure.ts';
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { planPiece } from '#core/craft/plan.ts';

/** What any figure may be asked with: a figure of another craft than the piece's shows that craft's example. */
export type AnyFigureInput = FigureInput<Piece, Plan>;

const craftWith = (kind: FigureKind): CraftName => CRAFT_NAMES.find((name) => Object.hasOwn(CRAFTS[name].figures, kind)) ?? 'frame-loom';

const examples = new Map<CraftName, AnyFigureInput>();

/** Reckoned once: it never changes. */
function exampleOf(craft: CraftName, input: AnyFigureInput): AnyFigureInput {
  const known = examples.get(craft);
  if (known !== undefined) return { ...known, units: input.units };
  const piece = CRAFTS[craft].example;
  const plan = planPiece(piece);
  if (!plan.ok) throw new Error(`the example of ${craft} cannot be made: ${plan.problems[0]?.message ?? ''}`);
  const example: AnyFigureInput = { piece, plan: plan.value, units: input.units };
  examples.set(craft, example);
  return example;
}

/** The figure of this name, and what it is drawn from. */
export function figureOf(kind: FigureKind, input: AnyFigureInput): { readonly figure: Figure<Piece, Plan>; readonly input: AnyFigureInput } {
  const craft = craftWith(kind);
  const figure = craftOf({ craft }).figures[kind];
  if (figure === undefined) throw new RangeError(`no figure is called ${kind}`);
  return { figure, input: input.piece.craft === craft ? input : exampleOf(craft, input) };
}

/** Its movements one after another. */
export function figureStepsOf(kind: FigureKind, given: AnyFigureInput): readonly FigureStep[] {
  const { figure, input } = figureOf(kind, given);
  return figure.steps(input);
}

/** The same movement in words, with the amounts. */
export function figureWords(kind: FigureKind, given: AnyFigureInput): string {
  const { figure, input } = figureOf(kind, given);
  return figure.describe(input);
}

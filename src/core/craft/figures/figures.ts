/** Every figure, with a piece that fills it. */
import { CRAFTS, type Piece, type Plan } from '#core/craft/crafts.ts';
import type { Figure, FigureInput, FigureStep } from '#core/craft/figures/figure.ts';
import { FIGURES, type FigureCraft, type FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { planPiece } from '#core/craft/plan.ts';

/** What any figure may be asked with: a figure of another craft than the piece's shows that craft's example. */
export type AnyFigureInput = FigureInput<Piece, Plan>;

interface Drawn {
  readonly craft: FigureCraft;
  readonly figure: Figure<Piece, Plan>;
}

const drawn = <K extends string>(craft: FigureCraft, figures: Readonly<Record<K, Figure<Piece, Plan>>>): [string, Drawn][] =>
  Object.entries<Figure<Piece, Plan>>(figures).map(([kind, figure]) => [kind, { craft, figure }]);

const DRAWN = Object.fromEntries([...drawn('frame-loom', FIGURES['frame-loom']), ...drawn('macrame', FIGURES.macrame)]) as Readonly<Record<FigureKind, Drawn>>;

const examples = new Map<FigureCraft, AnyFigureInput>();

/** Reckoned once: it never changes. */
function exampleOf(craft: FigureCraft, input: AnyFigureInput): AnyFigureInput {
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
  const { craft, figure } = DRAWN[kind];
  return { figure, input: input.piece.craft === craft ? input : exampleOf(craft, input) };
}

/** What it is called, in a few words. */
export const figureTitle = (kind: FigureKind): string => DRAWN[kind].figure.title;

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

/**
 * What a craft is to the rest of the house: everything that differs between weaving on a frame, knotting and dyeing
 * stands behind one object. A further craft is a folder that exports one of these, and its line in `crafts.ts`.
 */
import type { Reckoned } from '#core/craft/amounts/amount-types.ts';
import type { ClothPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import type { Yarn } from '#core/craft/piece.ts';
import type { Hours } from '#core/craft/plan-types.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import type { Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

/** What every piece says. */
export interface PieceCore {
  readonly craft: string;
}

/** What every plan tells; each craft adds its own. */
export interface PlanCore {
  /** Of the finished thing, without margins. */
  readonly massG: number;
  readonly hours: Hours;
  readonly warnings: readonly Problem[];
}

/** A piece with the plan that was reckoned from it. */
export interface MadeOf<P extends PieceCore, L extends PlanCore> {
  readonly piece: P;
  readonly plan: L;
}

/** Something to buy by length or weight, all uses of one role together, margins included. */
export interface Material {
  /** Of the amount that speaks of it: `warp`, `yarn.sky`. */
  readonly key: string;
  /** Its role in the piece, where it has one that a student may put her own yarn in. */
  readonly role?: string;
  /** What it is called where its label says nothing. */
  readonly name: string;
  readonly label?: string;
  readonly colour?: string;
  readonly yarn?: Yarn;
  /** Missing for what is only weighed. */
  readonly lengthMm?: number;
  readonly grams: number;
  readonly balls?: number;
}

/** Amounts that belong together in a list to choose from. `<role>` and the like stand for names the piece gives. */
export interface KeyGroup {
  readonly title: string;
  readonly keys: readonly string[];
}

/** General information; every one ends by pointing to local rules and to qualified practice. */
export interface Caution {
  readonly title: string;
  readonly says: string;
  readonly more?: { readonly href: string; readonly label: string };
}

export interface CraftWords {
  /** `Weaving` */
  readonly label: string;
  /** After hours: `at the loom`, `of knotting`. */
  readonly hours: string;
  /** What somebody needs who has nothing yet: `Frame loom`. */
  readonly needs: string;
  /** Heading over what is bought by length or weight: `Yarn`. */
  readonly material: string;
  /** Under the sum of all of it: `Warp and weft together`. */
  readonly allMaterial: string;
  /** How the making is spoken of: `woven`, `knotted`. */
  readonly made: string;
  /** Further words by which it is searched for. */
  readonly search: string;
}

/**
 * Methods, so that a craft of one piece and plan stands where any craft is asked for. Every one may be handed only a
 * piece of its own craft, with the plan of that very piece: `craftOf` and `planPiece` see to it.
 */
export interface Craft<P extends PieceCore = PieceCore, L extends PlanCore = PlanCore> {
  readonly words: CraftWords;
  /** Shown wherever the craft is taught, before anybody begins. */
  readonly cautions: readonly Caution[];
  /** A small piece that can be made: stands in where a figure is shown that another craft's piece cannot fill. */
  readonly example: P;
  /** Reads a piece and reckons it; undefined, with a problem among the findings, if it cannot be made. Refuses unknown keys. */
  plan(fields: Fields): Omit<L, 'warnings'> | undefined;
  /** Reads a piece and reckons nothing: what is wrong with it as it is written is among the findings afterwards. */
  read(fields: Fields): unknown;
  readonly amounts: readonly KeyGroup[];
  /** The names that `<role>` and the like stand for in this piece. */
  ownNames(piece: P): Readonly<Record<string, readonly string[]>>;
  /** The amount of one key, or a sentence why this piece has none. */
  amount(key: string, made: MadeOf<P, L>): Reckoned | string;
  materials(made: MadeOf<P, L>): readonly Material[];
  /** The role a key's amount speaks of, where it speaks of a yarn. */
  roleOfKey(key: string, piece: P): string | undefined;
  draw(made: MadeOf<P, L>, title: string): ClothPiece;
  /** A student's own making put into the pattern; planning it tells what is wrong with it. */
  change(pattern: P, mine: MyPiece): P;
  /** How it differs from the pattern, a sentence for each difference. */
  tellChanges(before: MadeOf<P, L>, after: MadeOf<P, L>, units: Units, mine: MyPiece): readonly string[];
  /** What was reckoned for, on a line: `nails every 8 mm: 76 ends, woven 30 cm wide`. */
  summary(made: MadeOf<P, L>, units: Units): string;
  /** How large the thing becomes: `40 cm wide and 44 cm high`. */
  size(made: MadeOf<P, L>, units: Units): string;
  /** Inside width of the narrowest frame it needs; undefined where none is needed. */
  leastInsideMm(made: MadeOf<P, L>): number | undefined;
}

/** A loom of a student's own, kept with her account: chosen for a series in one press, measured once. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { changePiece } from '#core/craft/fitting/change-piece.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import { LOOM_KIND_NAMES, loomKind, NAIL_ROW_NAMES } from '#core/craft/looms/looms.ts';
import type { EndsTogether, FrameLoomPiece, LoomKindName, NailRows, Warping } from '#core/craft/piece.ts';
import { fieldText } from '#core/craft/piece-form/field-text.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { present } from '#core/craft/reading/present.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { CHOICES, ENDS, INSIDE_HEIGHT, INSIDE_WIDTH, LOOM_KIND, NAIL_PITCH, NAIL_ROWS, WARPING, type AskedLength } from './asked-of-mine.ts';
import { readLength } from './read-length.ts';

export interface OwnLoom {
  readonly kind: LoomKindName;
  readonly nailRows?: NailRows;
  readonly insideWidthMm: number;
  readonly insideHeightMm: number;
  readonly nailPitchMm: number;
  readonly warping: Warping;
  readonly endsTogether: EndsTogether;
}

/** One of the list. */
export interface NamedLoom {
  readonly publicId: string;
  readonly name: string;
  readonly loom: OwnLoom;
}

/** A small list: who has more looms has a school, and another way of keeping them. */
export const MOST_LOOMS = 12;
export const LOOM_NAME = 'loomName';
export const MOST_NAME = 60;

export const LOOM_LENGTHS: readonly AskedLength[] = [INSIDE_WIDTH, INSIDE_HEIGHT, NAIL_PITCH];
const FIELDS: readonly string[] = [...LOOM_LENGTHS, ...CHOICES].map(({ key }) => key);

/** A loom as it stands in the fields of a form, under the names *My piece* has for them. */
export interface TypedLoomForm {
  readonly units: Units;
  readonly name: string;
  readonly texts: Texts;
}

export type LoomJudgement =
  | { readonly ok: true; readonly name: string; readonly loom: OwnLoom }
  /** A sentence for each field, by its name. */
  | { readonly ok: false; readonly faults: ReadonlyMap<string, string> };

/** In the person's units. */
export function loomTexts(loom: OwnLoom, units: Units): Readonly<Record<string, string>> {
  return Object.fromEntries([...LOOM_LENGTHS, ...CHOICES].map((asked) => [asked.key, fieldText({ nailRows: 'both', ...loom }[asked.key], asked, units)]));
}

/** The usual of it, with nothing measured yet. */
export function emptyLoomForm(units: Units): TypedLoomForm {
  return { units, name: '', texts: { [LOOM_KIND.key]: 'nailed-frame', [NAIL_ROWS.key]: 'both', [WARPING.key]: 'zigzag', [ENDS.key]: '1' } };
}

export function loomFormOf({ name, loom }: Omit<NamedLoom, 'publicId'>, units: Units): TypedLoomForm {
  return { units, name, texts: loomTexts(loom, units) };
}

const MOST_TYPED = 200;

/** The form as it was sent; `ask` gives the text under a name. */
export function loomFormOfFields(ask: (name: string) => string | undefined): TypedLoomForm {
  const text = (name: string): string => (ask(name) ?? '').slice(0, MOST_TYPED);
  return { units: ask('units') === 'in' ? 'in' : 'cm', name: text(LOOM_NAME), texts: Object.fromEntries(FIELDS.map((key) => [key, text(key)])) };
}

/** The name a loom is kept by; undefined, with a sentence among the faults, where it is none. */
export function readLoomName(typed: string, faults: Map<string, string>): string | undefined {
  const name = typed.trim().replace(/\s+/gu, ' ');
  if (name === '') faults.set(LOOM_NAME, 'Say what you call this loom, so that you find it again.');
  else if (name.length > MOST_NAME) faults.set(LOOM_NAME, `A name of at most ${String(MOST_NAME)} letters works.`);
  else return name;
  return undefined;
}

export const MISSING_WIDTH = 'Say how wide your loom is inside, from one upright to the other.';

const MISSING: Readonly<Record<string, string>> = {
  [INSIDE_WIDTH.key]: MISSING_WIDTH,
  [INSIDE_HEIGHT.key]: 'Say how high your loom is inside, from the lower nails to the upper ones.',
  [NAIL_PITCH.key]: 'Say how far its nails stand apart: measure over ten gaps and divide by ten.',
};

export function judgeLoomForm(typed: TypedLoomForm): LoomJudgement {
  const faults = new Map<string, string>();
  const name = readLoomName(typed.name, faults);
  const [insideWidthMm, insideHeightMm, nailPitchMm] = [INSIDE_WIDTH, INSIDE_HEIGHT, NAIL_PITCH].map((asked) => {
    const mm = readLength(typed, asked, faults);
    if (mm === undefined && !faults.has(asked.key)) faults.set(asked.key, MISSING[asked.key] ?? '');
    return mm;
  });
  if (name === undefined || insideWidthMm === undefined || insideHeightMm === undefined || nailPitchMm === undefined) return { ok: false, faults };
  const kind = LOOM_KIND_NAMES.find((one) => one === textOf(typed.texts, LOOM_KIND.key)) ?? 'nailed-frame';
  const { rows, warpings } = loomKind({ kind });
  return {
    ok: true,
    name,
    loom: {
      kind, insideWidthMm, insideHeightMm, nailPitchMm,
      // A way of winding that this kind does not take goes unheard, and so do rows it does not have.
      warping: warpings.find((way) => way === textOf(typed.texts, WARPING.key)) ?? warpings[0],
      endsTogether: textOf(typed.texts, ENDS.key) === '2' ? 2 : 1,
      ...present({ nailRows: rows === 2 ? NAIL_ROW_NAMES.find((one) => one === textOf(typed.texts, NAIL_ROWS.key)) : undefined }),
    },
  };
}

/** The loom a piece of hers is woven on; undefined where neither she nor the pattern said how wide it is. */
export function loomOfMine(pattern: FrameLoomPiece, { way: _, ...mine }: MyPiece): OwnLoom | undefined {
  const { loom, warp } = changePiece(pattern, mine);
  const { insideWidthMm, insideHeightMm, nailPitchMm, warping, kind = 'nailed-frame', nailRows } = loom;
  if (insideWidthMm === undefined) return undefined;
  return { kind, insideWidthMm, insideHeightMm, nailPitchMm, warping, endsTogether: warp.endsTogether ?? 1, ...present({ nailRows }) };
}

/** Whether a form has just this loom in its fields. */
export function isThisLoom({ texts, units }: { readonly texts: Texts; readonly units: Units }, loom: OwnLoom): boolean {
  return Object.entries(loomTexts(loom, units)).every(([key, text]) => textOf(texts, key) === text);
}

/** `36 cm wide and 64 cm high inside, nails every 8 mm, doubled ends`. */
export function ownLoomWords({ insideWidthMm, insideHeightMm, nailPitchMm, endsTogether, kind }: OwnLoom, units: Units): string {
  const [width, height, pitch] = [lengthOf(insideWidthMm, 'size'), lengthOf(insideHeightMm, 'size'), lengthOf(nailPitchMm, 'fine')].map((length) => amountText(length, units));
  return `${String(width)} wide and ${String(height)} high inside, ${loomKind({ kind }).holder.many} every ${String(pitch)}, ${endsTogether === 2 ? 'doubled' : 'single'} ends`;
}

/** Lines of a gathering list with a student's own amounts, ready to be shown. */
import { massOf } from '#core/craft/amounts/amount-types.ts';
import type { Material } from '#core/craft/craft.ts';
import { craftOf, type Piece } from '#core/craft/crafts.ts';
import type { MadeFor } from '#core/craft/made-for.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { amountToHave, materialsToHave, type UsedUp } from '#core/craft/rest/amount-for.ts';
import { mergeLines, type GatheringLine, type MergedLine } from '#core/gathering/merge.ts';
import { purchaseKey } from '#core/gathering/to-buy.ts';
import { partsList } from '#core/series/parts-list.ts';
import { amountText, formatAmount, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

export interface ShownLine {
  readonly key: string;
  readonly items: readonly string[];
  readonly kind: GatheringLine['kind'];
  readonly name: string;
  readonly ticked: boolean;
  readonly colour: string | undefined;
  readonly amount: readonly AmountPart[] | string | null;
  readonly also: string;
  readonly when: string;
  readonly note: string;
  readonly standIn: string;
  readonly lookOut: string;
  readonly getFrom: string;
}

export interface ShownFor {
  /** Null for a series whose piece is not told: amounts are left open. */
  readonly made: MadeFor | null;
  /** The teacher's own yarns, to say which of them the student's stands for. */
  readonly pattern: Piece | null;
  readonly units: Units;
}

const KINDS = ['yarn', 'tool', 'material'] as const;

/** The list of a whole series, each thing once: yarn first, then tools, then what else is needed. */
export function gatherRows(lines: readonly GatheringLine[], shownFor: ShownFor): ShownLine[] {
  const merged = mergeLines(asWholeYarns(lines, shownFor.pattern));
  return KINDS.flatMap((kind) => merged.filter((line) => line.kind === kind).map((line) => rowOf(line, shownFor)));
}

/**
 * The list of one part, with its own amounts and words. A thing that other parts ask for too is gathered once: its tick
 * is that of all of them.
 * @param lines of all parts
 */
export function partRows(lines: readonly GatheringLine[], part: number, shownFor: ShownFor): ShownLine[] {
  const whole = mergeLines(asWholeYarns(lines, shownFor.pattern));
  const own = mergeLines(lines.filter((line) => line.part === part)).map((line) => {
    const all = whole.find(({ publicIds }) => line.publicIds.some((id) => publicIds.includes(id)));
    return all === undefined ? line : { ...line, publicIds: all.publicIds, ticked: all.ticked };
  });
  return KINDS.flatMap((kind) => own.filter((line) => line.kind === kind).map((line) => rowOf(line, shownFor)));
}

/** The role a yarn's amount speaks of: `yarn.<role>`, or the yarn of a band. */
export function roleOfKey(key: string | null, piece: Piece | null): string | undefined {
  return key === null || piece === null ? undefined : craftOf(piece).roleOfKey(key, piece);
}

const materialsOf = (made: MadeFor | null): readonly Material[] => (made === null ? [] : materialsToHave(made));

/**
 * A part may ask for the yarn of one band, or for what is left of a yarn; in the list of the whole series that is
 * within the yarn's own line already, and nobody should buy it twice.
 */
function asWholeYarns(lines: readonly GatheringLine[], pattern: Piece | null): GatheringLine[] {
  const whole = new Map<string, string>();
  for (const { kind, name, amountKey } of lines) {
    if (kind === 'yarn' && amountKey?.startsWith('yarn.') === true && !whole.has(name.toLowerCase())) whole.set(name.toLowerCase(), amountKey);
  }
  return lines.map((line) => {
    if (line.kind !== 'yarn' || line.amountKey?.startsWith('yarn.') === true) return line;
    const role = roleOfKey(line.amountKey, pattern);
    const own = role === undefined ? undefined : [...whole.values()].find((key) => key === `yarn.${role}`);
    const amountKey = own ?? (line.amountKey === null ? whole.get(line.name.toLowerCase()) : undefined);
    return amountKey === undefined ? line : { ...line, amountKey };
  });
}

/** What the amount of a line speaks of: its own key, or the yarn of the band it names. */
function materialOf(key: string | null, made: MadeFor | null): Material | undefined {
  const role = roleOfKey(key, made?.piece ?? null);
  return materialsOf(made).find((material) => material.key === key || (role !== undefined && material.role === role));
}

const yarnsOf = (piece: Piece): Readonly<Record<string, Yarn | undefined>> => ('yarns' in piece ? piece.yarns : {});

function patternYarnOf({ key, role }: Material, pattern: Piece): Yarn | undefined {
  if (role !== undefined) return yarnsOf(pattern)[role];
  return key === 'warp' && pattern.craft === 'frame-loom' ? pattern.warp.yarn : undefined;
}

function rowOf(line: MergedLine, shownFor: ShownFor): ShownLine {
  const { made, pattern, units } = shownFor;
  const material = line.kind === 'yarn' ? materialOf(line.amountKey, made) : undefined;
  const yarn = material?.yarn;
  const patternYarn = pattern === null || material === undefined ? undefined : patternYarnOf(material, pattern);
  return {
    key: line.publicIds.join('.'),
    items: line.publicIds,
    kind: line.kind,
    name: ownName(line.name, yarn, patternYarn),
    ticked: line.ticked,
    colour: material?.colour,
    amount: amountIn(line, made, units),
    also: line.kind === 'yarn' ? weightWords(line, material, shownFor) : '',
    when: partsWords(line.parts, line.untilPart),
    note: line.note ?? '',
    ...wordsFor(line, isOwnYarn(yarn, patternYarn)),
  };
}

/** Of a yarn she has already nobody need tell her where to get another, or what could stand in for it. */
function wordsFor({ standIn, lookOut, getFrom }: MergedLine, hasOwn: boolean): Pick<ShownLine, 'standIn' | 'lookOut' | 'getFrom'> {
  return hasOwn ? { standIn: '', lookOut: '', getFrom: '' } : { standIn: standIn ?? '', lookOut: lookOut ?? '', getFrom: getFrom ?? '' };
}

const isOwnYarn = (yarn: Yarn | undefined, pattern: Yarn | undefined): boolean => yarn !== undefined && pattern !== undefined && yarn !== pattern && yarn.label !== pattern.label;

/** Her own yarn under its own name, so that she finds it in her basket. */
function ownName(name: string, yarn: Yarn | undefined, pattern: Yarn | undefined): string {
  return isOwnYarn(yarn, pattern) ? `${yarn?.label ?? 'Your own yarn'} (for ${name})` : name;
}

/** Half way, in the place of an amount. */
const USED_UP: Readonly<Record<UsedUp, string>> = { woven: 'Woven', 'on-loom': 'On the loom' };

function amountIn({ amountKey, amountText: words }: MergedLine, made: MadeFor | null, units: Units): ShownLine['amount'] {
  if (amountKey === null || made === null) return words;
  const amount = amountToHave(amountKey, made);
  if (typeof amount === 'string') return USED_UP[amount];
  return amount.ok ? formatAmount(amount.value, units) : words;
}

/** Balls only where the line is all there is of its yarn: two lines of one yarn are rounded up together (`to-buy.ts`). */
function weightWords({ amountKey }: MergedLine, material: Material | undefined, { made, units }: ShownFor): string {
  if (material === undefined || material.grams === 0 || amountKey === null || amountKey.startsWith('band.')) return '';
  const weight = amountText(massOf(material.grams), units);
  const isAll = materialsOf(made).filter((one) => purchaseKey(one) === purchaseKey(material)).length === 1;
  return material.balls === undefined || !isAll ? weight : `${weight}, ${material.balls === 1 ? '1 ball' : `${material.balls} balls`}`;
}

/** `Parts 2, 3 and 5 to 7, kept until Part 9` */
export function partsWords(parts: readonly number[], untilPart: number | null): string {
  const last = Math.max(...parts);
  return `${partsList(parts)}${untilPart !== null && untilPart > last ? `, kept until Part ${untilPart}` : ''}`;
}

export interface YarnSum {
  readonly lengthMm: number;
  readonly grams: number;
}

/** All yarn to have in hand, of every role together. */
export function yarnSum(made: MadeFor): YarnSum {
  const all = materialsOf(made);
  return { lengthMm: all.reduce((sum, { lengthMm = 0 }) => sum + lengthMm, 0), grams: all.reduce((sum, { grams }) => sum + grams, 0) };
}

/** `36 cm inside, nails every 8 mm, doubled ends: 76 ends, woven 30 cm wide` */
export function loomWords(made: MadeFor, units: Units): string {
  return craftOf(made.piece).summary(made, units);
}

/** What the workings of every band have in common. */
import { below } from '#core/craft/reading/findings.ts';
import type { WovenBand } from '#core/craft/frame-loom/add-up.ts';
import type { BandByTechnique, TechniqueName } from '#core/craft/piece.ts';
import { asWound, type WarpWorkings } from '#core/craft/show-how/explain-warp.ts';
import { ofRole, type WeftWorkings } from '#core/craft/show-how/explain-weft.ts';
import { from, given, WEIGHS_NOTHING } from '#core/craft/show-how/notebook.ts';
import { setting, type OnLoom } from '#core/craft/show-how/on-loom.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput, WorkingUnit } from '#core/craft/show-how/working.ts';
import type { Carry } from '#core/craft/techniques/technique.ts';

/** The loom with its warp and every yarn written down: what bands go on from. */
export interface DressedWorkings extends OnLoom {
  readonly warp: WarpWorkings;
  readonly weft: WeftWorkings;
}

/** One band whose workings are written down. */
export interface BandOf<N extends TechniqueName> extends Omit<WovenBand, 'band'> {
  readonly on: DressedWorkings;
  readonly band: BandByTechnique[N];
  /** Of the ids: `bands.3.` */
  readonly prefix: string;
  readonly height: Working;
}

/** Thread of one yarn in one way of weaving, in one band. */
export interface ToldUse {
  readonly kind: 'tabby' | 'soumak' | 'rya' | 'roving' | 'hemStitch' | 'loopPile' | 'twining';
  readonly role: string;
  readonly carry: Carry;
  readonly thread: Working;
  /** Strands of the yarn that lie in it; the band's own strands that were counted one by one are yarn already. */
  readonly strands?: WorkingInput;
  /** Of one whole row. */
  readonly row?: Working;
  /** Of tabby, the rows from edge to edge. */
  readonly full?: Working;
}

export interface ToldBand {
  readonly uses: readonly ToldUse[];
  /** What there is to do, by kinds of work. */
  readonly work: Partial<Record<'rows' | 'colourChanges' | 'knots' | 'stitches' | 'hemBundles', Working>>;
}

type AnyBand = Pick<BandOf<TechniqueName>, 'index' | 'on'>;

/** A number the band says. */
export function asked(of: AnyBand, symbol: string, name: string, value: number, key: string, unit: WorkingUnit = 'count'): WorkingInput {
  return given({ symbol, name, value, unit }, `${below('/bands', of.index)}/${key}`, 'counted');
}

export const workingEnds = ({ on }: AnyBand): WorkingInput => asWound('E', on.warp.working);
export const spacing = ({ on }: AnyBand): WorkingInput => from('p', on.warp.spacing);
export const tail = ({ on }: AnyBand): WorkingInput => setting(on, 't', 'tailMm', WEIGHS_NOTHING);

/** Warp and weft together, the weft lying free. */
export function noteLoftSum({ on, prefix }: Pick<BandOf<TechniqueName>, 'on' | 'prefix'>, role: string): Working {
  const [warp, loft] = [on.warp.workingDiameter, ofRole(on.weft.threads, role).loft];
  return on.book.note({
    id: `${prefix}diameterSumMm`, name: 'warp and weft together, the weft lying free', formula: 'd1 + d', inputs: [from('d1', warp), from('d', loft)],
    value: warp.value + loft.value, unit: 'mm', ...RULES.arithmetic,
  });
}

/** So many rows of one length each. */
export function noteRows(of: Pick<BandOf<TechniqueName>, 'on' | 'prefix'>, kind: ToldUse['kind'], role: string, carry: Carry, rows: WorkingInput, row: Working): ToldUse {
  const thread = of.on.book.note({
    id: `${of.prefix}${kind}Mm.${role}`, name: 'thread of all rows', formula: `${rows.symbol} * L`, inputs: [rows, from('L', row)],
    value: Number(rows.value) * row.value, unit: 'mm', ...RULES.arithmetic,
  });
  return { kind, role, carry, thread, row, strands: ofRole(of.on.weft.threads, role).strands };
}

/** Every band: how high it comes out, what it is made of, and the yarn it takes. */
import type { WovenBand } from '#core/craft/frame-loom/add-up.ts';
import type { Band, TechniqueName } from '#core/craft/piece.ts';
import { asked, type BandOf, type DressedWorkings, type ToldBand, type ToldUse } from '#core/craft/show-how/bands/band.ts';
import { noteBand } from '#core/craft/show-how/bands/registry.ts';
import { ofRole } from '#core/craft/show-how/explain-weft.ts';
import { from, given, sumOf } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

type Way = Pick<Working, 'formula' | 'inputs' | 'source'>;

/** How a band that does not fill the rest gets its height. */
function heightWay(on: DressedWorkings, { band, index }: WovenBand): Way | undefined {
  const of = { on, index };
  const loft = (role: string): WorkingInput => from('d', ofRole(on.weft.threads, role).loft);
  switch (band.technique) {
    case 'soumak': {
      const rows = asked(of, 'r', 'rows', band.rows, 'rows');
      const between = asked(of, 'b', 'picks between two rows', band.tabbyBetween, 'tabbyBetween');
      const p2 = from('p2', ofRole(on.weft.spacings, band.tabbyYarn));
      return { formula: 'r * d + (r - 1) * b * p2', inputs: [rows, loft(band.yarn), between, p2], source: 'common practice: a row is as high as its yarn lies free' };
    }
    case 'twining':
      return { formula: 'r * d', inputs: [asked(of, 'r', 'rows', band.rows, 'rows'), loft(band.yarn)], source: 'common practice: a row is as high as its yarn lies free' };
    case 'hem-stitch':
      return { formula: '0', inputs: [], source: 'sewn into the cloth’s edge, it adds no height' };
    default:
      if (band.heightMm === undefined) return undefined;
      return { formula: 'h', inputs: [asked(of, 'h', 'height', band.heightMm, 'heightMm', 'mm')], source: RULES.asGiven.source };
  }
}

const isRule = ({ technique }: Band): boolean => technique === 'soumak' || technique === 'twining';

/** Heights by the bands' places; the one that fills the rest comes last. */
function noteHeights(on: DressedWorkings, bands: readonly WovenBand[]): ReadonlyMap<number, Working> {
  const heights = new Map<number, Working>();
  const note = ({ index, band, heightMm }: WovenBand, way: Way): void => {
    const trust = isRule(band) ? 'practice' : 'counted';
    heights.set(index, on.book.note({ id: `bands.${String(index)}.heightMm`, name: 'height of the band', ...way, value: heightMm, unit: 'mm', trust }));
  };
  for (const band of bands) {
    const way = heightWay(on, band);
    if (way !== undefined) note(band, way);
  }
  const others = [...heights].map(([index, height]) => from(`h${String(index)}`, height));
  const { heightMm } = on.piece.size;
  const all = given({ symbol: 'H', name: 'height of the cloth', value: heightMm, unit: 'mm' }, '/size/heightMm', 'counted');
  const rest: Way = { formula: `max(0, H - (${sumOf(others)}))`, inputs: [all, ...others], source: 'what the other bands leave' };
  for (const band of bands) {
    if (!heights.has(band.index)) note(band, rest);
  }
  return heights;
}

/** What a role's thread comes to in yarn: times its strands, but for strands that were counted by the band. */
function noteYarns(on: DressedWorkings, { index, woven }: WovenBand, uses: readonly ToldUse[]): void {
  for (const role of new Set(uses.map((use) => use.role))) {
    const own = uses.filter((use) => use.role === role);
    const threads = own.map(({ thread }, at) => from(`L${String(at)}`, thread));
    const strands = own[0]?.strands;
    on.book.note({
      id: `bands.${String(index)}.yarnMm.${role}`, name: `yarn ${role} in this band`, formula: strands === undefined ? sumOf(threads) : `(${sumOf(threads)}) * m`, inputs: strands === undefined ? threads : [...threads, strands],
      value: woven.uses.filter((use) => use.role === role).reduce((sum, use) => sum + use.yarnMm, 0), unit: 'mm', ...RULES.arithmetic,
    });
  }
}

export interface NotedBand extends ToldBand {
  readonly index: number;
}

export function noteBands(on: DressedWorkings, bands: readonly WovenBand[]): readonly NotedBand[] {
  const heights = noteHeights(on, bands);
  return bands.map((woven) => {
    const { index, band } = woven;
    const of = { ...woven, on, prefix: `bands.${String(index)}.`, height: ofIndex(heights, index), technique: band.technique };
    const told = noteBand(of as BandOf<TechniqueName> & { readonly technique: TechniqueName });
    noteYarns(on, woven, told.uses);
    return { ...told, index };
  });
}

function ofIndex(heights: ReadonlyMap<number, Working>, index: number): Working {
  const height = heights.get(index);
  if (height === undefined) throw new Error(`band ${String(index)} has no height`);
  return height;
}

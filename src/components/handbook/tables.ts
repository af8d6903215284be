/** The handbook's tables of numbers, each reckoned by the functions that reckon every plan. */
import { LOW_TIDE } from '#components/handbook/pattern.ts';
import { weftFacedCrimp } from '#core/craft/crimp.ts';
import { ASHENHURST_K, CARD_THICKNESS_MM, LOFT_RATIO } from '#core/craft/defaults.ts';
import { endsPerMm, workingSpacing } from '#core/craft/nails.ts';
import type { CountSystem } from '#core/craft/piece.ts';
import { roundUpTo } from '#core/craft/rounding.ts';
import { ryaCutLength, windingCard } from '#core/craft/techniques/rya.ts';
import { soumakRatio } from '#core/craft/techniques/soumak.ts';
import { readCount } from '#core/craft/yarn/count-text.ts';
import { COUNT_SYSTEMS, countFromTex, metresPer100gFromTex, texFromMetresPer100g, texFromYardsPerPound, yardsPerPoundFromTex } from '#core/craft/yarn/count.ts';
import { compressedFromLoft, loftFromWraps, texFromWraps } from '#core/craft/yarn/diameter.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { about, figure, MM_PER_INCH, size, type FigureTableData } from '#components/handbook/table-figures.ts';
import { TABLES_OF_FINISHING } from '#components/handbook/tables-of-finishing.ts';
import { TABLES_OF_PLANNING } from '#components/handbook/tables-of-planning.ts';
import { TABLES_OF_WEAVING } from '#components/handbook/tables-of-weaving.ts';

const SAID_OF_COUNTS: readonly { readonly says: string; readonly system: CountSystem }[] = [
  { says: 'Nm', system: 'nm' },
  { says: 'Ne, cotton', system: 'ne-cotton' },
  { says: 'Ne, worsted wool', system: 'ne-worsted' },
  { says: 'linen lea', system: 'lea' },
  { says: 'woollen run', system: 'run' },
  { says: 'denier', system: 'denier' },
];

function countConstants(): FigureTableData {
  const rows = SAID_OF_COUNTS.map(({ says, system }) => {
    const { kind, texOfOne } = COUNT_SYSTEMS[system];
    return [says, kind === 'direct' ? `count ÷ ${figure(1 / texOfOne)}` : `${figure(texOfOne, Number.isInteger(texOfOne) ? 0 : 1)} ÷ count`];
  });
  return {
    title: 'From a count to tex',
    columns: [{ name: 'the label says' }, { name: 'tex is' }],
    rows: [...rows, ['metres in 100 g', `${figure(texFromMetresPer100g(1))} ÷ metres`]],
    reckonedBy: 'By definition: one inch is 25.4 mm and one pound 453.59237 g, exactly.',
  };
}

const NAMED_YARNS: readonly { readonly name: string; readonly text: string; readonly system: CountSystem }[] = [
  { name: 'Fenwool 6/2', text: '6/2', system: 'nm' },
  { name: 'Saltmarsh warp 12/6', text: '12/6', system: 'nm' },
  { name: 'wool 2/16 Nm', text: '2/16', system: 'nm' },
  { name: 'cotton 8/2', text: '8/2', system: 'ne-cotton' },
  { name: 'cotton 8/4', text: '8/4', system: 'ne-cotton' },
  { name: 'cotton 12/9', text: '12/9', system: 'ne-cotton' },
  { name: 'linen 10/3 lea', text: '10/3', system: 'lea' },
];

function yarnCounts(): FigureTableData {
  const named = NAMED_YARNS.flatMap(({ name, text, system }) => {
    const read = readCount(text, system);
    return read === undefined ? [] : [{ name, tex: read.tex }];
  });
  const yarns = [...named, { name: 'label: 200 m in 100 g', tex: texFromMetresPer100g(200) }];
  return {
    title: 'The same yarns in different counts',
    columns: [{ name: 'yarn' }, { name: 'tex' }, { name: 'Nm' }, { name: 'Ne' }, { name: '100 g', unit: 'm' }, { name: '1 lb', unit: 'yd' }],
    rows: yarns.map(({ name, tex }) => [
      name,
      figure(tex),
      figure(countFromTex(tex, 'nm'), 2),
      figure(countFromTex(tex, 'ne-cotton'), 2),
      figure(metresPer100gFromTex(tex)),
      figure(yardsPerPoundFromTex(tex)),
    ]),
    reckonedBy: 'From the notation. Ne is the cotton count. A length on the label is better than any of these.',
  };
}

/** Loft over beaten thickness of soft knitting yarn: charts of wraps and weights imply 2 to 2.5. */
const LOFTY = 2.25;

function wraps(): FigureTableData {
  return {
    title: 'From wraps to thickness',
    columns: [{ name: 'wraps per inch' }, { name: 'free', unit: 'mm' }, { name: 'beaten, firm yarn', unit: 'mm' }, { name: 'beaten, lofty yarn', unit: 'mm' }, { name: '100 g, firm to lofty', unit: 'm' }],
    rows: [4, 5, 6, 8, 10, 12, 14, 16, 20, 24].map((count) => {
      const loft = loftFromWraps(count);
      const firm = metresPer100gFromTex(texFromWraps(count, ASHENHURST_K.weft));
      const lofty = firm * (LOFTY / LOFT_RATIO) ** 2;
      return [String(count), figure(loft, 1), figure(compressedFromLoft(loft), 1), figure(loft / LOFTY, 1), `${about(firm)} to ${about(lofty)}`];
    }),
    reckonedBy: 'The first column of figures is measured. The others are estimates: firm yarn by a rule of the trade, lofty yarn by what charts of knitting wool imply.',
  };
}

function spacings(): FigureTableData {
  return {
    title: 'Spacing of ends from the pitch of nails',
    columns: [{ name: 'pitch' }, { name: 'zigzag', unit: 'mm' }, { name: 'zigzag, ends in pairs', unit: 'mm' }, { name: 'two by two', unit: 'mm' }, { name: 'ends in 10 cm, zigzag' }],
    rows: [5, 6, MM_PER_INCH / 4, 8, 10, MM_PER_INCH / 2].map((pitchMm) => {
      const zigzag = { pitchMm, warping: 'zigzag' } as const;
      return [
        Number.isInteger(pitchMm) ? `${figure(pitchMm)} mm` : `1/${figure(MM_PER_INCH / pitchMm)} in`,
        size(workingSpacing(zigzag, 1)),
        size(workingSpacing(zigzag, 2)),
        size(workingSpacing({ pitchMm, warping: 'two-nail' }, 1)),
        figure(endsPerMm(zigzag) * 100),
      ];
    }),
    reckonedBy: 'Two ends leave each nail of a zigzag, one leaves each nail when you warp two by two.',
  };
}

const TIGHTNESS_SHOWN = { loosest: 0.3, middle: 0.4, tightest: 0.5 } as const;

/** tex of a weft that fills this share of the spacing together with the warp; undefined where the warp fills it alone. */
function weftTex(spacingMm: number, warpMm: number, share: number): number | undefined {
  const weftMm = share * spacingMm - warpMm;
  if (weftMm <= 0) return undefined;
  return texFromYardsPerPound((MM_PER_INCH / weftMm / ASHENHURST_K.weft) ** 2);
}

function weftForSpacing(): FigureTableData {
  const warp = threadOf(LOW_TIDE.piece.warp.yarn, ASHENHURST_K.warp);
  const tex = (spacingMm: number, share: number): string => {
    const value = weftTex(spacingMm, warp.compressedMm, share);
    return value === undefined ? '–' : about(value);
  };
  return {
    title: 'Weft that suits a spacing',
    columns: [{ name: 'spacing' }, { name: 'thinnest', unit: 'tex' }, { name: 'middle', unit: 'tex' }, { name: 'thickest', unit: 'tex' }, { name: 'middle, 100 g', unit: 'm' }],
    rows: [4, 5, 6, 8, 10, 12].map((spacingMm) => {
      const middle = weftTex(spacingMm, warp.compressedMm, TIGHTNESS_SHOWN.middle);
      return [
        `${figure(spacingMm)} mm`,
        tex(spacingMm, TIGHTNESS_SHOWN.loosest),
        tex(spacingMm, TIGHTNESS_SHOWN.middle),
        tex(spacingMm, TIGHTNESS_SHOWN.tightest),
        middle === undefined ? '–' : about(metresPer100gFromTex(middle)),
      ];
    }),
    reckonedBy: `Woollen weft on a cotton warp of ${figure(warp.tex)} tex; warp and weft together fill three, four and five tenths of the spacing. All strands of the weft counted together. A computed start: your own swatch is better.`,
  };
}

function takeUp(): FigureTableData {
  return {
    title: 'How much longer than the cloth is wide a row must be',
    columns: [{ name: 'share of the spacing filled' }, { name: 'longer by', unit: '%' }, { name: 'height of a hill 10 cm wide', unit: 'mm' }],
    rows: [0.25, 0.3, 0.35, 0.4, 0.5, 0.6].map((share) => {
      const crimp = weftFacedCrimp(share);
      // A flat hill is nearly a parabola: its length exceeds its base b by 8h²/3b.
      return [figure(share, 2), figure(crimp * 100, 1), figure(100 * Math.sqrt((3 * crimp) / 8))];
    }),
    reckonedBy: 'Weft-faced tabby on a straight warp, by the geometry of cloth that mills use. Low Tide as the pattern has it fills a third.',
  };
}

function soumakYarn(): FigureTableData {
  const { piece, plan } = LOW_TIDE;
  const cord = piece.bands.find((band) => band.technique === 'soumak');
  const yarn = cord === undefined ? undefined : piece.yarns[cord.yarn];
  if (yarn === undefined) throw new Error('the pattern has no soumak');
  const diameterSumMm = threadOf(piece.warp.yarn, ASHENHURST_K.warp).compressedMm + threadOf(yarn, ASHENHURST_K.weft).loftMm;
  const stitches = [{ over: 2, back: 1 }, { over: 3, back: 1 }, { over: 3, back: 2 }, { over: 4, back: 2 }, { over: 6, back: 3 }];
  return {
    title: 'Cord for one row of soumak',
    columns: [{ name: 'over and back' }, { name: 'gains', unit: 'ends' }, { name: 'cord, times the width' }],
    rows: stitches.map(({ over, back }) => [
      `${figure(over)}/${figure(back)}`,
      figure(over - back),
      figure(soumakRatio({ over, back, spacingMm: plan.ends.spacingMm, diameterSumMm }), 1),
    ]),
    reckonedBy: 'By our own geometry, without tails. Unravel one row of your own and compare.',
  };
}

const CUT_STEP_MM = 5;

function ryaLengths(): FigureTableData {
  const { piece, plan } = LOW_TIDE;
  const band = piece.bands.find((each) => each.technique === 'rya');
  const yarn = band === undefined ? undefined : piece.yarns[band.yarn];
  if (band === undefined || yarn === undefined) throw new Error('the pattern has no rya');
  const warp = threadOf(piece.warp.yarn, ASHENHURST_K.warp);
  const strand = threadOf(yarn, ASHENHURST_K.weft);
  return {
    title: 'Cut lengths for rya',
    columns: [{ name: 'pile' }, { name: 'trimmed', unit: 'mm' }, { name: 'cut', unit: 'mm' }, { name: 'card cut along one edge', unit: 'mm' }],
    rows: [{ pileMm: 20, trimMm: 5 }, { pileMm: 40, trimMm: 5 }, { pileMm: 80, trimMm: 5 }, { pileMm: 150, trimMm: 10 }, { pileMm: 250, trimMm: 10 }].map(({ pileMm, trimMm }) => {
      const cutMm = ryaCutLength({ legEnds: band.legEnds, strands: band.strands, spacingMm: plan.ends.spacingMm, warpDiameterMm: warp.compressedMm, strandLoftMm: strand.strandLoftMm, pileMm, trimMm });
      return [`${figure(pileMm)} mm`, figure(trimMm), figure(roundUpTo(cutMm, CUT_STEP_MM)), figure(windingCard(cutMm, CARD_THICKNESS_MM).widthMm)];
    }),
    reckonedBy: `By our own geometry, rounded up to ${figure(CUT_STEP_MM)} mm; a card ${figure(CARD_THICKNESS_MM)} mm thick. Knot one, hang it, and measure before you cut the rest.`,
  };
}

const TABLES = {
  'count-constants': countConstants,
  'yarn-counts': yarnCounts,
  wraps,
  spacings,
  'weft-for-spacing': weftForSpacing,
  'take-up': takeUp,
  'soumak-yarn': soumakYarn,
  'rya-lengths': ryaLengths,
  ...TABLES_OF_FINISHING,
  ...TABLES_OF_PLANNING,
  ...TABLES_OF_WEAVING,
} as const;

export type TableName = keyof typeof TABLES;

export function isTableName(name: string): name is TableName {
  return Object.hasOwn(TABLES, name);
}

export function tableNamed(name: TableName): FigureTableData {
  return TABLES[name]();
}

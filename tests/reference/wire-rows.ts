/**
 * The check rows that `POST /api/reckon` can be asked: the question as it is sent, and numbers or
 * codes of its answer, each with where the number comes from. `derived` ones were reckoned a second
 * way (exact fractions, bisection, counting); the worked piece is the house's own example.
 */
import workedPiece from './worked-piece.json' with { type: 'json' };

export interface WireRow {
  readonly row: string;
  readonly source: string;
  readonly question: unknown;
  /** Numbers of the answer by their place in it, as JSON pointers; `relative` 1e-7 unless told. */
  readonly numbers?: Readonly<Record<string, number>>;
  readonly relative?: number;
  readonly texts?: Readonly<Record<string, string>>;
  /** Codes of the warnings that come with the answer. */
  readonly warnings?: readonly string[];
  /** `code path` of each refusal instead of an answer. */
  readonly refused?: readonly string[];
}

const ASTM = 'ASTM D2260-03(2013)';
const HNPE = 'HNPE 7.1.6, conversion matrix';
const ASHENHURST = 'the "Ashenhurst" sheet of 1999';
const TAYLOR = 'J. T. Taylor, Cotton Weaving and Designing, p. 453';
const PEIRCE = 'Peirce 1937 as given by N. Balasubramanian';
const DERIVED = 'derived';

const yarn = (told: object): unknown => ({ what: 'yarn', yarn: told });
const count = (text: string, system: string, more: object = {}): unknown => yarn({ count: { text, system }, ...more });
const thick = (threadsPerInch: number): number => 25.4 / threadsPerInch;

const YARNS: readonly WireRow[] = [
  { row: '30 tex as cotton', source: ASTM, question: yarn({ tex: 30 }), numbers: { '/neCotton': 19.684708 } },
  { row: 'cotton 10 as worsted', source: ASTM, question: count('10', 'ne-cotton'), numbers: { '/neWorsted': 15 } },
  { row: 'cotton 1 as denier and Nm', source: ASTM, question: count('1', 'ne-cotton'), numbers: { '/denier': 5314.871227, '/nm': 1.6933618 } },
  { row: 'Nm 1', source: ASTM, question: count('1', 'nm'), numbers: { '/neCotton': 0.59054125, '/neWorsted': 0.88581187, '/lea': 1.6535155, '/run': 0.31003415, '/yardsPerPound': 496.05465 } },
  { row: 'Yorkshire 2.1875 is worsted 1', source: 'definition, 256 yd in a pound', question: count('2.1875', 'yorkshire'), numbers: { '/neWorsted': 1 } },
  { row: 'ten American grains', source: ASTM, question: count('10', 'grain'), numbers: { '/tex': 5.9054125 } },
  { row: 'jute 1', source: HNPE, question: count('1', 'jute'), numbers: { '/tex': 34.448239, '/nm': 29.02906, '/denier': 310.03415 } },
  { row: 'worsted 1 as denier', source: HNPE, question: count('1', 'ne-worsted'), numbers: { '/denier': 7972.3068 } },
  { row: 'lea 1 as denier', source: HNPE, question: count('1', 'lea'), numbers: { '/denier': 14881.639 } },
  { row: '8/2 cotton', source: ASHENHURST, question: count('8/2', 'ne-cotton'), numbers: { '/yardsPerPound': 3360, '/tex': 147.63531, '/metresPer100g': 677.34473, '/plies': 2, '/compressedDiameterMm': thick(52.168956) } },
  { row: '8/4 cotton sold as 1600 yd in a pound: the ball counts', source: 'a rigid-heddle project book, label', question: count('8/4', 'ne-cotton', { ball: { metres: 1463.04, grams: 453.59237 } }), numbers: { '/yardsPerPound': 1600, '/plies': 4 } },
  { row: '2/16 Nm', source: DERIVED, question: count('2/16', 'nm'), numbers: { '/tex': 125, '/metresPer100g': 800, '/yardsPerPound': 3968.4372, '/plies': 2 } },
  { row: '200 m in 100 g', source: DERIVED, question: yarn({ metresPer100g: 200 }), numbers: { '/tex': 500, '/nm': 2, '/yardsPerPound': 992.1093 } },
  { row: '2/8 cotton is written either way', source: 'common practice, no source', question: count('2/8', 'ne-cotton'), warnings: ['W_AMBIGUOUS'] },
  { row: 'silk counted as cotton', source: 'J. T. Taylor, p. 239', question: count('40/2', 'ne-cotton', { fibre: 'silk' }), numbers: { '/neCotton': 40 }, warnings: ['W_SILK'] },
  { row: 'tex 0', source: 'definition', question: yarn({ tex: 0 }), refused: ['E_RANGE /yarn/tex'] },
  { row: 'tex below 0', source: 'definition', question: yarn({ tex: -5 }), refused: ['E_RANGE /yarn/tex'] },
  { row: 'tex as text', source: 'definition', question: yarn({ tex: '400' }), refused: ['E_NUM /yarn/tex'] },
  ...([[15, 106.637], [32, 155.754], [60, 213.274], [200, 389.384]] as const).map(([cotton, threads]): WireRow => (
    { row: `threads of cotton ${String(cotton)} in an inch`, source: TAYLOR, question: count(String(cotton), 'ne-cotton', { ashenhurstK: 0.95 }), numbers: { '/compressedDiameterMm': thick(threads) }, relative: 1e-5 })),
  ...([[0.9, 0.8960071], [0.84, 0.9600076], [0.95, 0.8488488]] as const).map(([ashenhurstK, mm]): WireRow => (
    { row: `500 tex at K ${String(ashenhurstK)}`, source: ASHENHURST, question: yarn({ tex: 500, ashenhurstK }), numbers: { '/compressedDiameterMm': mm } })),
];

const takeUp = (told: object): unknown => ({ what: 'take-up', ...told });
const alike = (p: number): unknown => takeUp({ warpDiameterMm: 1, weftDiameterMm: 1, warpSpacingMm: p, weftSpacingMm: p, mode: 'balanced' });
const CLOTH = { warpDiameterMm: 0.9, weftDiameterMm: 1.5, warpSpacingMm: 4.2, weftSpacingMm: 1.8 };

const TAKE_UP: readonly WireRow[] = [
  { row: 'square cloth, jammed', source: PEIRCE, question: alike(2 * Math.sin(Math.PI / 3) * (1 + 1e-12)), numbers: { '/weft/crimp': 0.209199576, '/weft/angleRad': 1.04719755, '/warp/crimp': 0.209199576 }, relative: 1e-5 },
  { row: 'balanced cloth at half the wraps', source: DERIVED, question: alike(2), numbers: { '/weft/crimp': 0.143501109, '/weft/angleRad': 0.643501109 } },
  { row: 'weft on straight warp, r 0.4', source: DERIVED, question: takeUp({ warpDiameterMm: 1, weftDiameterMm: 1, warpSpacingMm: 5, weftSpacingMm: 1.5 }), numbers: { '/weft/crimp': 0.0811218774 } },
  { row: 'weft on straight warp, jammed', source: DERIVED, question: takeUp({ warpDiameterMm: 1, weftDiameterMm: 1, warpSpacingMm: 2, weftSpacingMm: 1.5 }), numbers: { '/weft/crimp': 0.570796327 } },
  { row: 'both yarns of one cloth', source: DERIVED, question: takeUp({ ...CLOTH, weftWaveMm: 1.8 }), numbers: { '/weft/lengthMm': 4.60105233, '/weft/angleRad': 0.459367162, '/warp/lengthMm': 1.91787515, '/warp/crimp': 0.0654861927, '/waveMm/min': 1.5874508, '/waveMm/max': 2.4 } },
  { row: 'too close by Peirce’s sum', source: PEIRCE, question: alike(1.7), refused: ['E_JAM /warpSpacingMm'] },
  { row: 'just not too close', source: PEIRCE, question: alike(1.74) },
  { row: 'straight warp closer than both yarns', source: DERIVED, question: takeUp({ ...CLOTH, warpSpacingMm: 2 }), refused: ['E_JAM /warpSpacingMm'] },
  { row: 'weft of a rug', source: 'a rigid-heddle project book, rug', question: takeUp({ warpDiameterMm: 0.8063228, weftDiameterMm: 1.7745198, warpSpacingMm: 6.35, weftSpacingMm: 25.4 / 21 }), numbers: { '/weft/crimp': 0.083791308 }, relative: 1e-6 },
];

const STITCHES: readonly WireRow[] = [
  { row: 'soumak 4/2', source: DERIVED, question: { what: 'soumak', over: 4, back: 2, spacingMm: 5, diameterSumMm: 4.18807977, ends: 62 }, numbers: { '/stitchMm': 33.157241, '/ratio': 3.3157241, '/stitches': 30, '/rowMm': 994.71723 } },
  { row: 'soumak 4/2 by the simple rule', source: DERIVED, question: { what: 'soumak', over: 4, back: 2, spacingMm: 5, diameterSumMm: 10 / Math.PI, ends: 62 }, numbers: { '/ratio': 3 } },
  {
    row: 'a rya fringe', source: DERIVED,
    question: { what: 'rya', legEnds: 1, strands: 3, spacingMm: 5, warpDiameterMm: 0.8014131, strandLoftMm: 25.4 / 7.5, pileMm: 150, trimMm: 10, ends: 62, edgeEnds: 0, rows: 1, cardThicknessMm: 2 },
    numbers: { '/bundleMm': 5.865879, '/wrapMm': 44.2805, '/cutMm': 364.2805, '/knotsPerRow': 31, '/strands': 93, '/yarnMm': 33878.09, '/cardExactMm': 180.1402, '/cardMm': 185 }, relative: 1e-6,
  },
  {
    row: 'strands of a rya rug', source: 'a published rya rug, its counts',
    question: { what: 'rya', legEnds: 1, strands: 3, spacingMm: 3.175, warpDiameterMm: 1, strandLoftMm: 1.5, pileMm: 30, trimMm: 5, ends: 128, edgeEnds: 0, rows: 60, cardThicknessMm: 2 },
    numbers: { '/knotsPerRow': 64, '/strands': 11520 },
  },
  {
    row: 'a triangle stepped out', source: 'derived by counting',
    question: { what: 'shape', shape: 'triangle', baseMm: 150, heightMm: 100, spacingMm: 5, pickSpacingMm: 1.4456241, ends: 62, symmetric: true },
    numbers: { '/rows': 69, '/endsTotal': 1038, '/areaMm2': 7502.789, '/trueAreaMm2': 7500, '/widths/0': 30, '/widths/2': 28, '/widths/68': 0 },
  },
];

const lengthText = (row: string, inches: number, round: 'nearest' | 'up', text: string): WireRow => (
  { row, source: DERIVED, question: { what: 'length-text', mm: inches * 25.4, system: 'imperial', round }, texts: { '/text': text } });

const TEXTS: readonly WireRow[] = [
  lengthText('the height on the loom', 16.06942, 'nearest', '16 1/16'),
  lengthText('the cord', 28.19579, 'nearest', '28 3/16'),
  lengthText('a frame is never too small', 13.77953, 'up', '13 13/16'),
  lengthText('half a sixteenth goes up', 12 + 1 / 32, 'nearest', '12 1/16'),
];

const piece = (changed: object): unknown => ({ what: 'piece', piece: { ...workedPiece, ...changed } });

const PIECES: readonly WireRow[] = [
  {
    row: 'the worked piece', source: DERIVED, question: piece({}), relative: 1e-6,
    numbers: {
      '/ends/raw': 61.22449, '/ends/count': 62, '/ends/nailsTop': 32, '/ends/nailsBottom': 31, '/ends/spacingMm': 5, '/ends/woundWidthMm': 305, '/ends/loomWidthMm': 306.1224,
      '/loom/insideWidthNeededMm': 350, '/loom/heightOnLoomMm': 408.1633, '/loom/heightNeededMm': 508.1633,
      '/weft/pickSpacingMm': 1.445624, '/weft/tightness': 0.36267, '/weft/crimp': 0.06651584, '/weft/stepMm': 5.332579, '/weft/turnMm': 3.19425, '/weft/pickMm': 328.4816,
      '/warp/netMm': 32770.1, '/warp/massG': 13.10804, '/warp/withMarginMm': 37685.6,
      '/yarns/A/netMm': 74915.1, '/yarns/A/massG': 41.6195, '/yarns/A/withMarginMm': 86152.4, '/yarns/A/loads': 10, '/yarns/A/rowsPerLoad': 24,
      '/yarns/T/netMm': 5491.949, '/yarns/B/netMm': 33878.09, '/yarns/C/netMm': 4378.869, '/yarns/R/netMm': 511.6479,
      '/bands/2/cutMm': 364.2805, '/bands/4/heightMm': 22.22041, '/bands/7/heightMm': 127.7796, '/bands/5/picks': 104,
      '/cut/spacerCard/widthMm': 325, '/cut/dowel/minDiameterMm': 6.19475, '/cut/cordMm': 716.173, '/massG': 108.8268, '/hours/likely': 6.512,
    },
  },
  { row: 'no parity asked', source: DERIVED, question: piece({ warp: { ...workedPiece.warp, parity: 'any' } }), numbers: { '/ends/count': 61, '/ends/nailsTop': 31, '/ends/nailsBottom': 31 } },
  { row: 'a frame of 500 mm', source: DERIVED, question: piece({ loom: { ...workedPiece.loom, insideHeightMm: 500 } }), refused: ['E_FIT /piece/loom/insideHeightMm'] },
  { row: 'odd ends pinned where even are asked', source: DERIVED, question: piece({ warp: { ...workedPiece.warp, endCount: 61 } }), refused: ['E_PARITY /piece/warp/endCount'] },
  { row: 'a rug’s ends', source: 'a rigid-heddle project book, rug', question: piece({ size: { widthMm: 533.4, heightMm: 400 }, loom: { ...workedPiece.loom, nailPitchMm: 12.7 }, allowances: { ...workedPiece.allowances, drawIn: 0 } }), numbers: { '/ends/count': 84 } },
  { row: 'nails a quarter inch apart', source: 'a published frame of eight strands to the inch', question: piece({ loom: { ...workedPiece.loom, nailPitchMm: 6.35 } }), numbers: { '/ends/spacingMm': 3.175 } },
  { row: 'pairs on nails a quarter inch apart', source: 'common practice, no source', question: piece({ loom: { ...workedPiece.loom, nailPitchMm: 12.7 }, warp: { ...workedPiece.warp, endsTogether: 2 } }), numbers: { '/ends/spacingMm': 12.7 } },
  { row: 'shrinking is divided out', source: 'Conference of Northern California Handweavers', question: piece({ size: { widthMm: 300, heightMm: 254 }, loom: { ...workedPiece.loom, insideHeightMm: 800 }, allowances: { ...workedPiece.allowances, relaxation: 0, wetShrinkage: 0.2 }, bands: [{ technique: 'tabby', yarn: 'A', fill: true }] }), numbers: { '/loom/heightOnLoomMm': 317.5 } },
];

const BRAID = { craft: 'macrame', rod: { kind: 'rod', diameterMm: 20 }, yarns: { main: { diameterMm: 3 } }, columns: [{ name: 'braid', yarn: 'main', cords: 2, sections: [{ technique: 'square-knots', heightMm: 900 }] }] };
const knotted = (changed: object): unknown => ({ what: 'piece', piece: { ...BRAID, ...changed } });
const WOOL = { craft: 'dyeing', fibre: { kind: 'wool', massG: 250 }, mordant: { agent: 'alum' }, tartar: {}, dye: { percent: 100 }, iron: {} };
const dyed = (changed: object): unknown => ({ what: 'piece', piece: { ...WOOL, ...changed } });
const SCARF = {
  craft: 'rigid-heddle', size: { widthMm: 200, lengthMm: 1500 }, heddle: { spacingMm: 2.54 }, picksPerCm: 4, yarns: { warp: { tex: 250 }, weft: { tex: 250 } },
  allowances: { drawIn: 0.08, widthShrinkage: 0.05, lengthShrinkage: 0.05, takeUp: 0.1, fringeMm: 200 },
};
const heddled = (changed: object): unknown => ({ what: 'piece', piece: { ...SCARF, ...changed } });

const OTHER_CRAFTS: readonly WireRow[] = [
  {
    row: 'a braid of 86 square knots: a lark’s head of 2π·26 mm, twice 86·48 mm and a tail', source: 'derived; 16 and 3.5 diameters a knot, common practice, no source',
    question: knotted({}), numbers: { '/heightMm': 903, '/knots': 86, '/ends': 4, '/columns/0/cutMm': 8519.362818, '/columns/0/ruleMm': 7224, '/yarns/main/netMm': 17038.725636, '/yarns/main/withMarginMm': 18742.5982, '/rod/lengthMm': 93.8 },
  },
  { row: 'square knots on five cords', source: 'a square knot is tied with four ends', question: knotted({ columns: [{ yarn: 'main', cords: 5, sections: [{ technique: 'square-knots', knots: 3 }] }] }), refused: ['E_PARITY /piece/columns/0/cords'] },
  { row: 'cord of no thickness', source: 'definition', question: knotted({ yarns: { main: { diameterMm: 0 } } }), refused: ['E_RANGE /piece/yarns/main/diameterMm'] },
  {
    row: '250 g of wool with alum, tartar, weld and iron', source: 'percentages of published recipes; 30 litres a kilogram, common practice, no source', question: dyed({}),
    numbers: { '/bathLitres': 7.5, '/steps/1/agents/0/massG': 37.5, '/steps/1/agents/1/massG': 15, '/steps/2/agents/0/massG': 250, '/steps/3/agents/0/massG': 5, '/hours/likely': 3 },
  },
  { row: 'cotton without tannin', source: 'published recipes', question: dyed({ fibre: { kind: 'cotton', massG: 100 }, mordant: { agent: 'aluminium-acetate' }, tartar: undefined }), numbers: { '/steps/1/agents/0/massG': 8 }, warnings: ['W_TANNIN'] },
  { row: 'chrome is not given', source: 'poisonous to people and waters', question: dyed({ mordant: { agent: 'chrome' } }), refused: ['E_ENUM /piece/mordant/agent'] },
  {
    row: 'a scarf at ten to the inch: 200/0.92/0.95/2.54 ends of 1500/0.95/0.9 + 200 + 610 mm', source: DERIVED, question: heddled({}),
    numbers: { '/ends/raw': 90.091713, '/ends/count': 90, '/ends/widthInHeddleMm': 228.832952, '/warpEndMm': 2564.385965, '/picks': 600, '/yarns/warp/netMm': 230794.736842, '/yarns/warp/massG': 57.698684 },
  },
  {
    row: '84 ends of 68 inches, where the book lists 160 yards', source: 'a rigid-heddle project book, rug',
    question: heddled({ size: { widthMm: 533.4, lengthMm: 1016 }, heddle: { spacingMm: 6.35 }, allowances: { drawIn: 0, widthShrinkage: 0, lengthShrinkage: 0, takeUp: 0, fringeMm: 101.6, wasteMm: 609.6 } }), numbers: { '/ends/count': 84, '/warpEndMm': 1727.2, '/yarns/warp/netMm': 145084.8 },
  },
  { row: 'a heddle too narrow', source: DERIVED, question: heddled({ heddle: { spacingMm: 2.54, widthMm: 228 } }), refused: ['E_FIT /piece/heddle/widthMm'] },
  { row: 'a craft nobody knows', source: 'definition', question: { what: 'piece', piece: { ...WOOL, craft: 'pottery' } }, refused: ['E_ENUM /piece/craft'] },
];

export const WIRE_ROWS: readonly WireRow[] = [...YARNS, ...TAKE_UP, ...STITCHES, ...TEXTS, ...PIECES, ...OTHER_CRAFTS];

/** The value at a JSON pointer. */
export function at(answer: unknown, pointer: string): unknown {
  return pointer.split('/').slice(1).reduce<unknown>((value, key) => (typeof value === 'object' && value !== null ? (value as Readonly<Record<string, unknown>>)[key] : undefined), answer);
}

interface Answered {
  readonly status: number;
  readonly body: unknown;
}

const codes = (findings: unknown): readonly { readonly code: string; readonly path: string }[] => (Array.isArray(findings) ? findings as { code: string; path: string }[] : []);

/** What of a row does not hold in an answer over HTTP; empty where all does. */
export function faultsOf(row: WireRow, { status, body }: Answered): string[] {
  if (row.refused !== undefined) {
    const refused = codes(at(body, '/problems')).map(({ code, path }) => `${code} ${path}`);
    return status === 422 && refused.join() === row.refused.join() ? [] : [`${status}: ${refused.join()}`];
  }
  if (status !== 200) return [`${status}: ${JSON.stringify(body)}`];
  const numbers = Object.entries(row.numbers ?? {}).flatMap(([pointer, expected]) => {
    const actual = at(body, pointer);
    return typeof actual === 'number' && Math.abs(actual - expected) <= (row.relative ?? 1e-7) * Math.max(Math.abs(expected), 1e-9) ? [] : [`${pointer}: ${JSON.stringify(actual)}, not ${expected}`];
  });
  const texts = Object.entries(row.texts ?? {}).flatMap(([pointer, expected]) => (at(body, pointer) === expected ? [] : [`${pointer}: ${JSON.stringify(at(body, pointer))}, not ${expected}`]));
  const warned = codes(at(body, '/warnings')).map(({ code }) => code);
  const missing = (row.warnings ?? []).filter((code) => !warned.includes(code));
  return [...numbers, ...texts, ...missing.map((code) => `no ${code}`)];
}

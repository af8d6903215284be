/** Woven pieces, one for each way in which one can differ. */
import { EXAMPLE } from '#core/craft/frame-loom/example.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { lowTide } from '../../../../support/low-tide.ts';
import { pieceWith, PLAIN_PIECE } from '../a-piece.ts';

export const loom = (more: Partial<FrameLoomPiece['loom']>): Partial<FrameLoomPiece> => ({ loom: { ...PLAIN_PIECE.loom, ...more } });
export const FILL = PLAIN_PIECE.bands[0];
const { beat: _, ...UNBEATEN } = PLAIN_PIECE;
const PILE: Band = { technique: 'rya', name: 'pile', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 50, trimMm: 10, rows: 4, heightMm: 40 };
const SOUMAK: Band = { technique: 'soumak', name: 'ridge', yarn: 'ground', over: 4, back: 2, rows: 3, tabbyBetween: 2, tabbyYarn: 'ground' };

export const WOVEN_PIECES: Readonly<Record<string, FrameLoomPiece>> = {
  'the example': EXAMPLE,
  'the worked piece': await lowTide(),
  'plain': PLAIN_PIECE,
  'doubled ends along two nails': pieceWith({ ...loom({ warping: 'two-nail' }), warp: { yarn: { tex: 400 }, endsTogether: 2, parity: 'odd' } }),
  'every second nail, a width of its own, thick nails': pieceWith(loom({ nailPitchMm: 5, everyNthNail: 2, insideWidthMm: 400, nailDiameterMm: 3 })),
  'two rows of nails': pieceWith(loom({ kind: 'two-row-frame', nailPitchMm: 16 })),
  'the inner of two rows': pieceWith(loom({ kind: 'two-row-frame', nailPitchMm: 10, nailRows: 'inner' })),
  'notches': pieceWith(loom({ kind: 'notched-frame', warping: 'two-nail', nailPitchMm: 6 })),
  'ends that are given': pieceWith({ warp: { yarn: { tex: 400, strands: 2 }, endCount: 70, tieMm: 200 } }),
  'balanced, rows as the ends': { ...UNBEATEN, mode: 'balanced' },
  'balanced, counted': pieceWith({ mode: 'balanced', beat: { picksPerCm: 2.5 } }),
  'a wave that is given': { ...pieceWith({ mode: 'given', beat: { picksPerCm: 5 } }), weftWaveMm: 1.2 } as FrameLoomPiece,
  'a take-up that was measured': { ...pieceWith({ mode: 'measured', beat: { picksPerCm: 4 } }), takeUp: 0.08, warpTakeUp: 0.03 } as FrameLoomPiece,
  'a take-up nobody knows': pieceWith({ mode: 'measured', beat: { picksPerCm: 4 } }),
  'every allowance of its own': pieceWith({ ...loom({ insideHeightMm: 700 }), allowances: { drawIn: 0.05, relaxation: 0.03, wetShrinkage: 0.04, topMm: 70, bottomMm: 80, tailMm: 60, loadMm: 5000, marginWeft: 0.2, marginWarp: 0.12 } }),
  'basket weave and a doubled weft': pieceWith({ yarns: { ground: { metresPer100g: 180 }, sky: { tex: 300 } }, bands: [{ technique: 'tabby', name: 'basket', yarn: 'ground', basket: true, heightMm: 100 }, { technique: 'tabby', name: 'double', yarn: 'sky', strands: 2, heightMm: 60 }, FILL] }),
  'yarn of many strands, and labels': pieceWith({ warp: { yarn: { tex: 400, label: 'Fenwool warp', ball: { metres: 250, grams: 100 } } }, yarns: { ground: { tex: 100, strands: 4, label: 'Estuary', colour: '#2f5366', ball: { metres: 300, grams: 30 } } } }),
  'a dowel that it is lashed to': pieceWith({ ...loom({ insideHeightMm: 600 }), dowel: { diameterMm: 20, lengthMm: 350, fixing: 'lashed' }, finish: { bottom: 'knotted', fringeMm: 60, bundleEnds: 6 } }),
  'ends that are twisted': pieceWith({ ...loom({ insideHeightMm: 700 }), dowel: { diameterMm: 8, fixing: 'tied' }, finish: { bottom: 'twisted', fringeMm: 90 }, hangs: 'turned' }),
  'every technique with a name': pieceWith({
    ...loom({ insideHeightMm: 700 }), size: { widthMm: 300, heightMm: 560 },
    yarns: { ground: { metresPer100g: 180 }, foam: { tex: 500 }, oat: { tex: 20_000 } },
    bands: [
      { technique: 'hem-stitch', name: 'edge', yarn: 'ground', bundleEnds: 3, reachPicks: 3 }, PILE, SOUMAK,
      { technique: 'loop-pile', name: 'loops', yarn: 'foam', rows: 4, rodMm: 8, heightMm: 24 }, { technique: 'twining', name: 'twined', yarn: 'foam', rows: 3 }, FILL,
    ],
  }),
};

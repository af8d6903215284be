/** A corner of a hanging seen close, so that single threads show: beside the door, at the shop front, on the way of a series. */
import type { ClothShape, TabbyBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';

const ENDS = 54;
const SLACK_WATER = '#93a8a6';
const DRY_SAND = '#cdbb94';
const ESTUARY = '#2f5366';
const SAMPHIRE = '#7d8a5a';

/** A wedge on ends `from` to `to` that narrows to two ends in `rows` picks, `lean` (0..1) of it at the left. */
function wedge(yarn: string, colour: string, from: number, to: number, lean: number, rows: number): ClothShape {
  const spans = Array.from({ length: rows }, (_, row) => {
    const narrower = (row / rows) * (to - from - 2);
    return { row, from: Math.round(from + narrower * lean), to: Math.round(to - narrower * (1 - lean)) };
  });
  return { yarn, colour, spans };
}

function tabby(yarn: string, colour: string, heightMm: number, picks: number, shapes: readonly ClothShape[] = []): TabbyBand {
  return { technique: 'tabby', name: undefined, heightMm, colour, yarn, picks, cover: 0.7, shapes };
}

/** Half of it is woven; the rest is warp that waits, so that the cloth is high enough for a tall window. */
export const LOW_TIDE_NEAR: WovenPiece = {
  kind: 'woven', title: 'Low Tide at close range', thing: 'wall hanging', widthMm: 540, ends: ENDS, endsTogether: 1, warpColour: '#d8d2c1', seed: 17, turned: false, loom: undefined,
  bands: [
    tabby('Slack Water', SLACK_WATER, 60, 9),
    { technique: 'soumak', name: undefined, heightMm: 62, colour: ESTUARY, yarn: 'Estuary', rows: 4, over: 4, back: 2, soumakShare: 0.8, tabbyBetween: 1, tabbyColour: SLACK_WATER },
    tabby('Dry Sand', DRY_SAND, 22, 3),
    tabby('Slack Water', SLACK_WATER, 324, 45, [
      wedge('Dry Sand', DRY_SAND, 0, 32, 0.1, 30),
      wedge('Samphire', SAMPHIRE, 28, ENDS, 0.9, 40),
      wedge('Estuary', ESTUARY, 12, 34, 0.6, 12),
    ]),
  ],
};

/** The first woven row goes opposite to the row that holds the spacer card (common practice, no source): as the cloth is drawn. */
import { describe, expect, test } from 'vitest';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { SLACK, wovenPiece } from '../unit/core/craft/cloth/pieces.ts';

const CARD = '#c9b48a';
const WARP = '#d8d2c1';

/** Ends that the dashes of a stroke lie on, of so many, each `end` px wide. */
function endsUnder(look: string, end: number, ends: number): number[] {
  const [, on = '', off = ''] = /stroke-dasharray="([\d.]+) ([\d.]+)"/.exec(look) ?? [];
  const start = -Number(/stroke-dashoffset="(-?[\d.]+)"/.exec(look)?.[1]);
  const [middle, repeat] = [start + Number(on) / 2, Number(on) + Number(off)];
  const found: number[] = [];
  for (let x = middle; x < end * ends; x += repeat) found.push(Math.round(x / end - 0.5) + 0);
  return found;
}

/** A stroke with the line it lies on. */
interface Drawn {
  readonly look: string;
  readonly rows: readonly number[];
}

function strokesIn(svg: string): Drawn[] {
  const kept = new Map([...svg.matchAll(/<path id="([^"]+)" d="([^"]+)"\/>/g)].map(([, id = '', d = '']) => [id, d]));
  return [...svg.matchAll(/<(?:use href="#([^"]+)"|path d="([^"]+)")([^>]*)\/>/g)].map(([, id, d, look = '']) => {
    const way = d ?? kept.get(id ?? '') ?? '';
    return { look, rows: [...way.matchAll(/M[-\d.]+ ([-\d.]+)/g)].map(([, y]) => Number(y)) };
  });
}

describe.each([12, 13, 24, 25, 96, 97])('C7: a band of %i picks on the loom', (picks) => {
  test.each([24, 66])('with %i ends begins opposite to the card at every end', (ends) => {
    const band = { technique: 'tabby', name: undefined, heightMm: picks * 3, colour: SLACK, yarn: 'Slack Water', picks, cover: 0.7, shapes: [] } as const;
    const piece = wovenPiece({ ends, widthMm: 400, bands: [band], loom: { insideWidthMm: 480, insideHeightMm: 900, bottomMm: 80 } });
    const svg = drawCloth(piece, { id: 'a', as: 'loom', width: 720, woven: 1 });
    const strokes = strokesIn(svg);
    const [, inner = ''] = /translate\(([\d.]+) 0\)/.exec(svg) ?? [];
    const end = (720 - 2 * Number(inner)) / ends;

    const cardAt = strokes.findIndex(({ look }) => look.includes(`stroke="${shade(CARD, 0.28)}"`));
    const overCard = strokes.slice(cardAt).find(({ look }) => look.includes(`stroke="${WARP}"`) && look.includes('dasharray'));
    const warpInFront = endsUnder(overCard?.look ?? '', end, ends);

    const tones = [shade(SLACK, 0.06), SLACK, light(SLACK, 0.06)];
    const beads = strokes.filter(({ look }) => look.includes('dasharray') && tones.some((tone) => look.includes(`stroke="${tone}"`)));
    const lowest = Math.max(...beads.flatMap(({ rows }) => rows));
    const first = beads.find(({ rows }) => rows.includes(lowest));
    const weftInFront = endsUnder(first?.look ?? '', end, ends);

    expect(warpInFront).toHaveLength(ends / 2);
    expect(weftInFront).toHaveLength(ends / 2);
    /* Where the warp lies over the card the weft lies over the warp: card and first row are on different faces everywhere. */
    expect(weftInFront).toEqual(warpInFront);
  });
});

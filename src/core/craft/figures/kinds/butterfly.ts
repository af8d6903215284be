/** A butterfly: figures of eight, tied at the waist, the yarn drawn from the middle. */
import { num } from '#core/craft/cloth/markup.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { stageOf, stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { countWords, lengthWords } from '#core/craft/figures/length-words.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import { butterflyLength } from '#core/craft/picks.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { ceilSafe } from '#core/craft/rounding.ts';
import type { Units } from '#core/units/units.ts';

const LEFT = 150;
const RIGHT = 410;
const Y = 122;
const EIGHTS = 5;
/** From thumb to little finger, spread: common practice, 15 to 20 cm. */
const HAND_MM = 160;

export const BUTTERFLY: Figure = {
  title: 'Butterfly',
  height: 250,
  describe: ({ piece, plan, units }) =>
    `Yarn wound in figures of eight round thumb and little finger, taken off and tied twice round the waist. It is drawn from the end you began with. ${windWords(piece, units)} One weaves about ${countWords(rowsPerLoad(plan.yarns), 'row', 'rows')}.`,
  steps: () => [
    { weight: 5, words: 'Lay the end in the palm and wind figures of eight round thumb and little finger.' },
    { weight: 2, words: 'Take it off and tie the last end twice round the waist. Draw from the end you began with.' },
  ],
  draw: (scene, input, progress) => {
    const [wind, tie] = stages(progress, [5, 2] as const);
    const colour = techniqueColour(input, 'tabby');
    post(scene, LEFT, 'thumb');
    post(scene, RIGHT, 'little finger');
    layStrand(scene, { colour, width: 6.5, runs: [{ level: LEVEL.warp - 1, points: trail(LEFT - 96, Y + 74).bend(LEFT - 40, Y + 66, LEFT - 16, Y + 30).points }] });
    for (let i = 0; i < EIGHTS; i++) layStrand(scene, { colour, width: 6.5, runs: eight(i) }, stageOf(wind, i, EIGHTS));
    for (let i = 0; i < 3; i++) layStrand(scene, { colour, width: 6.5, runs: [{ level: LEVEL.tool + i, points: waist(i) }] }, stageOf(tie, i, 3));
    if (progress < 1) return;
    handWay(scene, trail(LEFT - 60, Y + 92).bend(LEFT - 90, Y + 100, LEFT - 124, Y + 96).points);
    words(scene, 8, Y + 122, 'draw from here', { size: 17, quiet: true });
    words(scene, 280, 36, 'tied at the waist', { anchor: 'middle', size: 17, quiet: true });
  },
};

/** `A hand that spans 16 cm winds 8 m in 25 of them.` */
function windWords({ allowances = {}, mode = 'straight-warp', beat }: FrameLoomPiece, units: Units): string {
  const { loadMm } = settingsOf(allowances, mode, beat);
  return `A hand that spans ${lengthWords(HAND_MM, units, 'size')} winds ${lengthWords(loadMm, units, 'yarn')} in ${String(ceilSafe(loadMm / butterflyLength(1, HAND_MM)))} of them.`;
}

function rowsPerLoad(yarns: Readonly<Record<string, { readonly rowsPerLoad: number }>>): number {
  return Math.max(0, ...Object.values(yarns).map((yarn) => yarn.rowsPerLoad));
}

/** A finger is a post: what matters is the way of the yarn. */
function post(scene: Scene, x: number, text: string): void {
  scene.add(LEVEL.ground, `<circle class="draw-line" cx="${x}" cy="${Y}" r="19" stroke="#111e33" stroke-width="1.5" stroke-dasharray="4 4"/>`);
  words(scene, x, Y + 84, text, { anchor: 'middle' });
}

/** One figure of eight, a little wider than the one before it. */
function eight(index: number): Run[] {
  const out = 24 + index * 7;
  const level = LEVEL.warp + index * 2;
  return [
    { level, points: trail(LEFT, Y + out).curve(LEFT + 70, Y + out, RIGHT - 70, Y - out, RIGHT, Y - out).points },
    { level, points: trail(RIGHT, Y - out).curve(RIGHT + out * 1.3, Y - out, RIGHT + out * 1.3, Y + out, RIGHT, Y + out).points },
    { level: level + 1, points: trail(RIGHT, Y + out).curve(RIGHT - 70, Y + out, LEFT + 70, Y - out, LEFT, Y - out).points },
    { level: level + 1, points: trail(LEFT, Y - out).curve(LEFT - out * 1.3, Y - out, LEFT - out * 1.3, Y + out + 7, LEFT, Y + out + 7).points },
  ];
}

function waist(index: number): { x: number; y: number }[] {
  const x = 270 + index * 9;
  return trail(x - 4, Y + 34).bend(x - 9, Y, x, Y - 34).points.map((p) => ({ x: Number(num(p.x)), y: p.y }));
}

import { describe, it } from 'vitest';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import { FIGURE_KINDS, FIGURES } from '#core/craft/figures/figure-kinds.ts';
import { stepsOf } from '#core/craft/figures/figure-steps.ts';
import { figureWords, type AnyFigureInput } from '#core/craft/figures/figures.ts';
import { EXAMPLE as KNOTTED } from '#core/craft/macrame/example.ts';
import { planPiece } from '#core/craft/plan.ts';
import { pieceWith, planOf, PLAIN_PIECE } from '../a-piece.ts';
import { hangingOf, planOf as planOfKnotted } from '../macrame/a-hanging.ts';
import { expectKept, gistOf, marksOf } from '../../../../support/kept.ts';
import { INPUT, PIECE } from './figure-input.ts';

const woven = (parts: Parameters<typeof pieceWith>[0]): AnyFigureInput => {
  const piece = pieceWith(parts);
  return { piece, plan: planOf(piece), units: 'cm' };
};
const knotted = (piece: ReturnType<typeof hangingOf>): AnyFigureInput => ({ piece, plan: planOfKnotted(piece), units: 'cm' });

/** One input for each way a figure can differ. */
const INPUTS: Readonly<Record<string, AnyFigureInput>> = {
  'the example piece': INPUT,
  'the example piece in inches': { ...INPUT, units: 'in' },
  'doubled ends along two nails, without colours': woven({ warp: { yarn: { tex: 400 }, endsTogether: 2 }, loom: { ...PLAIN_PIECE.loom, warping: 'two-nail' } }),
  'every second nail and a dowel': woven({ loom: { ...PLAIN_PIECE.loom, nailPitchMm: 5, everyNthNail: 2 }, dowel: { diameterMm: 12 } }),
  'a piece without bands': { ...INPUT, piece: { ...PIECE, bands: [], yarns: {} }, plan: { ...INPUT.plan, bands: [], yarns: {} } },
  'the knotted example': (() => {
    const plan = planPiece(KNOTTED);
    if (!plan.ok) throw new Error('the example cannot be made');
    return { piece: KNOTTED, plan: plan.value, units: 'cm' };
  })(),
  'a braid with a gathering knot, in inches': { ...knotted(hangingOf([{ technique: 'square-knots', knots: 4 }, { technique: 'gathering', wraps: 8 }, { technique: 'fringe', heightMm: 90 }])), units: 'in' },
  'a braid of yarn told by its grist': knotted({ ...hangingOf([{ technique: 'plain', heightMm: 100 }]), yarns: { main: { tex: 4000 } } }),
};

/** Of the first piece, through the whole movement; of the others, enough to see in what they differ. */
const MOMENTS = [0, 0.04, 0.1, 0.18, 0.25, 0.34, 0.42, 0.5, 0.58, 0.66, 0.75, 0.84, 0.92, 0.97, 1];
const FEW = [0.5, 1];

/** Of the inputs, those of the figure's own craft: any other shows the example. */
const inputsOf = (kind: string): [string, AnyFigureInput][] => {
  const craft = kind in FIGURES.macrame ? 'macrame' : 'frame-loom';
  return Object.entries(INPUTS).filter(([, { piece }]) => piece.craft === craft);
};

describe.each(FIGURE_KINDS)('the figure "%s" as it was found good', (kind) => {
  const file = new URL(`../../../../fixtures/figures/${kind}.json`, import.meta.url);

  it('says the same of each piece, and is drawn alike at every moment', () => {
    for (const [at, [name, input]] of inputsOf(kind).entries()) {
      expectKept(file, name, {
        words: figureWords(kind, input),
        steps: stepsOf(kind, input).map(({ words, until }) => `${until.toFixed(3)} ${words}`),
        moments: Object.fromEntries((at === 0 ? MOMENTS : FEW).map((moment) => [`at ${moment.toFixed(2)}`, gistOf(drawFigure(kind, input, moment))])),
      });
    }
  });

  it('has every thread where it was when the movement is done', () => {
    const [first] = inputsOf(kind);
    if (first === undefined) throw new Error(`no piece for ${kind}`);
    expectKept(file, 'done', marksOf(drawFigure(kind, first[1])));
  });
});

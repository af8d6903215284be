/** Loop pile: loops of the weft drawn up from a pick, over a rod or by hand. */
import type { LoopPileBand, LoopSize } from '#core/craft/piece.ts';
import { pickLength } from '#core/craft/picks.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import { BAND_HEIGHT, readName, readRole, ROWS } from '#core/craft/techniques/read-rules.ts';
import { pickKey, picksOn, rowsOf, threadOn, type DressedLoom, type Technique, type TechniqueWords, type Woven } from '#core/craft/techniques/technique.ts';

/** Weft of one loop: round a rod and pinched at its foot, or twice the height it is drawn to. */
export function loopLength(size: LoopSize, loftMm: number): number {
  return size.rodMm === undefined ? 2 * size.loopMm : Math.PI * (size.rodMm + loftMm);
}

/** The weft lies on top of every second end, and there it is drawn up; the selvedge ends stay plain. */
export function loopsPerRow(ends: number): number {
  return Math.max(0, Math.floor((ends - 2) / 2));
}

/** One pick with its loops. */
export function loopRow(pickMm: number, loops: number, loopMm: number): number {
  return pickMm + loops * loopMm;
}

const ROD: NumberRule = { name: 'Thickness of the rod', min: 'over-zero', max: 500, unit: 'mm' };
const LOOP: NumberRule = { name: 'Height of a loop', min: 'over-zero', max: 1000, unit: 'mm' };

function readSize(fields: Fields): LoopSize {
  if (fields.has('rodMm') && fields.has('loopMm')) {
    fields.take('loopMm');
    fields.reject('E_ENUM', 'loopMm', 'Loops are made over a rod or drawn to a height. Give one of the two.');
  }
  return fields.has('loopMm') && !fields.has('rodMm') ? { loopMm: fields.number('loopMm', LOOP) } : { rodMm: fields.number('rodMm', ROD) };
}

function weave(band: LoopPileBand, _heightMm: number, loom: DressedLoom): Woven {
  const thread = threadOn(loom, band.yarn);
  const loops = loopsPerRow(loom.workingEnds);
  const rowMm = loopRow(pickLength(loom.workingEnds, picksOn(loom, { role: band.yarn })), loops, loopLength(band, thread.loftMm));
  const stitches = band.rows * loops;
  return {
    picks: { key: pickKey({ role: band.yarn }), rows: band.rows, rawRows: band.rows },
    counts: { picks: band.rows, stitches },
    uses: [rowsOf(band.yarn, 'shuttle', band.rows, rowMm, thread)],
    work: { rows: band.rows, stitches },
  };
}

export const LOOP_PILE_WORDS: TechniqueWords = {
  label: 'Loop pile',
  how: 'A row of tabby is laid loosely, and drawn up between the ends into loops, over a rod or by hand.',
  tools: ['rod, for loops all alike', 'comb'],
  cautions: ['Leave the rod in until the next row is beaten down.', 'Weave two rows of tabby after it, or a pull at one loop draws out its neighbours.'],
};

export const loopPile: Technique<'loop-pile'> = {
  read: (fields) => ({
    technique: 'loop-pile',
    ...readName(fields),
    yarn: readRole(fields),
    ...readSize(fields),
    rows: fields.number('rows', ROWS),
    heightMm: fields.number('heightMm', BAND_HEIGHT),
  }),
  roles: (band) => [{ key: 'yarn', role: band.yarn, picks: { role: band.yarn } }],
  height: (band) => band.heightMm,
  check: () => undefined,
  weave,
};

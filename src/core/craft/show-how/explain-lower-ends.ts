/** Warp that the finish of the lower ends takes. */
import { FRINGE_BUNDLE_ENDS, HANDLE_MM, KNOT_DIAMETERS, TUCKED_MM, TWIST_RATIO } from '#core/craft/defaults.ts';
import { endsForFinish } from '#core/craft/hanging.ts';
import type { Finish } from '#core/craft/piece.ts';
import type { ThreadWorkings } from '#core/craft/show-how/explain-thread.ts';
import { from, standing, type Notebook } from '#core/craft/show-how/notebook.ts';
import { givenOr } from '#core/craft/show-how/on-loom.ts';
import { DEFAULTS, RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

interface Taken {
  readonly formula: string;
  readonly inputs: readonly WorkingInput[];
}

function takenBy({ bottom, fringeMm, bundleEnds }: Finish, thread: ThreadWorkings): Taken {
  const fringe = givenOr({ symbol: 'f', name: 'fringe left to see', value: fringeMm ?? 0, unit: 'mm' }, '/finish/fringeMm', fringeMm !== undefined, DEFAULTS.noFringe);
  switch (bottom) {
    case 'tucked':
      return { formula: 't', inputs: [standing({ symbol: 't', name: 'end tucked into the cloth', value: TUCKED_MM, unit: 'mm' }, DEFAULTS.tucked)] };
    case 'plain':
      return { formula: 'f', inputs: [fringe] };
    case 'twisted':
      return { formula: 'f * r', inputs: [fringe, standing({ symbol: 'r', name: 'warp over the length of its cord', value: TWIST_RATIO, unit: 'ratio' }, DEFAULTS.twist)] };
    case 'knotted':
      return {
        formula: 'f + n * sqrt(k) * d + h',
        inputs: [
          fringe,
          standing({ symbol: 'n', name: 'bundle thicknesses in a knot', value: KNOT_DIAMETERS, unit: 'ratio' }, DEFAULTS.knot),
          givenOr({ symbol: 'k', name: 'ends in a bundle', value: bundleEnds ?? FRINGE_BUNDLE_ENDS, unit: 'count' }, '/finish/bundleEnds', bundleEnds !== undefined, DEFAULTS.bundle),
          from('d', thread.loft),
          standing({ symbol: 'h', name: 'room for the hand', value: HANDLE_MM, unit: 'mm' }, DEFAULTS.handle),
        ],
      };
  }
}

/** `loftMm` is one warp end lying free. */
export function noteLowerEnds(book: Notebook, finish: Finish, thread: ThreadWorkings, loftMm: number): Working {
  return book.note({ id: 'loom.finishMm', name: 'warp the finish takes', ...takenBy(finish, thread), value: endsForFinish(finish, loftMm), unit: 'mm', ...RULES.fringe });
}

/** How a cloth is looked at: where it stands, how large, how much of it is woven. Sizes are CSS pixels. */

export interface ClothView {
  /** Begins every id in the drawing: a letter, then letters, figures and hyphens. One page, one id for each cloth. */
  readonly id: string;
  /**
   * `hanging`: from its dowel, with cord and shadow. `loom`: in its frame, growing upwards. `strip`: bands from the head
   * down, first one at the head. `lying`: the strip from left to right. `swatch`: the bare cloth.
   */
  readonly as: 'hanging' | 'loom' | 'strip' | 'lying' | 'swatch';
  readonly width: number;
  /** Of strips and swatches (for `lying` it is the length). The other views find theirs from the piece. */
  readonly height?: number;
  /** How much is woven, 0..1 of the woven height. Default 1. */
  readonly woven?: number;
  /** Which end of the screen holds the first row. Default: the head for strips and for a turned piece that hangs, else the foot. */
  readonly begin?: 'head' | 'foot';
  /** `near` shows plies and fewer, larger threads: for a hero picture or a magnifier. */
  readonly range?: 'far' | 'near';
  /** Least pixels of a drawn end and of a drawn row. Default by `as` and `range`. */
  readonly minEnd?: number;
  readonly minPick?: number;
  /** Pixels in a millimetre, where the picture does not show the whole width of the piece. */
  readonly pxPerMm?: number;
  /** Empty room at both sides of a strip or swatch. */
  readonly pad?: number;
  /** How far the fell line stands out past both selvedges. */
  readonly fellOut?: number;
  /** `false` leaves the fell line away. */
  readonly fell?: boolean;
  /** `false` leaves away the warp that waits beyond the fell. */
  readonly openWarp?: boolean;
  /** Hidden from screen readers, because the same stands in words beside it. */
  readonly decorative?: boolean;
  /** Words for screen readers instead of the description of the whole piece. */
  readonly label?: string;
  /** Units of the description. Default cm. */
  readonly units?: 'cm' | 'in';
}

interface Detail {
  readonly minEnd: number;
  readonly minPick: number;
}

/** Level of detail when the view does not say: finer threads than these are grouped. */
export function detailOf(view: ClothView): Detail {
  const found = defaultDetail(view);
  return { minEnd: view.minEnd ?? found.minEnd, minPick: view.minPick ?? found.minPick };
}

function defaultDetail(view: ClothView): Detail {
  if (view.range === 'near') return { minEnd: 20, minPick: 13 };
  if (view.as === 'strip' || view.as === 'lying') return { minEnd: 5, minPick: 4.2 };
  if (view.as === 'swatch') return { minEnd: 7, minPick: 5 };
  return { minEnd: 3.4, minPick: 2.8 };
}

/** Throws on a view that only a slip of the programmer can make. */
export function checkView(view: ClothView): void {
  if (!/^[a-z][a-z0-9-]*$/i.test(view.id)) throw new RangeError(`A cloth's id must be letters, figures and hyphens: "${view.id}"`);
  if (!(view.width >= 8 && view.width <= 4000)) throw new RangeError(`A cloth cannot be ${view.width} px wide`);
}

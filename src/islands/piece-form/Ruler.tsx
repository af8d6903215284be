import { memo } from 'react';
import type { ClothBox } from '#core/craft/cloth/cloth-box.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

interface RulerProps {
  readonly box: ClothBox;
  readonly heightMm: number;
  /** Pixels of the picture it stands beside. */
  readonly pictureHeight: number;
  readonly units: Units;
}

const WIDTH = 40;
/** A number every so many, a short line every so many. */
const MARKS = { cm: { mm: 10, numbers: 10, lines: 5 }, in: { mm: MM_PER_INCH, numbers: 4, lines: 1 } } as const;

/** Heights beside the drawing, counted from the first row, as one measures on the loom. */
export const Ruler = memo(function Ruler({ box, heightMm, pictureHeight, units }: RulerProps) {
  const { mm, numbers, lines } = MARKS[units];
  const most = Math.floor(heightMm / mm + 1e-6);
  const marks = Array.from({ length: Math.floor(most / lines) + 1 }, (_, step) => step * lines);
  const y = (mark: number): number => box.top + (box.begin === 'foot' ? box.height - mark * mm * box.pxPerMm : mark * mm * box.pxPerMm);
  const far = (mark: number): boolean => mark % numbers === 0;
  return (
    <svg className="ruler" viewBox={`0 0 ${String(WIDTH)} ${String(pictureHeight)}`} width={WIDTH} height={pictureHeight} aria-hidden="true">
      {marks.map((mark) => <path key={mark} d={`M${String(far(mark) ? WIDTH - 10 : WIDTH - 5)} ${y(mark).toFixed(1)}H${String(WIDTH)}`} />)}
      {marks.filter(far).map((mark) => <text key={mark} x={WIDTH - 14} y={(y(mark) + 4.5).toFixed(1)} textAnchor="end">{mark}</text>)}
    </svg>
  );
});

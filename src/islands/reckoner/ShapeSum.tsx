import { memo, useDeferredValue } from 'react';
import type { ShapeSection } from '#core/reckoner/answer-shape.ts';

/** The shape as it is woven, from the foot up: drawn, and told row by row, in the frame after the numbers. */
export const ShapeSum = memo(function ShapeSum({ section }: { section: ShapeSection }) {
  const { drawing, runs } = useDeferredValue(section);
  if (drawing === undefined) return null;
  const { widthMm, heightMm, shape, warp, rows } = drawing;
  return (
    <div className="mb-5 grid items-start gap-5 hand:grid-cols-[220px_minmax(0,1fr)]">
      <svg className="stepped" viewBox={`0 0 ${widthMm} ${heightMm}`} role="img" aria-label="The shape in whole ends and rows, its first row at the foot">
        <path className="ground" d={`M0 0h${widthMm}v${heightMm}h${-widthMm}z`} />
        <path className="ends" d={warp} vectorEffect="non-scaling-stroke" />
        <path className="figure" d={shape} />
        <path className="rows" d={rows} vectorEffect="non-scaling-stroke" />
      </svg>
      {runs !== undefined && (
        <div>
          <h3 className="h4">Row by row, from the foot</h3>
          <ol className="runs" tabIndex={runs.length > 24 ? 0 : undefined} aria-label="Ends in each row">
            {runs.map(({ first, last, ends }) => (
              <li key={first}>{first === last ? `Row ${first}` : `Rows ${first} to ${last}`}: <b>{ends} {ends === 1 ? 'end' : 'ends'}</b></li>
            ))}
          </ol>
        </div>
      )}
    </div>
  );
});

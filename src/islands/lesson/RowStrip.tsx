const WIDTH = 1_000;
const HEIGHT = 22;
/** Finer rows could not be told apart. */
const MOST_SHOWN = 100;

/** A band as cloth: woven up to its fell, bare warp after. The same stands in words beside it. */
export function RowStrip({ rows, of }: { rows: number; of: number }) {
  const fell = WIDTH * Math.min(1, rows / of);
  const shown = Math.min(of, MOST_SHOWN);
  const pick = WIDTH / shown;
  return (
    <svg className="row-strip" viewBox={`0 0 ${String(WIDTH)} ${String(HEIGHT)}`} preserveAspectRatio="none" aria-hidden="true">
      <path className="bare" d={[4, 8, 12, 16].map((y) => `M0 ${String(y)}h${String(WIDTH)}`).join('')} />
      <rect className="woven" y="1" width={fell} height={HEIGHT - 2} />
      <path className="picks-of" d={Array.from({ length: Math.floor(fell / pick) }, (_, at) => `M${((at + 1) * pick).toFixed(1)} 1v${String(HEIGHT - 2)}`).join('')} />
      <rect className="fell-edge" x={Math.max(0, fell - 5)} width="10" height={HEIGHT} />
      <rect className="fell" x={Math.max(1, fell - 3)} width="6" height={HEIGHT} />
    </svg>
  );
}

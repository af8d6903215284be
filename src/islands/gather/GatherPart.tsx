import type { ShownLine } from '#core/gathering/rows.ts';
import { useTicks } from '#islands/ticks/use-ticks.ts';
import { GatherRows } from './GatherRows.tsx';
import { KeptHere } from './KeptHere.tsx';

interface GatherPartProps {
  /** Revision of the seat's ticks the lines were read with. */
  asOf: number;
  series: string;
  part: number;
  lines: readonly ShownLine[];
  /** Where the list goes without script. */
  action: string;
}

/** What one part needs, beside its text. */
export function GatherPart({ asOf, series, part, lines, action }: GatherPartProps) {
  const ticks = useTicks(series, asOf);
  const had = lines.filter(ticks.isTicked).length;
  return (
    <form method="post" action={action} aria-labelledby="gather-title">
      <input type="hidden" name="series" value={series} />
      <div className="row between">
        <h2 className="h3" id="gather-title">Gather for Part {part}</h2>
        <span className="small quiet num">{had} of {lines.length}</span>
      </div>
      <KeptHere here={ticks.here} />
      <div className="lined">
        <GatherRows lines={lines} ticks={ticks} />
      </div>
      <noscript><button className="btn btn-wide" type="submit">Keep my ticks</button></noscript>
    </form>
  );
}

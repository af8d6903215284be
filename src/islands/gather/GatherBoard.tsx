import { listText } from '#core/gathering/list-text.ts';
import type { ShownLine } from '#core/gathering/rows.ts';
import { KeepSeries } from '#islands/keeping/KeepSeries.tsx';
import { useTicks, type Ticks } from '#islands/ticks/use-ticks.ts';
import { GatherRows } from './GatherRows.tsx';
import { GatherSum, type GatherSumProps } from './GatherSum.tsx';
import { ShareList } from './ShareList.tsx';
import { KeptHere } from './KeptHere.tsx';

export interface GatherBoardProps {
  /** Revision of the seat's ticks the lines were read with; null without a seat. */
  asOf: number | null;
  series: string;
  lines: readonly ShownLine[];
  /** Where the list goes without script. */
  action: string;
  sum: Omit<GatherSumProps, 'left' | 'total'>;
  /** Of the list, as its text begins. */
  title: string;
  /** The list as plain text. */
  textHref: string;
}

/** The list to shop by, and beside it what is still to get. */
export function GatherBoard({ asOf, ...board }: GatherBoardProps) {
  return asOf === null ? <Board {...board} ticks={null} /> : <TickedBoard {...board} asOf={asOf} />;
}

function TickedBoard({ asOf, ...board }: Omit<GatherBoardProps, 'asOf'> & { asOf: number }) {
  return <Board {...board} ticks={useTicks(board.series, asOf)} />;
}

function Board({ series, lines, action, sum, title, textHref, ticks }: Omit<GatherBoardProps, 'asOf'> & { ticks: Ticks | null }) {
  const had = (some: readonly ShownLine[]): number => (ticks === null ? 0 : some.filter(ticks.isTicked).length);
  const groups = ([['yarn', sum.material], ['tool', 'Tools'], ['material', 'Material']] as const).map(([kind, title]) => ({ kind, title, own: lines.filter((line) => line.kind === kind) })).filter(({ own }) => own.length > 0);
  return (
    <>
      <form method="post" action={action} className="gather-list">
        <input type="hidden" name="series" value={series} />
        {ticks !== null && (
          <div className="row between">
            <p><b className="num">{had(lines)} of {lines.length} gathered</b></p>
            <KeptHere here={ticks.here} />
          </div>
        )}
        {groups.map(({ kind, title, own }) => (
          <section key={kind} className={kind === 'yarn' ? 'gather-group' : 'gather-group cols'} aria-labelledby={`gather-${kind}`}>
            <h2 className="h3" id={`gather-${kind}`}>
              {title}
              {ticks !== null && <span className="small quiet">{had(own)} of {own.length}</span>}
            </h2>
            <div className="lined">
              <GatherRows lines={own} ticks={ticks} />
            </div>
          </section>
        ))}
        {ticks !== null && <noscript><button className="btn btn-act keep-ticks" type="submit">Keep my ticks</button></noscript>}
      </form>
      <div className="gather-more no-print">
        <ShareList title={title} textNow={() => listText(lines, { title, material: sum.material, ...(ticks !== null && { isTicked: ticks.isTicked }) })} address={textHref} />
        {ticks !== null && <KeepSeries series={series} />}
      </div>
      <GatherSum {...sum} left={lines.length - had(lines)} total={lines.length} />
    </>
  );
}

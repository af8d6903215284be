import type { ShownLine } from '#core/gathering/rows.ts';
import { Parts } from '#islands/ui/Parts.tsx';
import { TickRow } from '#islands/ui/TickRow.tsx';
import type { Ticks } from '#islands/ticks/use-ticks.ts';

interface GatherRowsProps {
  lines: readonly ShownLine[];
  ticks: Ticks;
}

/** Lines to tick, each with what a form without script needs to tell what was changed. */
export function GatherRows({ lines, ticks }: GatherRowsProps) {
  return lines.map((line) => (
    <div key={line.key} className="gather-row">
      <input type="hidden" name="shown[]" value={line.key} />
      {line.ticked && <input type="hidden" name="had[]" value={line.key} />}
      <TickRow
        name="gathered[]"
        value={line.key}
        checked={ticks.isTicked(line.key)}
        unsent={ticks.isUnsent(line.key)}
        onTick={(ticked) => ticks.tick(line, ticked)}
        what={line.name}
        yarn={line.kind === 'yarn' ? (line.colour ?? '') : undefined}
        much={line.amount === null ? undefined : typeof line.amount === 'string' ? line.amount : <Parts parts={line.amount} />}
        also={line.also === '' ? undefined : line.also}
        more={<MoreWords line={line} />}
      />
    </div>
  ));
}

function MoreWords({ line: { when, note, standIn } }: { line: ShownLine }) {
  return (
    <>
      {when !== '' && <span className="block">{when}</span>}
      {note !== '' && <span className="block">{note}</span>}
      {standIn !== '' && <span className="block"><b>Or:</b> {standIn.charAt(0).toLowerCase()}{standIn.slice(1)}</span>}
    </>
  );
}

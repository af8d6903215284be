import type { ShownLine } from '#core/gathering/rows.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { Parts } from '#islands/ui/Parts.tsx';
import { TickRow } from '#islands/ui/TickRow.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';
import type { Ticks } from '#islands/ticks/use-ticks.ts';

interface GatherRowsProps {
  lines: readonly ShownLine[];
  /** Null for whoever has nothing to tick: without a seat. */
  ticks: Ticks | null;
}

/** Lines of a gathering list, each with its amount; to be ticked by who has a seat. */
export function GatherRows({ lines, ticks }: GatherRowsProps) {
  return lines.map((line) => (ticks === null ? <BareRow key={line.key} line={line} /> : <LiveRow key={line.key} line={line} ticks={ticks} />));
}

/** Holds what a form without script needs to tell which ticks were changed. */
function LiveRow({ line, ticks }: { line: ShownLine; ticks: Ticks }) {
  return (
    <div className="gather-row">
      <input type="hidden" name="shown[]" value={line.key} />
      {line.ticked && <input type="hidden" name="had[]" value={line.key} />}
      <TickRow
        name="gathered[]"
        value={line.key}
        checked={ticks.isTicked(line)}
        unsent={ticks.isUnsent(line)}
        onTick={(ticked) => ticks.tick(line, ticked)}
        what={line.name}
        yarn={line.kind === 'yarn' ? (line.colour ?? '') : undefined}
        much={muchOf(line)}
        also={line.also === '' ? undefined : line.also}
        more={moreOf(line)}
      />
    </div>
  );
}

/** On paper it has a box to tick all the same. */
function BareRow({ line }: { line: ShownLine }) {
  const much = muchOf(line);
  return (
    <div className="tick bare">
      <span className="box"><Glyph name="on" /></span>
      <span className="what">{line.kind === 'yarn' && <YarnDot colour={line.colour} />}{line.name}</span>
      {much !== undefined && <span className="much">{much}</span>}
      <span className="more">{moreOf(line)}</span>
      {line.also !== '' && <span className="also">{line.also}</span>}
    </div>
  );
}

function muchOf({ amount }: ShownLine) {
  if (amount === null) return undefined;
  return typeof amount === 'string' ? amount : <Parts parts={amount} />;
}

function moreOf({ when, note, standIn, lookOut, getFrom }: ShownLine) {
  return (
    <>
      <span className="gather-when">{when}.</span> {note !== '' && <span className="gather-note">{note}</span>}
      {lookOut !== '' && <span className="gather-note"><b>Look out for:</b> {lookOut}</span>} {getFrom !== '' && <span className="gather-or"><b>From:</b> {getFrom}</span>}
      {standIn !== '' && <span className="gather-or"><b>Or:</b> {standIn.charAt(0).toLowerCase()}{standIn.slice(1)}</span>}
    </>
  );
}

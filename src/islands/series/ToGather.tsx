/** Everything to gather for the piece as it is being tried: yarn by length and weight, then tools and what else. */
import { amountOf } from '#core/craft/amounts.ts';
import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import type { MadeOf } from '#core/craft/craft.ts';
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';
import type { MergedLine } from '#core/gathering/merge.ts';
import { yarnTable } from '#core/gathering/yarn-table.ts';
import { formatAmount, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { useTried } from '#islands/series/trial-store.ts';
import { Parts } from '#islands/ui/Parts.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';

type Made = MadeOf<Piece, Plan>;

export interface ToGatherProps {
  /** Null while the piece is not described: then lists say only what their teacher wrote. */
  readonly made: Made | null;
  readonly units: Units;
  /** Reckoned for her own loom already: by what she typed, or by her own piece. */
  readonly own: boolean;
  readonly lines: readonly MergedLine[];
}

export function ToGather({ lines, ...given }: ToGatherProps) {
  const { made, units, own } = useTried() ?? given;
  const tools = made === null ? lines : lines.filter(({ kind }) => kind !== 'yarn');
  const standIns = tools.filter(({ standIn }) => standIn !== null);
  return (
    <>
      {made !== null && (
        <>
          <p className="small quiet">For {own ? 'your own' : 'the pattern’s'} piece, {craftOf(made.piece).size(made, units)}, with a margin.</p>
          <YarnRows made={made} units={units} />
          <h3 className="mt-5">Tools and what else</h3>
        </>
      )}
      <ul className="tools mt-2">
        {tools.map((line) => <li key={line.publicIds.join()}><span>{line.name}</span><span className="num small quiet"><HowMuch line={line} made={made} units={units} /></span></li>)}
      </ul>
      {/* It may have been opened before the script came. */}
      {standIns.length > 0 && (
        <details className="stand-ins mt-3" suppressHydrationWarning>
          <summary>What can stand in for what</summary>
          <dl className="lined small">{standIns.map((line) => <div key={line.publicIds.join()}><dt>{line.name}</dt><dd>{line.standIn}</dd></div>)}</dl>
        </details>
      )}
    </>
  );
}

function YarnRows({ made: { piece, plan }, units }: { readonly made: Made; readonly units: Units }) {
  const { words } = craftOf(piece);
  const { lines, grams } = yarnTable(piece, plan);
  return (
    <div className="scrolls" tabIndex={0} role="region" aria-label={`${words.material} to gather`}>
      <table className="table mt-2">
        <caption className="hide">{words.material} to gather</caption>
        <thead><tr><th scope="col">{words.material}</th><th scope="col" className="num">Length</th><th scope="col" className="num">Weight</th></tr></thead>
        <tbody>
          {lines.map(({ name, detail, colour, lengthMm, grams: weight }) => (
            <tr key={`${name} ${detail} ${colour ?? ''}`}>
              <th scope="row" className="yarn-name"><YarnDot colour={colour} />{name}{detail !== '' && <span className="quiet"> {detail}</span>}</th>
              <td className="num">{lengthMm !== undefined && <Parts parts={formatAmount(lengthOf(lengthMm, 'yarn'), units)} />}</td>
              <td className="num"><Parts parts={formatAmount(massOf(weight), units)} /></td>
            </tr>
          ))}
        </tbody>
        <tfoot><tr><th scope="row">{words.allMaterial}</th><td /><td className="num"><Parts parts={formatAmount(massOf(grams), units)} /></td></tr></tfoot>
      </table>
    </div>
  );
}

function HowMuch({ line: { amountKey, amountText: words }, made, units }: { readonly line: MergedLine; readonly made: Made | null; readonly units: Units }) {
  const amount = amountKey === null || made === null ? null : amountOf(amountKey, made.piece, made.plan);
  const parts: readonly AmountPart[] = amount?.ok === true ? formatAmount(amount.value, units) : [{ kind: 'text', text: words ?? '' }];
  return <Parts parts={parts} />;
}

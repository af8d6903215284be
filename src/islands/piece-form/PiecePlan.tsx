import { lazy, memo } from 'react';
import type { Found } from '#core/craft/piece-form/judge-typed.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { amountIn } from '#core/craft/frame-loom/amounts.ts';
import { materials } from '#core/craft/frame-loom/materials.ts';
import { yarnLines } from '#core/gathering/yarn-lines.ts';
import { formatAmount, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { fieldId } from '#islands/ui/field-id.ts';
import { Findings } from '#islands/ui/Findings.tsx';
import { Parts } from '#islands/ui/Parts.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';
import { Later } from './Later.tsx';
import { placeOfField } from './piece-form-state.ts';

const PlanWorkings = lazy(async () => ({ default: (await import('./PlanWorkings.tsx')).PlanWorkings }));

interface PiecePlanProps {
  /** Null while nothing could be reckoned yet. */
  readonly made: { readonly piece: FrameLoomPiece; readonly plan: FrameLoomPlan } | null;
  readonly isOld: boolean;
  readonly warnings: readonly Found[];
  readonly yarns: TypedPiece['yarns'];
  readonly units: Units;
}

const ROWS = ['ends', 'spacing', 'nails', 'warp', 'loom.width', 'loom.height', 'spacer.height', 'dowel.length', 'cord', 'mass', 'hours'] as const;
const SHORT: Readonly<Record<string, string>> = {
  nails: 'Nails above', 'loom.width': 'Loom, inside', 'loom.height': 'Nail to nail', warp: 'Warp in all',
  'spacer.height': 'Spacer card', 'dowel.length': 'Dowel', mass: 'It weighs', hours: 'At the loom',
};

/** All numbers of the piece, as a student with the same loom would get them, and what is worth a look. */
export const PiecePlan = memo(function PiecePlan({ made, isOld, warnings, yarns, units }: PiecePlanProps) {
  return (
    <aside className="plan stack" aria-label="Plan">
      <h2 className="h3">Plan</h2>
      {made === null ? <p className="quiet">Ends, rows, yarn and hours stand here once the piece can be woven.</p> : <Numbers {...made} units={units} isOld={isOld} />}
      {made !== null && <Later title="How it is reckoned">{() => <PlanWorkings piece={made.piece} units={units} />}</Later>}
      {warnings.length > 0 && (
        <div className="notice">
          <h3 className="h4">Worth a look</h3>
          <Findings found={warnings.map(({ field, says, code }) => ({ code, says: <><a href={`#${fieldId(field)}`}>{placeOfField(field, { yarns }) || 'The piece'}</a>: {says}</> }))} />
        </div>
      )}
    </aside>
  );
});

function Numbers({ piece, plan, units, isOld }: { readonly piece: FrameLoomPiece; readonly plan: FrameLoomPlan; readonly units: Units; readonly isOld: boolean }) {
  const rows = plan.bands.reduce((sum, { picks = 0 }) => sum + picks, 0);
  const lines = ROWS.flatMap((key): { label: string; parts: readonly AmountPart[] }[] => {
    const reckoned = amountIn(key, { piece, plan });
    return typeof reckoned === 'string' ? [] : [{ label: SHORT[key] ?? reckoned.label, parts: formatAmount(reckoned.quantity, units) }];
  });
  const [ends, ...more] = lines;
  const { lines: yarns } = yarnLines(materials({ piece, plan }));
  return (
    <>
      {isOld && <p className="small quiet">As it was before.</p>}
      <table className="table plan-table">
        <caption className="hide">Numbers of the piece</caption>
        <tbody>
          {ends !== undefined && <Line {...ends} />}
          <Line label="Rows of tabby" parts={[{ kind: 'number', text: String(rows) }]} />
          {more.map((line) => <Line key={line.label} {...line} />)}
        </tbody>
      </table>
      <h3 className="h4">Yarn, with some to spare</h3>
      <table className="table plan-table">
        <caption className="hide">Yarn to have in hand</caption>
        <tbody>
          {yarns.map(({ name, detail, colour, lengthMm, grams }) => (
            <tr key={`${name}${detail}${colour ?? ''}`}>
              <th scope="row"><span className="dyed"><YarnDot colour={colour} />{detail === '' ? name : detail}</span></th>
              <td className="num"><Parts parts={formatAmount(lengthOf(lengthMm ?? 0, 'yarn'), units)} /></td>
              <td className="num"><Parts parts={formatAmount(massOf(grams), units)} /></td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}

function Line({ label, parts }: { readonly label: string; readonly parts: readonly AmountPart[] }) {
  return <tr><th scope="row">{label}</th><td className="num"><Parts parts={parts} /></td></tr>;
}

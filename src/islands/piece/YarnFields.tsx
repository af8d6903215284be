import type { Dispatch } from 'react';
import { AS_PATTERN, YARN_BY } from '#core/craft/my-piece/asked-of-mine.ts';
import { isOwnYarn, yarnOf, type TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import type { FittedPiece } from '#core/craft/fit.ts';
import type { FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import { gristAsked } from '#core/craft/piece-form/asked-of-yarn.ts';
import { textOf } from '#core/craft/piece-form/typed-piece.ts';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import { Field, Select } from '#islands/ui/Field.tsx';
import { Fold } from '#islands/ui/Fold.tsx';
import { Parts } from '#islands/ui/Parts.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';
import type { MineEvent } from './mine-after.ts';

interface YarnFieldsProps {
  typed: TypedMine;
  pattern: FrameLoomPiece;
  /** Null while the form does not come to a piece. */
  fitted: FittedPiece<FrameLoomPiece> | null;
  faults: Readonly<Record<string, string>>;
  change: Dispatch<MineEvent>;
  /** With script, only what is asked for is shown. */
  alive: boolean;
}

/** A yarn of her own in each role of the pattern. */
export function YarnFields({ pattern, ...shared }: YarnFieldsProps) {
  return (
    <fieldset>
      <legend className="h3">Your yarns</legend>
      <p className="small quiet">Open a line to put a yarn of your own in its place. The label usually tells how thick it is.</p>
      <div className="own-yarns lined">
        {Object.entries(pattern.yarns).map(([role, yarn]) => <OwnYarn key={role} role={role} patternYarn={yarn} {...shared} />)}
      </div>
    </fieldset>
  );
}

const gristHints: Readonly<Record<string, string>> = { class: 'A rough guess: a label or wraps tell more.', metresPer100g: 'Metres in a ball, times 100, through its grams.', nm: 'As 2/16 or 6/2.', 'ne-cotton': 'As 8/2.', 'ne-worsted': 'As 2/8.', tex: 'Grams in a kilometre.' };

function OwnYarn({ role, patternYarn, typed, fitted, faults, change, alive }: Omit<YarnFieldsProps, 'pattern'> & { role: string; patternYarn: Yarn }) {
  const texts = yarnOf(typed, role);
  const by = textOf(texts, 'by') || AS_PATTERN;
  const own = isOwnYarn(texts);
  const faultOf = (key: string): string | undefined => faults[`yarns.${role}.${key}`];
  const wrong = ['by', 'grist', 'wrapsPerInch', 'strands', 'colour', 'label'].some((key) => faultOf(key) !== undefined);
  const fieldProps = (key: string) => ({
    name: `yarns.${role}.${key}`,
    value: textOf(texts, key),
    error: faultOf(key),
    maxLength: key === 'label' ? 120 : 20,
    onChange: (event: { currentTarget: { value: string } }) => change({ kind: 'type-yarn', role, key, text: event.currentTarget.value }),
  });
  const planned = fitted?.plan.yarns[role];
  const label = own ? (textOf(texts, 'label').trim() || 'Your own yarn') : (patternYarn.label ?? role);
  const grist = gristAsked(by);
  const typedColour = textOf(texts, 'colour');
  const colourNow = typedColour === '' ? (patternYarn.colour ?? '#d8d2c1') : typedColour;
  return (
    <Fold className="own-yarn" needed={wrong} summary={(
      <>
        <YarnDot colour={own ? colourNow : patternYarn.colour} />
        <span><b>{label}</b><span className="small quiet">{own ? ` for ${patternYarn.label ?? role} (${role})` : ` (${role}), as in the pattern`}</span></span>
        {planned !== undefined && <span className="num"><Parts parts={formatAmount(lengthOf(planned.withMarginMm, 'yarn'), typed.units)} /></span>}
      </>
    )}>
      <div className="two folds">
        <Select name={`yarns.${role}.by`} label="How thick, by" value={by} options={YARN_BY.map(({ text, label: words }) => ({ value: text, label: words }))} error={faultOf('by')} onChange={(event) => change({ kind: 'type-yarn', role, key: 'by', text: event.currentTarget.value })} />
        {(!alive || (own && by !== 'wraps')) && <Field {...fieldProps('grist')} label={own ? grist.label : 'That number'} hint={gristHints[by]} unit={grist.kind === 'number' ? grist.unit : undefined} inputMode={grist.kind === 'number' ? 'decimal' : 'text'} />}
        {(!alive || own) && (
          <>
            <Field {...fieldProps('wrapsPerInch')} label="Wraps in an inch" optional={by !== 'wraps'} hint="Wound snugly round a ruler and counted." inputMode="decimal" />
            <Field {...fieldProps('strands')} label="Strands as one" optional hint="How many threads are taken together." inputMode="numeric" />
            <Field {...fieldProps('label')} label="Name on the label" optional />
            <Field {...fieldProps('colour')} label="Colour" type="color" value={colourNow} className="colour-field" />
          </>
        )}
      </div>
    </Fold>
  );
}

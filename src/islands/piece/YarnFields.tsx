import type { Dispatch, ReactNode } from 'react';
import { AS_PATTERN, WARP_YARN, YARN_BY, YARN_KEYS } from '#core/craft/my-piece/asked-of-mine.ts';
import { isOwnYarn, yarnOf, type TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import type { FittedPiece } from '#core/craft/fit.ts';
import type { FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import type { WarpPlan } from '#core/craft/plan-types.ts';
import { gristAsked } from '#core/craft/piece-form/asked-of-yarn.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
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
  /** How wraps are measured, in a drawing and in words. */
  guide: ReactNode;
}

/** A yarn of her own for the warp and in each role of the pattern. */
export function YarnFields({ pattern, typed, fitted, guide, ...shared }: YarnFieldsProps) {
  return (
    <fieldset>
      <legend className="h3">Your yarns</legend>
      <p className="small quiet">Open a line to put a yarn of your own in its place. The label usually tells how thick it is; where there is none, count its wraps.</p>
      {guide}
      <div className="own-yarns lined">
        <OwnYarn prefix={WARP_YARN} role={null} called="the warp" patternYarn={pattern.warp.yarn} texts={typed.warpYarn} planned={fitted?.plan.warp} units={typed.units} {...shared} />
        {Object.entries(pattern.yarns).map(([role, yarn]) => (
          <OwnYarn key={role} prefix={`yarns.${role}.`} role={role} called={role} patternYarn={yarn} texts={yarnOf(typed, role)} planned={fitted?.plan.yarns[role]} units={typed.units} {...shared} />
        ))}
      </div>
    </fieldset>
  );
}

const gristHints: Readonly<Record<string, string>> = {
  class: 'A rough guess: a label or wraps tell more.',
  metresPer100g: 'Metres in a ball, times 100, through its grams.',
  nm: 'As 2/16 or 6/2.',
  'ne-cotton': 'As 8/2.',
  'ne-worsted': 'As 2/8.',
  tex: 'Grams in a kilometre.',
  dtex: 'Grams in ten kilometres.',
  denier: 'Grams in nine kilometres.',
};

interface OwnYarnProps extends Pick<YarnFieldsProps, 'faults' | 'change' | 'alive'> {
  prefix: string;
  /** Null for the warp. */
  role: string | null;
  called: string;
  patternYarn: Yarn;
  texts: Texts;
  planned: WarpPlan | undefined;
  units: Units;
}

function OwnYarn({ prefix, role, called, patternYarn, texts, planned, units, faults, change, alive }: OwnYarnProps) {
  const by = textOf(texts, 'by') || AS_PATTERN;
  const own = isOwnYarn(texts);
  const isWrong = YARN_KEYS.some((key) => faults[`${prefix}${key}`] !== undefined);
  const fieldProps = (key: string) => ({
    name: `${prefix}${key}`,
    value: textOf(texts, key),
    error: faults[`${prefix}${key}`],
    maxLength: key === 'label' ? 120 : 20,
    onChange: (event: { currentTarget: { value: string } }) => change({ kind: 'type-yarn', role, key, text: event.currentTarget.value }),
  });
  const label = own ? (textOf(texts, 'label').trim() || 'Your own yarn') : (patternYarn.label ?? called);
  const grist = gristAsked(by);
  const typedColour = textOf(texts, 'colour');
  const colourNow = typedColour === '' ? (patternYarn.colour ?? '#d8d2c1') : typedColour;
  return (
    <Fold className="own-yarn" needed={isWrong} summary={(
      <>
        <YarnDot colour={own ? colourNow : patternYarn.colour} />
        <span><b>{label}</b><span className="small quiet">{own ? ` for ${patternYarn.label ?? called} (${called})` : ` (${called}), as in the pattern`}</span></span>
        {planned !== undefined && <span className="num"><Parts parts={formatAmount(lengthOf(planned.withMarginMm, 'yarn'), units)} /></span>}
      </>
    )}>
      <div className="two folds">
        <Select {...fieldProps('by')} value={by} label="How thick, by" options={YARN_BY.map(({ text, label: words }) => ({ value: text, label: words }))} />
        {(!alive || (own && by !== 'wraps')) && <Field {...fieldProps('grist')} label={own ? grist.label : 'That number'} hint={gristHints[by]} unit={grist.kind === 'number' ? grist.unit : undefined} inputMode={grist.kind === 'number' ? 'decimal' : 'text'} />}
        {(!alive || own) && (
          <>
            <Field {...fieldProps('wrapsPerInch')} label="Wraps in an inch" optional={by !== 'wraps'} hint="Wound snugly round a ruler and counted." inputMode="decimal" />
            <Field {...fieldProps('strands')} label="Strands as one" optional hint="How many threads are taken together." inputMode="numeric" />
            <Field {...fieldProps('ball.metres')} label="In a ball" optional unit="m" hint="To reckon how many balls you need." inputMode="decimal" />
            <Field {...fieldProps('ball.grams')} label="It weighs" optional unit="g" inputMode="decimal" />
            <Field {...fieldProps('label')} label="Name on the label" optional />
            <Field {...fieldProps('colour')} label="Colour" type="color" value={colourNow} className="colour-field" />
          </>
        )}
      </div>
    </Fold>
  );
}

import { useMemo } from 'react';
import { countOf, lengthOf, massOf, type Amount } from '#core/craft/amounts/amount-types.ts';
import { amountOfWoven } from '#core/craft/frame-loom/fit-woven.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { MineFound, MineJudgement } from '#core/craft/my-piece/judge-mine.ts';
import type { WarpPlan } from '#core/craft/plan-types.ts';
import { wovenShare } from '#core/craft/rest/woven-share.ts';
import { loomFigures } from '#core/series/loom-figures.ts';
import { hoursRange, likelyHours } from '#core/series/hours-words.ts';
import { amountText, formatAmount, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';
import { atOneScale } from '#islands/series/at-one-scale.ts';
import type { MadeOnLoom } from '#islands/series/trial.ts';
import { Figures, type Figure } from '#islands/ui/Figures.tsx';
import { Findings } from '#islands/ui/Findings.tsx';
import { Flag } from '#islands/ui/Flag.tsx';
import { Parts } from '#islands/ui/Parts.tsx';
import { RestAnswer } from './RestAnswer.tsx';

interface MineAnswerProps {
  name: string;
  teacher: string;
  pattern: MadeOnLoom;
  judged: MineJudgement;
  units: Units;
}

/** Both drawings without the gap between them. */
const ROOM_PX = 420;

/** Her piece beside the pattern, in a picture, in figures and in words. */
export function MineAnswer({ name, teacher, pattern, judged, units }: MineAnswerProps) {
  const made = judged.ok ? judged.fitted : null;
  return (
    <div className="mine-answer stack">
      <div role="status">
        {judged.ok ? <Flag kind="on">It fits your loom</Flag> : <Flag kind="mend">{judged.problems.length === 1 ? 'One thing does not work yet' : `${judged.problems.length} things do not work yet`}</Flag>}
      </div>
      <Looms {...{ name, teacher, pattern, made, units }} woven={judged.ok && judged.halfway !== null ? wovenShare(judged.fitted, judged.halfway.woven) : undefined} />
      {judged.ok && judged.halfway !== null && <RestAnswer made={judged.fitted} halfway={judged.halfway} units={units} />}
      {judged.ok && judged.halfway !== null && <h2 className="h3">The whole piece</h2>}
      {made !== null && <Figures items={figuresOf(made, pattern, units)} />}
      {made !== null && <Yarns {...{ made, pattern, teacher, units }} />}
      {judged.ok
        ? <><Findings found={onceEach(judged.warnings)} /><Words says={judged.fitted.changes} /></>
        : <Findings found={judged.problems} />}
      {made !== null && <Reckoned made={made} units={units} />}
    </div>
  );
}

function Words({ says }: { says: readonly string[] }) {
  return says.length === 0 ? null : <ul className="small mine-words">{says.map((sentence) => <li key={sentence}>{sentence}</li>)}</ul>;
}

interface LoomsProps {
  name: string;
  teacher: string;
  pattern: MadeOnLoom;
  made: MadeOnLoom | null;
  /** How far hers is woven, 0..1; all of it is drawn where she has not said. */
  woven: number | undefined;
  units: Units;
}

function Looms({ name, teacher, pattern, made, woven, units }: LoomsProps) {
  const cloths = useMemo(() => ({ pattern: clothPieceOf(pattern.piece, pattern.plan, name), mine: made === null ? null : clothPieceOf(made.piece, made.plan, name) }), [pattern, made, name]);
  const inside = cloths.mine?.loom?.insideWidthMm ?? cloths.pattern.loom?.insideWidthMm ?? cloths.pattern.widthMm;
  const { patternPx, loomPx } = atOneScale(cloths.pattern.widthMm, inside, ROOM_PX);
  const patternView = useMemo(() => ({ id: 'mine-pattern', as: 'hanging', width: patternPx, decorative: true } as const), [patternPx]);
  const mineView = useMemo(() => ({ id: 'mine-own', as: 'loom', width: loomPx, units, ...(woven === undefined ? {} : { woven }) } as const), [loomPx, units, woven]);
  return (
    <div className="trial-looms">
      <figure className="cloth"><Cloth piece={cloths.pattern} view={patternView} /><figcaption><b>{teacher}’s</b><br />{amountText(lengthOf(pattern.piece.size.widthMm, 'size'), units)} wide</figcaption></figure>
      {cloths.mine !== null && made !== null && <figure className="cloth"><Cloth piece={cloths.mine} view={mineView} /><figcaption><b>Yours</b><br />{amountText(lengthOf(made.piece.size.widthMm, 'size'), units)} wide, drawn at the same scale</figcaption></figure>}
    </div>
  );
}

function figuresOf(made: MadeOnLoom, pattern: MadeOnLoom, units: Units): Figure[] {
  const [mine, theirs] = [loomFigures(made.piece, made.plan), loomFigures(pattern.piece, pattern.plan)];
  const text = (parts: readonly AmountPart[]): string => parts.map((part) => part.text).join('');
  const figure = (label: string, now: readonly AmountPart[], then: readonly AmountPart[]): Figure => ({ label, value: now, was: text(now) === text(then) ? undefined : `pattern ${text(then)}` });
  const both = (label: string, of: (figures: typeof mine) => readonly AmountPart[]): Figure => figure(label, of(mine), of(theirs));
  const hours = both('At the loom', (figures) => likelyHours(figures.hours));
  return [
    { ...both('Ends', (figures) => formatAmount(countOf(figures.ends, 'end', 'ends'), units)), value: String(mine.ends), unit: mine.endsTogether === 2 ? 'in pairs' : undefined },
    both('Warp', (figures) => formatAmount(lengthOf(figures.warpMm, 'yarn'), units)),
    both('Weft yarn', (figures) => formatAmount(massOf(figures.weftGrams), units)),
    { ...hours, was: [hoursRange(mine.hours), hours.was].filter(Boolean).join(', ') },
  ];
}

/** What is true of many yarns is said once. */
const onceEach = (found: readonly MineFound[]): MineFound[] => [...new Map(found.map((one) => [one.says, one])).values()];

/** Each yarn beside the pattern's, margins included. */
function Yarns({ made, pattern, teacher, units }: { made: MadeOnLoom; pattern: MadeOnLoom; teacher: string; units: Units }) {
  const length = (plan: WarpPlan | undefined): string => amountText(lengthOf(plan?.withMarginMm ?? 0, 'yarn'), units);
  const rows = [
    { role: 'warp', label: made.piece.warp.yarn.label, was: length(pattern.plan.warp), is: length(made.plan.warp) },
    ...Object.entries(made.piece.yarns).map(([role, { label }]) => ({ role, label, was: length(pattern.plan.yarns[role]), is: length(made.plan.yarns[role]) })),
  ];
  return (
    <table className="table mini">
      <caption className="hide">Yarn to have, beside the pattern</caption>
      <thead><tr><th scope="col">Yarn to have</th><th scope="col" className="num">{teacher}’s</th><th scope="col" className="num">Yours</th></tr></thead>
      <tbody>{rows.map(({ role, label, was, is }) => <tr key={role}><th scope="row">{label ?? role}{label !== undefined && <span className="quiet"> ({role})</span>}</th><td className="num">{was}</td><td className="num">{is}</td></tr>)}</tbody>
    </table>
  );
}

const KEYS = ['ends', 'nails', 'spacing', 'wound-width', 'loom.width', 'loom.height', 'warp', 'pick', 'spacer.width', 'spacer.height', 'dowel.length', 'hours'];

/** The numbers with the way each was got. */
function Reckoned({ made, units }: { made: MadeOnLoom; units: Units }) {
  const keys = [...KEYS, ...Object.keys(made.piece.yarns).map((role) => `yarn.${role}`)];
  const amounts = keys.flatMap((key): Amount[] => {
    const amount = amountOfWoven(key, made.piece, made.plan);
    return amount.ok ? [amount.value] : [];
  });
  return (
    <details className="mine-reckoned">
      <summary>How this was reckoned</summary>
      <dl className="lined">
        {amounts.map((amount) => (
          <div key={amount.key}>
            <dt>{amount.label}<span className="small quiet">{amount.howReckoned.formula}{amount.howReckoned.inputs.length > 0 && `: ${amount.howReckoned.inputs.map(({ name, value }) => `${name} ${amountText(value, units)}`).join(', ')}`}. By {amount.howReckoned.source}.</span></dt>
            <dd className="num"><Parts parts={formatAmount(amount, units)} /></dd>
          </div>
        ))}
      </dl>
    </details>
  );
}

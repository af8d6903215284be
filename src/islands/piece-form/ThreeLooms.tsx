import { useDeferredValue, useMemo, useState } from 'react';
import type { StudentLoom } from '#contracts/looms.ts';
import { countOf, lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { exampleLooms } from '#core/craft/fitting/example-looms.ts';
import type { WayId } from '#core/craft/fitting/ways-to-fit.ts';
import { materials } from '#core/craft/frame-loom/materials.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { yarnLines } from '#core/gathering/yarn-lines.ts';
import { tryMaking, type MakingTried } from '#core/trial/try-making.ts';
import { readTypedLoom, type LoomFaults } from '#core/trial/typed-loom.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';
import { Choose } from '#islands/ui/Choose.tsx';
import { Field, Select } from '#islands/ui/Field.tsx';
import { Findings } from '#islands/ui/Findings.tsx';
import { Flag } from '#islands/ui/Flag.tsx';
import { Parts } from '#islands/ui/Parts.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';

interface ThreeLoomsProps {
  readonly piece: FrameLoomPiece;
  readonly name: string;
  readonly units: Units;
  readonly students: readonly StudentLoom[];
}

const OWN = 'own';
const PLACES = ['first', 'second', 'third'] as const;
const WIDEST_PX = 300;
const NARROWEST_PX = 130;

interface Choice {
  readonly name: string;
  readonly label: string;
  readonly mine: MyPiece;
}

/** The piece as it stands in the form on three looms side by side, drawn at one scale. */
export function ThreeLooms({ piece: typed, name, units, students }: ThreeLoomsProps) {
  // It follows when the browser has time: what is typed comes first.
  const piece = useDeferredValue(typed);
  const choices = useMemo(() => choicesOf(piece, units, students), [piece, units, students]);
  const [chosen, setChosen] = useState<readonly string[]>(() => [choices[0]?.name ?? OWN, choices[1]?.name ?? OWN, choices[2]?.name ?? OWN]);
  const [own, setOwn] = useState<OwnLoom>({ inside: '', spacing: '', ends: '1' });
  const read = useMemo(() => readOwn(own, units), [own, units]);
  const looms = useMemo(() => chosen.map((wanted) => {
    const mine = wanted === OWN ? read.mine : choices.find((choice) => choice.name === wanted)?.mine;
    return mine === undefined ? null : tryMaking(piece, mine, units);
  }), [chosen, choices, read, piece, units]);
  const insides = looms.map((tried) => (tried?.fits === true ? (tried.fitted.piece.loom.insideWidthMm ?? tried.fitted.plan.loom.insideWidthNeededMm) : 0));
  const pxPerMm = WIDEST_PX / Math.max(1, ...insides);
  const options = [...choices.map(({ name: value, label }) => ({ value, label })), { value: OWN, label: 'Numbers of your own' }];
  return (
    <div className="three-looms">
      {PLACES.map((place, at) => (
        <section key={place} aria-label={`The ${place} loom`}>
          <Select name={`loom-${place}`} label={`The ${place} loom`} value={chosen[at] ?? OWN} options={options} onChange={({ currentTarget: { value } }) => { setChosen(chosen.map((before, index) => (index === at ? value : before))); }} />
          {chosen[at] === OWN && <OwnFields place={place} own={own} faults={read.faults} units={units} onChange={setOwn} />}
          {looms[at] === null || looms[at] === undefined ? <p className="quiet mt-3">Type the inside width and the spacing of a loom, and the piece stands on it.</p> : <OnLoom tried={looms[at]} {...{ name, units, place }} widthPx={Math.max(NARROWEST_PX, (insides[at] ?? 0) * pxPerMm)} />}
        </section>
      ))}
    </div>
  );
}

function choicesOf(piece: FrameLoomPiece, units: Units, students: readonly StudentLoom[]): readonly Choice[] {
  const [first, second] = exampleLooms(piece, units);
  const usual = [first, second].filter((loom) => loom !== undefined);
  const hers = students.map(({ id, name, mine }): Choice => ({ name: `of-${id}`, label: `${name}’s loom`, mine }));
  return [...usual, ...hers];
}

interface OwnLoom {
  readonly inside: string;
  readonly spacing: string;
  readonly ends: '1' | '2';
}

/** What was typed; nothing is told off before both are there. */
function readOwn({ inside, spacing, ends }: OwnLoom, units: Units): { readonly mine?: MyPiece; readonly faults: LoomFaults } {
  const endsTogether = ends === '2' ? 2 : 1;
  const read = readTypedLoom({ inside, spacing, ends: endsTogether, units, narrower: false });
  if (read.ok) return { mine: { loom: read.loom, endsTogether }, faults: {} };
  const told = (says: string | undefined, text: string) => (text.trim() === '' ? undefined : says);
  const faults = { inside: told(read.fields.inside, inside), spacing: told(read.fields.spacing, spacing) };
  return { faults: Object.fromEntries(Object.entries(faults).filter(([, says]) => says !== undefined)) };
}

function OwnFields({ place, own, faults, units, onChange }: { readonly place: string; readonly own: OwnLoom; readonly faults: LoomFaults; readonly units: Units; readonly onChange: (own: OwnLoom) => void }) {
  const typing = { inputMode: 'decimal', autoComplete: 'off', maxLength: 40 } as const;
  return (
    <div className="own-loom">
      <Field {...typing} name={`inside-${place}`} label="Inside width" unit={units} value={own.inside} error={faults.inside} onChange={({ currentTarget: { value } }) => { onChange({ ...own, inside: value }); }} />
      <Field {...typing} name={`spacing-${place}`} label="Nail to nail" unit={units === 'in' ? 'in' : 'mm'} value={own.spacing} error={faults.spacing} onChange={({ currentTarget: { value } }) => { onChange({ ...own, spacing: value }); }} />
      <Choose name={`ends-${place}`} legend="Ends worked as one" value={own.ends} options={[{ value: '1', label: 'Single' }, { value: '2', label: 'In pairs' }]} onChoose={(ends) => { onChange({ ...own, ends }); }} />
    </div>
  );
}

const WAY_WORDS: Readonly<Record<WayId, string>> = {
  'as-it-is': 'as it is', narrower: 'woven narrower', 'leave-last': 'without the bands woven last', 'leave-first': 'without the bands woven first', 'leave-chosen': 'without some bands',
  doubled: 'with ends in pairs', 'fewer-nails': 'on fewer nails', scaled: 'smaller as a whole',
};

interface OnLoomProps {
  readonly tried: MakingTried;
  readonly name: string;
  readonly units: Units;
  readonly place: string;
  readonly widthPx: number;
}

function OnLoom({ tried, name, units, place, widthPx }: OnLoomProps) {
  const cloth = useMemo(() => (tried.fits ? clothPieceOf(tried.fitted.piece, tried.fitted.plan, name) : null), [tried, name]);
  const view = useMemo((): ClothView => ({ id: `on-${place}`, as: 'loom', width: Math.round(widthPx), woven: 1, fell: false, units, label: `${name} on the ${place} loom` }), [place, widthPx, units, name]);
  if (!tried.fits) {
    return (
      <div className="mt-3 stack">
        <Flag kind="mend">It does not fit</Flag>
        <Findings found={tried.problems.map(({ code, message }) => ({ code, says: message }))} />
        {tried.wouldFit.length > 0 && <p className="small">What would: {tried.wouldFit.map(({ id, fitted: { piece: { size } } }, at) => <span key={id}>{at > 0 && '; '}{WAY_WORDS[id]}, <Parts parts={formatAmount(lengthOf(size.widthMm, 'size'), units)} /> by <Parts parts={formatAmount(lengthOf(size.heightMm, 'size'), units)} /></span>)}.</p>}
      </div>
    );
  }
  const { piece, plan, changes } = tried.fitted;
  const { lines, grams } = yarnLines(materials({ piece, plan }));
  return (
    <div className="mt-3 stack">
      <Flag kind="on">It fits</Flag>
      {cloth !== null && <Cloth piece={cloth} view={view} />}
      <table className="table plan-table">
        <caption className="hide">The piece on the {place} loom</caption>
        <tbody>
          <tr><th scope="row">Woven</th><td className="num" colSpan={2}><Parts parts={formatAmount(lengthOf(piece.size.widthMm, 'size'), units)} /> by <Parts parts={formatAmount(lengthOf(piece.size.heightMm, 'size'), units)} /></td></tr>
          <tr><th scope="row">Warp ends</th><td className="num" colSpan={2}><Parts parts={formatAmount(countOf(plan.ends.count, 'end', 'ends'), units)} /></td></tr>
          <tr><th scope="row">At the loom</th><td className="num" colSpan={2}><Parts parts={formatAmount({ kind: 'time', hours: plan.hours.likely, low: plan.hours.low, high: plan.hours.high }, units)} /></td></tr>
          {lines.map(({ name: yarn, detail, colour, lengthMm, grams: mass }) => (
            <tr key={`${yarn}${detail}${colour ?? ''}`}>
              <th scope="row"><span className="dyed"><YarnDot colour={colour} />{detail === '' ? yarn : detail}</span></th>
              <td className="num"><Parts parts={formatAmount(lengthOf(lengthMm ?? 0, 'yarn'), units)} /></td>
              <td className="num"><Parts parts={formatAmount(massOf(mass), units)} /></td>
            </tr>
          ))}
          <tr><th scope="row">All yarn</th><td className="num" colSpan={2}><Parts parts={formatAmount(massOf(grams), units)} /></td></tr>
        </tbody>
      </table>
      {changes.length > 0 && <ul className="small">{changes.map((change) => <li key={change}>{change}</li>)}</ul>}
      {tried.warnings.length > 0 && <Findings found={tried.warnings.map(({ code, message }) => ({ code, says: message }))} />}
    </div>
  );
}

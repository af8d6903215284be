/** How the pattern is fitted to a loom of another size: every way with a small picture and what it comes to in words. */
import { useMemo, type Dispatch } from 'react';
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import { bandWords, type Made } from '#core/craft/fitting/tell-changes.ts';
import { tellRoom } from '#core/craft/fitting/tell-room.ts';
import { isWorthChoosing, type WayId, type WayToFit } from '#core/craft/fitting/ways-to-fit.ts';
import { WAY_KEY } from '#core/craft/my-piece/asked-of-mine.ts';
import { waysOf } from '#core/craft/my-piece/judge-mine.ts';
import { leaveOutNames, wayOf, type TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { Problem } from '#core/outcome.ts';
import { textOf } from '#core/craft/piece-form/typed-piece.ts';
import { likelyHours } from '#core/series/hours-words.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Cloth } from '#islands/cloth/Cloth.tsx';
import { Fold } from '#islands/ui/Fold.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import type { MineEvent } from './mine-after.ts';

interface WayFieldsProps {
  /** What the ways are reckoned for. */
  typed: TypedMine;
  /** What stands in the form this moment. */
  chosen: TypedMine;
  pattern: FrameLoomPiece;
  /** Null for a pattern that does not fit its own loom. */
  asPattern: Made | null;
  name: string;
  faults: Readonly<Record<string, string>>;
  change: Dispatch<MineEvent>;
}

const WORDS: Readonly<Record<WayId, { readonly title: string; readonly means: string }>> = {
  'as-it-is': { title: 'As the pattern has it', means: 'The same width, height and bands.' },
  narrower: { title: 'Narrower', means: 'Fewer ends. Shapes keep their share of the width, every height stays.' },
  'leave-last': { title: 'Lower, from the end', means: 'The band that fills the rest gives way first, then the bands that are woven last. Hem-stitch stays.' },
  'leave-first': { title: 'Lower, from the beginning', means: 'The band that fills the rest gives way first, then the bands that are woven first. Hem-stitch stays.' },
  'leave-chosen': { title: 'Lower, without bands you choose', means: 'Tick below what you would rather do without.' },
  scaled: { title: 'All of it smaller', means: 'Width, heights, shapes and pile by one measure. Yarns stay, rows are counted anew.' },
  doubled: { title: 'Coarser, ends in pairs', means: 'Two ends are worked as one, with more strands of each yarn, so that the cloth stays as tight. Quicker to weave, shapes get larger steps.' },
  'fewer-nails': { title: 'Coarser, fewer nails', means: 'Ends stand further apart, with more strands of each yarn, so that the cloth stays as tight. Quicker to weave, shapes get larger steps.' },
};

const PICTURE_PX = 84;

export function WayFields({ typed, chosen, pattern, asPattern, name, faults, change }: WayFieldsProps) {
  const { mine, ways } = useMemo(() => waysOf(typed, pattern), [typed, pattern]);
  const now = wayOf(chosen);
  if (!isWorthChoosing(ways, mine) && now === 'as-it-is' && faults[WAY_KEY] === undefined) return null;
  const own = ways[0]?.outcome;
  const room = own?.ok === true && asPattern !== null ? tellRoom(asPattern, own.value, typed.units) : [];
  const checked = ways.some(({ id }) => id === now) ? now : 'as-it-is';
  const fault = faults[WAY_KEY];
  return (
    <fieldset className="stack ways" id="ways" aria-describedby={fault === undefined ? 'ways-hint' : 'ways-hint ways-wrong'}>
      <legend className="h3">How to fit it to your loom</legend>
      <div className="small" id="ways-hint">
        {own?.ok === true ? room.map((says) => <p key={says}>{says}</p>) : <p>As the pattern has it, {name} does not go on this loom. Choose what may change.</p>}
      </div>
      <div className="ways-list lined">
        {inOrder(ways).map((way) => <WayRow key={way.id} {...{ way, name }} units={typed.units} isChecked={way.id === checked} onChoose={() => change({ kind: 'type', key: WAY_KEY, text: way.id })} />)}
      </div>
      {ways.some(({ id }) => id === 'leave-chosen') && <BandTicks {...{ chosen, pattern, change }} />}
      {fault !== undefined && <Wrong id="ways-wrong" says={fault} />}
    </fieldset>
  );
}

/** The pattern as it is, then what can be woven, then what cannot. */
function inOrder([asItIs, ...others]: readonly WayToFit[]): readonly WayToFit[] {
  const isOpen = ({ id, outcome }: WayToFit): boolean => outcome.ok || id === 'leave-chosen';
  return [...(asItIs === undefined ? [] : [asItIs]), ...others.filter(isOpen), ...others.filter((way) => !isOpen(way))];
}

const isLoomsSize = ({ code, path }: Problem): boolean => code === 'E_FIT' && path.startsWith('/loom');

/** Why a way does not do. What the fields above say already is not said again. */
function whyNot({ id, outcome }: WayToFit): string {
  if (outcome.ok) return '';
  if (id === 'as-it-is' && outcome.problems.every(isLoomsSize)) return 'Does not go on this loom.';
  if ((id === 'doubled' || id === 'fewer-nails') && outcome.problems.every(isLoomsSize)) return 'Does not fit: ends further apart make the piece no smaller.';
  const reasons = [...new Set(outcome.problems.map(({ message }) => message))].join(' ');
  return id === 'leave-chosen' ? reasons : `Does not fit. ${reasons}`;
}

interface WayRowProps {
  way: WayToFit;
  name: string;
  units: Units;
  isChecked: boolean;
  onChoose: () => void;
}

function WayRow({ way: found, name, units, isChecked, onChoose }: WayRowProps) {
  const { id, way, outcome } = found;
  const { title, means } = WORDS[id];
  const isLarger = way?.kind === 'scaled' && way.factor > 1;
  // What cannot be woven can still be chosen where it must be filled in first, or stands already.
  const isOff = !outcome.ok && !isChecked && id !== 'leave-chosen' && id !== 'as-it-is';
  return (
    <label className="way">
      <input className="radio" type="radio" name={WAY_KEY} value={id} checked={isChecked} disabled={isOff} onChange={onChoose} aria-describedby={`way-${id}`} />
      <span className="way-words">
        <b>{isLarger ? 'All of it larger' : title}</b>
        <span className="small" id={`way-${id}`}>
          {outcome.ok && <span className="quiet">{means}</span>}
          {outcome.ok ? <Comes made={outcome.value} units={units} /> : <span>{whyNot(found)}</span>}
        </span>
      </span>
      {outcome.ok && <span className="way-picture" aria-hidden="true"><SmallCloth made={outcome.value} id={id} name={name} /></span>}
    </label>
  );
}

function SmallCloth({ made, id, name }: { made: Made; id: string; name: string }) {
  const cloth = useMemo(() => clothPieceOf(made.piece, made.plan, name), [made, name]);
  const view = useMemo(() => ({ id: `way-cloth-${id}`, as: 'loom', width: PICTURE_PX, decorative: true } as const), [id]);
  return <Cloth piece={cloth} view={view} />;
}

/** Size, ends and hours in a line, and what is left out. */
function Comes({ made, units }: { made: Made & { readonly changes: readonly string[] }; units: Units }) {
  const { piece, plan, changes } = made;
  const size = amountText({ kind: 'size', ...piece.size, use: 'size' }, units);
  const hours = likelyHours(plan.hours).map(({ text }) => text).join('');
  const told = changes.filter((says) => says.startsWith('Left out:') || says.startsWith('Take '));
  return (
    <>
      <span className="way-comes">{size}, {plan.ends.count} ends at {amountText(lengthOf(plan.ends.spacingMm, 'fine'), units)}, {hours} at the loom.</span>
      {told.length > 0 && <span>{told.join(' ')}</span>}
    </>
  );
}

function BandTicks({ chosen, pattern, change }: { chosen: TypedMine; pattern: FrameLoomPiece; change: Dispatch<MineEvent> }) {
  const names = leaveOutNames(pattern);
  // From the end that was woven last, as the cloth stands on the loom.
  const bands = pattern.bands.map((band, index) => ({ band, index, field: names[index] ?? '' })).filter(({ band }) => band.technique !== 'hem-stitch').toReversed();
  return (
    <Fold className="way-bands" needed={wayOf(chosen) === 'leave-chosen'} summary="Choose the bands to leave out">
      <div className="way-ticks">
        {bands.map(({ band, index, field }) => (
          <label key={field} className="check-row">
            <input className="check" type="checkbox" name={field} value="yes" checked={textOf(chosen.texts, field) === 'yes'} onChange={(event) => { change({ kind: 'leave-out', key: field, isOut: event.currentTarget.checked }); }} />
            <span>{bandWords(band, index)}<span className="quiet"> ({band.technique})</span></span>
          </label>
        ))}
      </div>
    </Fold>
  );
}

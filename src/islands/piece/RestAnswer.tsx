import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { bandWords, type Made } from '#core/craft/fitting/tell-changes.ts';
import { leftAsked, HEIGHT } from '#core/craft/my-piece/asked-of-woven.ts';
import { wovenFieldOf, type Halfway } from '#core/craft/my-piece/judge-woven.ts';
import type { BandPlan } from '#core/craft/plan-types.ts';
import type { RestPlan, RestYarn } from '#core/craft/rest/plan-rest.ts';
import { rowsIn } from '#core/craft/rest/woven-share.ts';
import { hoursRange, likelyHours } from '#core/series/hours-words.ts';
import { amountText, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { Figures, type Figure } from '#islands/ui/Figures.tsx';
import { CodeWords, Findings } from '#islands/ui/Findings.tsx';
import { Flag } from '#islands/ui/Flag.tsx';
import { YarnDot } from '#islands/ui/YarnDot.tsx';

interface RestAnswerProps {
  made: Made;
  halfway: Halfway;
  units: Units;
}

/** What is still to weave, how long it takes, and whether the yarn suffices. */
export function RestAnswer({ made, halfway, units }: RestAnswerProps) {
  const { rest, restAsKept, warnings } = halfway;
  const ofHeight = warnings.filter(({ path }) => wovenFieldOf(path) === HEIGHT.key);
  // Said once, however many yarns it is true of.
  const ofYarn = [...new Set(warnings.filter((warning) => !ofHeight.includes(warning)).map(({ code }) => code))];
  return (
    <section className="mine-rest stack" aria-labelledby="mine-rest">
      <h2 className="h3" id="mine-rest">Still to weave</h2>
      {restAsKept !== undefined && <p className="small">What is woven stays as it is. Only the rest is reckoned anew.</p>}
      <Figures items={figuresOf(rest, restAsKept, units)} />
      <Findings found={ofHeight.map(({ code, message }) => ({ code, says: message }))} />
      <dl className="lined mine-yarns">
        {Object.entries(rest.yarns).filter(([, { netMm }]) => netMm > 0).map(([role, yarn]) => <YarnLeft key={role} {...{ role, made, yarn, warnings, units }} />)}
      </dl>
      {ofYarn.map((code) => <CodeWords key={code} code={code} />)}
      <BandsLeft {...{ made, halfway }} />
    </section>
  );
}

const textOf = (parts: readonly AmountPart[]): string => parts.map(({ text }) => text).join('');

function figuresOf(rest: RestPlan, asKept: RestPlan | undefined, units: Units): Figure[] {
  const figure = (label: string, of: (plan: RestPlan) => string, small = ''): Figure => {
    const before = asKept === undefined || of(asKept) === of(rest) ? '' : `before ${of(asKept)}`;
    const was = [small, before].filter(Boolean).join(', ');
    return { label, value: of(rest), was: was === '' ? undefined : was };
  };
  const perUnit = ({ picksPerCm }: RestPlan): string => (units === 'in' ? picksPerCm * 2.54 : picksPerCm).toFixed(1);
  return [
    figure('Rows of tabby', ({ rows }) => String(rows)),
    figure('At the loom', ({ hours }) => textOf(likelyHours(hours)), hoursRange(rest.hours)),
    figure(units === 'in' ? 'Rows in an inch' : 'Rows in a cm', perUnit, rest.trust === 'measured' ? 'as you measured' : 'by the plan'),
    figure('It will be', ({ heightMm }) => amountText(lengthOf(heightMm, 'size'), units), 'high when finished'),
  ];
}

function YarnLeft({ role, made, yarn, warnings, units }: { role: string; made: Made; yarn: RestYarn; warnings: Halfway['warnings']; units: Units }) {
  const { label, colour } = made.piece.yarns[role] ?? {};
  const told = warnings.find(({ path }) => wovenFieldOf(path) === leftAsked(role).key);
  const length = (mm: number): string => amountText(lengthOf(mm, 'yarn'), units);
  return (
    <div>
      <dt><YarnDot colour={colour} /> {label ?? role}{label !== undefined && <span className="quiet"> ({role})</span>}</dt>
      <dd>
        {told !== undefined && <Flag kind="mend" small>{told.code === 'W_SHORT' ? 'Not enough' : 'Only just'}</Flag>}
        {told === undefined && yarn.leftMm !== undefined && <Flag kind="on" small>It suffices</Flag>}
        {told === undefined
          ? <span className="small">Takes {length(yarn.withMarginMm)}, {amountText(massOf(yarn.massG * (yarn.netMm > 0 ? yarn.withMarginMm / yarn.netMm : 1)), units)}, with its margin{yarn.leftMm === undefined ? '.' : `, and ${length(yarn.leftMm)} are left.`}</span>
          : <span className="small">{told.message}{yarn.ballsToGet !== undefined && ` ${yarn.ballsToGet === 1 ? 'That is 1 ball.' : `That is ${String(yarn.ballsToGet)} balls.`}`}</span>}
      </dd>
    </div>
  );
}

/** Each band that is not finished, the next one first. */
function BandsLeft({ made, halfway: { rest, woven } }: { made: Made; halfway: Halfway }) {
  if (rest.bands.length === 0) return <p className="small">Every band is woven. What is left is finishing.</p>;
  const rowsOf = ({ index, picks }: BandPlan): number | undefined => {
    const rows = picks ?? rowsIn(made.plan.bands[index], made.piece.bands[index]);
    return rows === undefined || picks !== undefined || index !== woven.bandsDone ? rows : rows - (woven.rows ?? 0);
  };
  return (
    <details className="mine-reckoned">
      <summary>{rest.bands.length === 1 ? 'The last band' : `The ${String(rest.bands.length)} bands to come`}</summary>
      <ol className="lined small mine-bands">
        {rest.bands.map((planned) => {
          const band = made.piece.bands[planned.index];
          const rows = rowsOf(planned);
          return <li key={planned.index}>{band !== undefined && bandWords(band, planned.index)} <span className="quiet">({planned.technique})</span>{rows !== undefined && <span className="num">{rows === 1 ? '1 row' : `${String(rows)} rows`}</span>}</li>;
        })}
      </ol>
    </details>
  );
}

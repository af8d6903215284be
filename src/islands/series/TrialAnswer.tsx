/** The answer in words and figures: fits or not, what would, and what changes against the pattern. */
import type { MouseEvent } from 'react';
import { countOf, lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { loomFigures } from '#core/series/loom-figures.ts';
import { hoursRange, likelyHours } from '#core/series/hours-words.ts';
import type { Trial } from '#core/trial/try-on-loom.ts';
import { amountText, formatAmount, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { EveryNumber } from '#islands/series/EveryNumber.tsx';
import { fittedBy, type MadeOnLoom } from '#islands/series/trial.ts';
import { Figures, type Figure } from '#islands/ui/Figures.tsx';
import { CodeWords, Findings } from '#islands/ui/Findings.tsx';
import { Flag } from '#islands/ui/Flag.tsx';

interface TrialAnswerProps {
  readonly teacher: string;
  readonly asPattern: MadeOnLoom;
  readonly trial: Trial;
  readonly units: Units;
  /** False while the form still holds the pattern's own loom. */
  readonly own: boolean;
  readonly narrowerHref: string;
  readonly widerHref: string;
  /** Where who has a seat puts this loom into her own piece. */
  readonly keepHref: string | undefined;
  /** Takes the place of the links once the page is alive. */
  readonly onNarrower?: ((narrower: boolean) => void) | undefined;
}

export function TrialAnswer({ teacher, asPattern, trial, units, own, narrowerHref, widerHref, keepHref, onNarrower }: TrialAnswerProps) {
  const fitted = fittedBy(trial);
  const here = (narrower: boolean) => onNarrower && ((event: MouseEvent) => { event.preventDefault(); onNarrower(narrower); });
  return (
    <div className="trial-plan stack">
      <div role="status">
        {!trial.ok && <p className="quiet">Type both, and the answer stands here.</p>}
        {trial.ok && !own && <p className="small">This is {teacher}’s own loom. Type yours, and everything here is reckoned again.</p>}
        {trial.ok && own && (trial.fits ? <p><Flag kind="on">It fits your loom</Flag></p> : <p><Flag kind="mend">It does not fit yet</Flag></p>)}
        {trial.ok && !trial.fits && <p className="mt-3">{trial.says}{trial.widest !== null && <> <a href={narrowerHref} onClick={here(true)}>See it so</a>.</>}</p>}
      </div>
      {trial.ok && !trial.fits && trial.codes.map((code) => <CodeWords key={code} code={code} />)}
      {fitted !== null && <Figures items={figuresOf(fitted, asPattern, units, own)} />}
      {trial.ok && trial.fits && own && (
        <div className="small stack stack-tight">
          <p>
            {trial.narrowed && <>As wide as your loom allows, instead of {amountText(lengthOf(asPattern.piece.size.widthMm, 'size'), units)}. <a href={widerHref} onClick={here(false)}>As wide as the pattern</a>. </>}
            {amountText(lengthOf(trial.freeMm, 'size'), units)} stay free on either side of the warp, for the hand and the shuttle.
          </p>
          {trial.fitted.changes.length > 0 && <p>{trial.fitted.changes.filter((says) => !trial.narrowed || !says.startsWith('The piece is')).join(' ')}</p>}
          <Findings found={trial.warnings.map(({ code, message }) => ({ code, says: message }))} />
          <p className="quiet">For a frame {amountText(lengthOf(trial.fitted.piece.loom.insideHeightMm, 'size'), units)} from nail to nail upright, as the pattern’s. {amountText(lengthOf(trial.fitted.plan.loom.heightNeededMm, 'least'), units)} are enough.</p>
        </div>
      )}
      {fitted !== null && own && keepHref !== undefined && <p><a href={keepHref}>Use this loom for your piece</a></p>}
      {fitted !== null && <EveryNumber made={fitted} units={units} />}
    </div>
  );
}

function figuresOf(made: MadeOnLoom, asPattern: MadeOnLoom, units: Units, own: boolean): Figure[] {
  const [hers, pattern] = [loomFigures(made.piece, made.plan), loomFigures(asPattern.piece, asPattern.plan)];
  const text = (parts: readonly AmountPart[]): string => parts.map((part) => part.text).join('');
  const was = (now: readonly AmountPart[], then: readonly AmountPart[]): string | undefined => (own && text(now) !== text(then) ? `pattern ${text(then)}` : undefined);
  const figure = (label: string, now: readonly AmountPart[], then: readonly AmountPart[]): Figure => ({ label, value: now, was: was(now, then) });
  return [
    { label: 'Ends', value: String(hers.ends), unit: hers.endsTogether === 2 ? 'in pairs' : undefined, was: was(formatAmount(countOf(hers.ends, 'end', 'ends'), units), [{ kind: 'number', text: String(pattern.ends) }]) },
    figure('Warp', formatAmount(lengthOf(hers.warpMm, 'yarn'), units), formatAmount(lengthOf(pattern.warpMm, 'yarn'), units)),
    figure('Weft yarn', formatAmount(massOf(hers.weftGrams), units), formatAmount(massOf(pattern.weftGrams), units)),
    { label: 'At the loom', value: likelyHours(hers.hours), was: [hoursRange(hers.hours), was(likelyHours(hers.hours), likelyHours(pattern.hours))].filter(Boolean).join(', ') },
  ];
}

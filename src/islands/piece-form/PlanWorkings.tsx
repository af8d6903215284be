import { useDeferredValue, useMemo } from 'react';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { explainPiece } from '#core/craft/show-how/explain.ts';
import { stepValue } from '#core/reckoner/step-words.ts';
import type { Units } from '#core/units/units.ts';
import { Step, stepAnchor, type Steps } from '#islands/reckoner/ShowHow.tsx';

const PART = 'pattern';

function goTo(id: string): void {
  const step = document.getElementById(stepAnchor(PART, id));
  step?.closest('details')?.setAttribute('open', '');
  step?.focus();
}

/** Every number of the plan with its formula, what went in, and how far to trust it. */
export function PlanWorkings({ piece: typed, units }: { readonly piece: FrameLoomPiece; readonly units: Units }) {
  const piece = useDeferredValue(typed);
  const explained = useMemo(() => explainPiece(piece, units), [piece, units]);
  if (!explained.ok) return null;
  const steps: Steps = { part: PART, lazily: true, opened: new Set(), toggle: () => undefined, goTo, workingOf: (id) => explained.value.find((working) => working.id === id) };
  return (
    <ol className="workings plain">
      {explained.value.map((working) => (
        <li key={working.id}>
          <details>
            <summary><span>{working.name}</span> <span className="num">{stepValue(working.value, working.unit)}</span></summary>
            <Step working={working} steps={steps} />
          </details>
        </li>
      ))}
    </ol>
  );
}

/**
 * The keys of a technique that moves: played slowly, movement by movement (a lesson has steps of its own), or led by hand. The drawing begins as the finished one,
 * exactly as the server drew it, and never moves by itself. Who wants less motion is shown each step at once.
 */
import { useEffect, useId, useMemo, useState, type KeyboardEvent } from 'react';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import type { AnyFigureInput } from '#core/craft/figures/figures.ts';
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { stepAt, stepsOf, type StepAt } from '#core/craft/figures/figure-steps.ts';
import { useMovement } from '#islands/cloth/use-movement.ts';
import { Button } from '#islands/ui/Button.tsx';

interface FigurePlayerProps {
  /** Begins the ids in the drawing: only this figure's on the page. */
  readonly id: string;
  readonly kind: FigureKind;
  readonly input: AnyFigureInput;
  /** What holds the finished drawing; it is drawn anew in there. */
  readonly drawing: HTMLElement;
}

const SECONDS = 12;
/** A step that has just been finished is not begun again by the next press. */
const HAIR = 1e-6;

export function FigurePlayer({ id, kind, input, drawing }: FigurePlayerProps) {
  const { progress, playing, play, stop, goTo } = useMovement(SECONDS);
  const [touched, setTouched] = useState(false);
  const place = useId();
  const steps = useMemo(() => stepsOf(kind, input), [kind, input]);
  const still = useStillness();
  useEffect(() => {
    // Until somebody asks, what the server drew stands.
    if (touched) drawing.innerHTML = drawFigure(kind, input, progress, { id });
  }, [touched, drawing, kind, input, progress, id]);
  const ask = (act: () => void) => (): void => {
    setTouched(true);
    act();
  };
  const move = (to: number, from: number): void => {
    if (still) goTo(to);
    else play(to, from);
  };
  const next = ask(() => move(afterStep(steps, progress), progress >= 1 ? 0 : progress));
  const back = ask(() => goTo(steps.findLast(({ until }) => until < progress - HAIR)?.until ?? 0));
  const whole = ask(() => (playing ? stop() : play(1, progress >= 1 ? 0 : progress)));
  const onKey = (event: KeyboardEvent): void => {
    const act = event.target instanceof HTMLInputElement ? undefined : { ArrowRight: next, ArrowLeft: back }[event.key];
    if (event.key.startsWith('Arrow')) event.stopPropagation();
    if (act === undefined) return;
    event.preventDefault();
    act();
  };
  return (
    <div className="technique-keys" role="group" aria-label="Movement by movement" onKeyDown={onKey}>
      {steps.length > 1 && <Button small onClick={back} glyph="back">Back</Button>}
      {!still && <Button small onClick={whole} glyph={playing ? 'pause' : 'play'}>{playing ? 'Pause' : 'Play it slowly'}</Button>}
      {steps.length > 1 && <Button small onClick={next}>{progress >= 1 ? 'First movement' : 'Next movement'}</Button>}
      <label htmlFor={place} className="technique-place">
        How far
        <input id={place} type="range" min={0} max={100} value={Math.round(progress * 100)} onChange={(event) => ask(() => goTo(Number(event.target.value) / 100))()} />
      </label>
      <p className="technique-step" aria-live="polite">{touched && stepWords(steps, progress)}</p>
    </div>
  );
}

/** Where the step ends that comes now: the first one, when all are done. */
function afterStep(steps: readonly StepAt[], progress: number): number {
  const from = progress >= 1 ? 0 : progress;
  return steps.find(({ until }) => until > from + HAIR)?.until ?? 1;
}

function stepWords(steps: readonly StepAt[], progress: number): string {
  const at = stepAt(steps, progress);
  return `${steps.length === 1 ? '' : `Movement ${String(at + 1)} of ${String(steps.length)}: `}${steps[at]?.words ?? ''}`;
}

/** Whether the person has asked for less motion. */
function useStillness(): boolean {
  const [still, setStill] = useState(false);
  useEffect(() => {
    const asked = window.matchMedia('(prefers-reduced-motion: reduce)');
    const heed = (): void => setStill(asked.matches);
    heed();
    asked.addEventListener('change', heed);
    return () => asked.removeEventListener('change', heed);
  }, []);
  return still;
}

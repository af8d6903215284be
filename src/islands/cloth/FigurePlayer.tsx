/**
 * A technique that moves: played slowly, or led by hand. It begins as the finished drawing, exactly as the server drew it,
 * and never moves by itself.
 */
import { useId, useMemo } from 'react';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import type { FigureInput } from '#core/craft/figures/figure.ts';
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { FIGURES } from '#core/craft/figures/figures.ts';
import { useMovement } from '#islands/cloth/use-movement.ts';
import { Button } from '#islands/ui/Button.tsx';

interface FigurePlayerProps {
  /** Begins the ids in the drawing: only this figure's on the page. */
  readonly id: string;
  readonly kind: FigureKind;
  readonly input: FigureInput;
  readonly caption?: string;
}

const SECONDS = 12;

export function FigurePlayer({ id, kind, input, caption }: FigurePlayerProps) {
  const { progress, playing, play, stop, goTo } = useMovement(SECONDS);
  const place = useId();
  const markup = useMemo(() => ({ __html: drawFigure(kind, input, progress, { id }) }), [kind, input, progress, id]);
  return (
    <figure className="fig technique">
      <div dangerouslySetInnerHTML={markup} />
      <div className="technique-keys">
        <Button small onClick={playing ? stop : play}>
          {playing ? 'Stop' : 'Play it slowly'}
        </Button>
        <label htmlFor={place}>How far</label>
        <input id={place} type="range" min={0} max={100} value={Math.round(progress * 100)} onChange={(event) => goTo(Number(event.target.value) / 100)} />
      </div>
      <figcaption>{caption ?? FIGURES[kind].describe(input)}</figcaption>
    </figure>
  );
}

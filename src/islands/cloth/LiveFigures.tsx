/**
 * Gives every figure of a page its keys. The page has drawn them whole, each with its caption, and stays whole without
 * script; piece and plan come once for all of them.
 */
import { useEffect, useState } from 'react';
import { createPortal } from 'react-dom';
import type { AnyFigureInput } from '#core/craft/figures/figures.ts';
import { isFigureKind, type FigureKind } from '#core/craft/figures/figure-kinds.ts';
import { FigurePlayer } from '#islands/cloth/FigurePlayer.tsx';

interface LiveFiguresProps {
  readonly input: AnyFigureInput;
}

interface Found {
  readonly kind: FigureKind;
  readonly drawing: HTMLElement;
  /** Where its keys go. */
  readonly keys: HTMLElement;
}

export function LiveFigures({ input }: LiveFiguresProps) {
  const [found, setFound] = useState<readonly Found[]>([]);
  useEffect(() => {
    const all = [...document.querySelectorAll<HTMLElement>('figure[data-figure]')].flatMap(giveRoom);
    setFound(all);
    return () => { for (const { keys } of all) keys.remove(); };
  }, []);
  return found.map(({ kind, drawing, keys }, index) => createPortal(<FigurePlayer id={`live-${String(index)}`} {...{ kind, input, drawing }} />, keys, String(index)));
}

function giveRoom(figure: HTMLElement): Found[] {
  const kind = figure.dataset['figure'] ?? '';
  const drawing = figure.querySelector<HTMLElement>('[data-drawing]');
  if (!isFigureKind(kind) || drawing === null) return [];
  const keys = document.createElement('div');
  drawing.after(keys);
  return [{ kind, drawing, keys }];
}

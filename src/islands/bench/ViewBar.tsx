import type { Dispatch, SetStateAction } from 'react';
import { closer, STEP, turned, WHOLE, type View } from '#islands/bench/view.ts';
import { Button } from '#islands/ui/Button.tsx';

interface Props {
  view: View;
  look: Dispatch<SetStateAction<View>>;
  aspect: number;
  onPin: () => void;
  onKeys: () => void;
  /** What lies beside the photo, or what could; null when she has shown nothing before. */
  beside: { says: string; next: () => void } | null;
}

/** How the photo is looked at, for whoever does not use keys. */
export function ViewBar({ view, look, aspect, onPin, onKeys, beside }: Props) {
  return (
    <div className="view-bar" role="group" aria-label="The photo">
      <Button small kind="quiet" glyph="plus" aria-keyshortcuts="+" onClick={() => look((before) => closer(before, aspect, STEP))}>Closer</Button>
      {view.zoom > 1 && (
        <>
          <Button small kind="quiet" glyph="minus" aria-keyshortcuts="-" onClick={() => look((before) => closer(before, aspect, 1 / STEP))}>Further</Button>
          <Button small kind="quiet" aria-keyshortcuts="0" onClick={() => look((before) => ({ ...WHOLE, turns: before.turns }))}>Whole</Button>
        </>
      )}
      <Button small kind="quiet" glyph="turn" aria-keyshortcuts="R" onClick={() => look(turned)}>Turn</Button>
      <Button small kind="quiet" glyph="here" aria-keyshortcuts="P" onClick={onPin}>Pin</Button>
      {beside !== null && <Button small kind="quiet" glyph="photo" aria-keyshortcuts="C" onClick={beside.next}>{beside.says}</Button>}
      <Button small kind="quiet" aria-keyshortcuts="?" className="only-desk" onClick={onKeys}>Keys</Button>
    </div>
  );
}

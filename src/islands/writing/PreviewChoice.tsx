import { useCallback, useEffect, useRef, useState } from 'react';
import { Button } from '#islands/ui/Button.tsx';
import { Select } from '#islands/ui/Field.tsx';
import { DRAFT_KEPT, type DraftKeptDetail } from '#islands/writing/draft-kept.ts';

interface PreviewChoiceProps {
  /** Address of the preview as a page of its own. */
  address: string;
  /** Whose eyes it can be seen with. */
  choices: readonly { readonly value: string; readonly label: string }[];
  /** Id of what is drawn, on this page and on its own. */
  drawnId: string;
}

/** Chooses whose amounts a preview shows. Without script it opens the preview as a page of its own. */
export function PreviewChoice({ address, choices, drawnId }: PreviewChoiceProps) {
  const [as, setAs] = useState(choices[0]?.value ?? 'pattern');
  const [says, setSays] = useState('');
  const asked = useRef(0);
  const draw = useCallback((whose: string, anchor: string | null = null) => {
    asked.current += 1;
    const turn = asked.current;
    void fetchPage(`${address}?as=${encodeURIComponent(whose)}`).then((page) => {
      const fresh = page?.getElementById(drawnId);
      // A later choice has overtaken this one.
      if (turn !== asked.current) return;
      if (fresh === null || fresh === undefined) setSays('It could not be drawn just now. What you wrote is not lost.');
      else {
        document.getElementById(drawnId)?.replaceWith(document.importNode(fresh, true));
        if (anchor !== null) bringIntoSight(document.getElementById(anchor));
        setSays('');
      }
    });
  }, [address, drawnId]);
  useEffect(() => {
    const onKept = (event: Event) => draw(as, event instanceof CustomEvent ? (event.detail as DraftKeptDetail).anchor : null);
    document.addEventListener(DRAFT_KEPT, onKept);
    return () => document.removeEventListener(DRAFT_KEPT, onKept);
  }, [as, draw]);
  return (
    <form method="get" action={address} target="_blank" className="preview-choice">
      <Select form="preview" name="as" label="Seen as" options={choices} value={as} onChange={(event) => { setAs(event.currentTarget.value); draw(event.currentTarget.value); }} />
      <Button type="submit" glyph="eye">On its own page</Button>
      <p role="status" className="small">{says}</p>
    </form>
  );
}

/** Only the column of the preview is moved, and only when what is being written lies outside it: the page itself never jumps. */
function bringIntoSight(drawn: HTMLElement | null): void {
  const column = drawn?.closest('.writing-preview');
  if (drawn === null || column === null || column === undefined || column.scrollHeight <= column.clientHeight) return;
  const [inner, outer] = [drawn.getBoundingClientRect(), column.getBoundingClientRect()];
  if (inner.top < outer.top || inner.top > outer.bottom - outer.height / 3) column.scrollTop += inner.top - outer.top - outer.height / 6;
}

/** The page as a document whose scripts do not run. A string of markup is never made into nodes here. */
function fetchPage(address: string): Promise<Document | null> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest();
    request.open('GET', address);
    request.responseType = 'document';
    request.onload = () => resolve(request.status === 200 ? request.responseXML : null);
    request.onerror = () => resolve(null);
    request.send();
  });
}

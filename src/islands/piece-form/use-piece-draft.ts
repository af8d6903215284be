import { useCallback, useEffect, useReducer, useRef, type RefObject } from 'react';
import type { OtherPiece, PieceDraftKept } from '#contracts/piece.ts';
import { textsOfTyped, typedOfTexts, type FormTexts } from '#core/craft/piece-form/field-names.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';
import { readCopy } from '#islands/keeping/device-copy.ts';
import { beginKeeping, keepingAfter, type Keeping, type KeepingEvent } from '#islands/keeping/keeping.ts';
import { useKeeping } from '#islands/keeping/use-keeping.ts';
import { typedBefore } from '#islands/ui/typed-before.ts';
import type { PieceFormEvent } from './piece-form-state.ts';

interface DraftOf {
  readonly form: RefObject<HTMLFormElement | null>;
  readonly series: string;
  readonly revision: number;
  readonly typed: TypedPiece;
  /** What stands in the form is not kept yet. */
  readonly isChanged: boolean;
  /** The first keeping puts it over what another window kept. */
  readonly isOver: boolean;
  readonly tell: (event: PieceFormEvent) => void;
}

interface PieceDraft {
  readonly keeping: Keeping<OtherPiece>;
  /** One of the two that were written in two windows. */
  readonly keepMine: () => void;
  readonly takeOther: (other: OtherPiece) => void;
  /** The form is being sent: it takes along what was not kept yet. */
  readonly sent: () => void;
}

/** Keeps the form by itself while it is filled in, and takes up what was typed before its script woke or could not be sent. */
export function usePieceDraft({ form, series, revision, typed, isChanged, isOver, tell }: DraftOf): PieceDraft {
  const [keeping, change] = useReducer(keepingAfter<OtherPiece, Keeping<OtherPiece>>, beginKeeping(revision));
  const now = useRef(typed);
  const over = useRef(isOver);
  const textNow = useCallback(() => JSON.stringify(textsOfTyped(now.current)), []);
  const bodyNow = useCallback((known: number) => ({ series, revision: known, texts: textsOfTyped(now.current), over: over.current }), [series]);
  const name = `piece-${series}`;
  useKeeping<PieceDraftKept, OtherPiece>({
    state: keeping, change: useCallback((event: KeepingEvent<OtherPiece>) => {
      if (event.kind === 'kept') over.current = false;
      change(event);
    }, []), name, textNow, address: '/api/workroom/piece-draft', bodyNow,
  });

  useEffect(() => {
    if (now.current === typed) return;
    now.current = typed;
    change({ kind: 'typed' });
  }, [typed]);

  useEffect(() => {
    if (isChanged) change({ kind: 'typed' });
  }, [isChanged]);

  useEffect(() => {
    const copy = readCopy(name);
    const texts = copy === null || copy.source === textNow() ? null : readTexts(copy.source);
    if (copy !== null && texts !== null) {
      tell({ kind: 'replace', typed: typedOfTexts(texts), news: 'What you typed on this device and could not send stands in the form again.' });
      change({ kind: 'brought-back', revision: copy.revision });
    }
    if (form.current !== null) for (const [field, text] of typedBefore(form.current)) tell({ kind: 'type', field, text });
  }, [form, name, tell, textNow]);

  return {
    keeping,
    keepMine: useCallback(() => { over.current = true; change({ kind: 'keep-mine' }); }, []),
    takeOther: useCallback((other: OtherPiece) => {
      const theirs = typedOfTexts(other.texts);
      now.current = theirs;
      tell({ kind: 'replace', typed: theirs, news: 'The other one stands in the form. Undo brings yours back.' });
      change({ kind: 'took-other' });
    }, [tell]),
    sent: useCallback(() => { change({ kind: 'sent' }); }, []),
  };
}

function readTexts(source: string): FormTexts | null {
  try {
    const texts: unknown = JSON.parse(source);
    return typeof texts === 'object' && texts !== null && Object.values(texts).every((text) => typeof text === 'string') ? (texts as FormTexts) : null;
  } catch {
    return null;
  }
}

import { useCallback, useEffect, useRef, useState, type ReactNode } from 'react';
import type { TextRemarks } from '#contracts/workroom.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Notice } from '#islands/ui/Notice.tsx';
import { readCopy } from '#islands/keeping/device-copy.ts';
import { statusWords } from '#islands/keeping/keeping.ts';
import { stretchOfLine, stretchOfRemark, wordsOfLine, type Stretch } from '#islands/writing/lines.ts';
import { PictureDialog } from '#islands/writing/PictureDialog.tsx';
import { OtherText } from '#islands/writing/OtherText.tsx';
import { putIn, type Snippet } from '#islands/writing/put-in.ts';
import { PutInButtons } from '#islands/writing/PutInButtons.tsx';
import { Remarks } from '#islands/writing/Remarks.tsx';
import type { Sayable } from '#islands/writing/sayable.ts';
import { useDraft } from '#islands/writing/use-draft.ts';
import { useTextView, type OpenText } from '#islands/writing/use-text-view.ts';

export interface LessonEditorProps {
  /** Public id of the part. */
  lesson: string;
  revision: number;
  /** Of the text as the page shows it first, with the words of the lines they speak of. */
  remarks: TextRemarks;
  lineWords: Readonly<Record<number, string>>;
  isEmpty: boolean;
  fieldId: string;
  sayable: Sayable;
  saveLabel: string;
  /** Line to go to when the page opens. */
  line: number | null;
  /** The text field, drawn by the page: so it works without script, and the text travels once. */
  children?: ReactNode;
}

const SAYS = 'Slash at the start of a line, or Control K, lists what can be put in. F8 goes to the next remark. Tab leaves the field.';

/** Round the text field of a lesson: what can be put in, keeping by itself, and remarks that lead to their lines. */
export function LessonEditor({ lesson, revision, remarks, lineWords, isEmpty, fieldId, sayable, saveLabel, line, children }: LessonEditorProps) {
  const box = useRef<HTMLDivElement>(null);
  const shown = useRef<OpenText | null>(null);
  const [caretLine, setCaretLine] = useState(1);
  const [numbered, setNumbered] = useState(false);
  const [picture, setPicture] = useState<{ file: File; place: number } | null>(null);
  const [broughtBack, setBroughtBack] = useState<string | null>(null);
  const textNow = useCallback(() => shown.current?.view.state.doc.toString() ?? box.current?.querySelector('textarea')?.value ?? '', []);
  const placeNow = useCallback(() => shown.current?.view.state.selection.main.head ?? 0, []);
  const { state, change, save } = useDraft(textNow, placeNow, lesson, revision, remarks);

  const onOpen = (opened: OpenText, area: HTMLTextAreaElement) => {
    shown.current = opened;
    const copy = readCopy(lesson);
    // Typed before the script woke, or put back by the browser after going back and forth.
    if (area.value !== area.defaultValue) change({ kind: 'typed' });
    else if (copy !== null && copy.source !== area.value) {
      setBroughtBack(area.value);
      opened.replaceAll(opened.view, copy.source);
      change({ kind: 'brought-back', revision: copy.revision });
    }
    if (line !== null) opened.choose(opened.view, stretchOfLine(textNow(), line));
  };
  const open = useTextView(box, { label: 'Text of this part', says: SAYS, sayable, onEdit: () => change({ kind: 'typed' }), onCaretLine: setCaretLine, onSave: save, onPicture: (file, place) => setPicture({ file, place }) }, onOpen);

  useEffect(() => {
    const form = box.current?.closest('form');
    if (open === null || form === null || form === undefined) return;
    const onSubmit = (event: SubmitEvent) => { event.preventDefault(); save(); };
    form.addEventListener('submit', onSubmit);
    return () => form.removeEventListener('submit', onSubmit);
  }, [open, save]);

  useEffect(() => {
    // Remarks on an older text would speak of other places.
    if (open !== null && state.readEdits === state.edits) open.underline(open.view, textNow(), state.remarks);
  }, [open, state.edits, state.readEdits, state.remarks, textNow]);

  const put = (snippet: Snippet, stretch: Stretch | undefined = open?.view.state.selection.main) => {
    if (open !== null && stretch !== undefined) open.replaceStretch(open.view, putIn(textNow(), stretch, snippet));
  };
  const putPicture = (name: string, alt: string) => {
    if (picture !== null) put({ kind: 'picture', name, alt }, { from: picture.place, to: picture.place });
    setPicture(null);
  };
  const replaceWith = (source: string) => open?.replaceAll(open.view, source);
  const toggleNumbers = () => {
    open?.showLineNumbers(open.view, !numbered);
    setNumbered(!numbered);
  };

  return (
    <div ref={box} className="lesson-editor" data-alive={open === null ? undefined : true}>
      {open !== null && <PutInButtons sayable={sayable} onPutIn={put} onPicture={(file) => setPicture({ file, place: open.view.state.selection.main.head })} />}
      {picture !== null && <PictureDialog lesson={lesson} file={picture.file} onDone={putPicture} onClose={() => setPicture(null)} />}
      {children}
      {broughtBack !== null && (
        <Notice title="What you typed on this device and could not send stands in the text again">
          <p className="row"><Button onClick={() => setBroughtBack(null)}>Good</Button><Button onClick={() => { replaceWith(broughtBack); setBroughtBack(null); }}>Take the text as it was kept</Button></p>
        </Notice>
      )}
      {state.behind !== null && (
        <OtherText
          source={state.behind.source}
          onKeep={() => change({ kind: 'keep-mine' })}
          onTake={(source) => { replaceWith(source); change({ kind: 'took-other' }); }}
        />
      )}
      <div className="save-row">
        <Button kind="act" type="submit" glyph="save" busy={state.saving}>{saveLabel}</Button>
        <p role="status" className={state.trouble === null || state.away ? 'small' : 'small wrong'}>{statusWords(state)}</p>
        {open !== null && <p className="small quiet only-desk">Line {caretLine}. It saves itself; <kbd className="key">Ctrl</kbd> <kbd className="key">S</kbd> saves at once.</p>}
        {open !== null && <Button kind="quiet" small aria-pressed={numbered} onClick={toggleNumbers}>Line numbers</Button>}
      </div>
      <Remarks
        remarks={state.remarks} fieldId={fieldId}
        isEmpty={state.edits === 0 ? isEmpty : textNow().trim() === ''}
        wordsOf={(number) => (state.edits === 0 ? (lineWords[number] ?? '') : wordsOfLine(textNow(), number))}
        onGo={(remark) => { if (open !== null) open.choose(open.view, stretchOfRemark(textNow(), remark)); }}
      />
    </div>
  );
}

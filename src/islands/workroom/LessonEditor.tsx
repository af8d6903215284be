import { useEffect, useLayoutEffect, useRef, useState, type ReactNode } from 'react';
import type { TextRemarks } from '#contracts/workroom.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Notice } from '#islands/ui/Notice.tsx';
import { statusWords } from '#islands/workroom/editing.ts';
import { lineAt, stretchOfLine, stretchOfRemark, wordsOfLine } from '#islands/workroom/lines.ts';
import { putIn, type Snippet } from '#islands/workroom/put-in.ts';
import { PutInButtons, type Sayable } from '#islands/workroom/PutInButtons.tsx';
import { Remarks } from '#islands/workroom/Remarks.tsx';
import { choose, replaceAll, replaceStretch } from '#islands/workroom/text-field.ts';
import { useDraft } from '#islands/workroom/use-draft.ts';

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

/** Round the text field of a lesson: what can be put in, keeping by itself, and remarks that lead to their lines. */
export function LessonEditor({ lesson, revision, remarks, lineWords, isEmpty, fieldId, sayable, saveLabel, line, children }: LessonEditorProps) {
  const field = useRef<HTMLTextAreaElement>(null);
  const box = useRef<HTMLDivElement>(null);
  const [alive, setAlive] = useState(false);
  const [caretLine, setCaretLine] = useState(1);
  useLayoutEffect(() => { field.current = box.current?.querySelector('textarea') ?? null; }, []);
  const { state, change, save } = useDraft(field, lesson, revision, remarks);
  const text = (): string => field.current?.value ?? '';

  useEffect(() => {
    const area = field.current;
    const form = area?.form;
    if (area === null || form === null || form === undefined) return;
    const onSubmit = (event: SubmitEvent) => { event.preventDefault(); save(); };
    const onKey = (event: KeyboardEvent) => { if ((event.ctrlKey || event.metaKey) && event.key === 's') { event.preventDefault(); save(); } };
    const onCaret = () => setCaretLine(lineAt(area.value, area.selectionStart));
    const carets = ['keyup', 'pointerup', 'focus', 'input'] as const;
    form.addEventListener('submit', onSubmit);
    area.addEventListener('keydown', onKey);
    for (const name of carets) area.addEventListener(name, onCaret);
    setAlive(true);
    return () => {
      form.removeEventListener('submit', onSubmit);
      area.removeEventListener('keydown', onKey);
      for (const name of carets) area.removeEventListener(name, onCaret);
    };
  }, [save]);

  useEffect(() => {
    if (line !== null && field.current !== null) choose(field.current, stretchOfLine(field.current.value, line));
  }, [line]);

  const put = (snippet: Snippet) => {
    const area = field.current;
    if (area !== null) replaceStretch(area, putIn(area.value, { from: area.selectionStart, to: area.selectionEnd }, snippet));
  };
  const takeOther = () => {
    if (field.current !== null && state.behind !== null) replaceAll(field.current, state.behind.source);
    change({ kind: 'took-other' });
  };

  return (
    <div ref={box} className="lesson-editor" data-alive={alive || undefined}>
      {alive && <PutInButtons sayable={sayable} onPutIn={put} />}
      {children}
      {state.behind !== null && (
        <Notice kind="mend" title="Another window saved this text in the meantime" urgent>
          <p>Yours still stands in the field. Keep yours, or take the other; whichever you take, the field’s undo brings the first back.</p>
          <details className="mt-2"><summary>Read the other text</summary><pre className="other-text" tabIndex={0}>{state.behind.source}</pre></details>
          <p className="row mt-3"><Button onClick={() => change({ kind: 'keep-mine' })}>Keep mine</Button><Button onClick={takeOther}>Take the other</Button></p>
        </Notice>
      )}
      <div className="save-row">
        <Button kind="act" type="submit" glyph="save" busy={state.saving}>{saveLabel}</Button>
        <p role="status" className={state.trouble === null ? 'small' : 'small wrong'}>{statusWords(state)}</p>
        {alive && <p className="small quiet only-desk">Line {caretLine}. It saves itself; <kbd className="key">Ctrl</kbd> <kbd className="key">S</kbd> saves at once.</p>}
      </div>
      <Remarks
        remarks={state.remarks} fieldId={fieldId}
        isEmpty={state.edits === 0 ? isEmpty : text().trim() === ''}
        wordsOf={(number) => (state.edits === 0 ? (lineWords[number] ?? '') : wordsOfLine(text(), number))}
        onGo={(remark) => { if (field.current !== null) choose(field.current, stretchOfRemark(text(), remark)); }}
      />
    </div>
  );
}

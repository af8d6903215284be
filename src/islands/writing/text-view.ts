/**
 * The text field of a lesson once its page is awake. It lives in a shadow root: there its style sheets can be adopted,
 * and the content policy lets no script write a `<style>` into the page.
 */
import { closeBrackets, closeBracketsKeymap, completionKeymap } from '@codemirror/autocomplete';
import { defaultKeymap, history, historyKeymap } from '@codemirror/commands';
import { lintGutter, nextDiagnostic, previousDiagnostic, setDiagnostics, type Diagnostic } from '@codemirror/lint';
import { highlightSelectionMatches, search, searchKeymap } from '@codemirror/search';
import { Compartment, EditorState, type Extension } from '@codemirror/state';
import { drawSelection, EditorView, highlightSpecialChars, keymap, lineNumbers } from '@codemirror/view';
import type { TextRemarks } from '#contracts/workroom.ts';
import { lessonLanguage } from '#islands/writing/lesson-language.ts';
import { stretchOfRemark, type Stretch } from '#islands/writing/lines.ts';
import type { PutIn } from '#islands/writing/put-in.ts';
import { suggestions } from '#islands/writing/suggestions.ts';
import type { Sayable } from '#islands/writing/sayable.ts';
import { textLook } from '#islands/writing/text-look.ts';

export interface TextViewOptions {
  text: string;
  /** What the field is called, and what is said of it, for those who hear the page. */
  label: string;
  says: string;
  sayable: Sayable;
  onEdit: () => void;
  onCaretLine: (line: number) => void;
  onSave: () => void;
  /** A file that was dropped on the text or pasted into it, and where. */
  onPicture: (file: File, place: number) => void;
}

const numbers = new Compartment();

/** Makes the field inside `host`. It is destroyed by its own `destroy`. */
export function openTextView(host: HTMLElement, options: TextViewOptions): EditorView {
  const root = host.shadowRoot ?? host.attachShadow({ mode: 'open' });
  return new EditorView({ root, parent: root, state: EditorState.create({ doc: options.text, extensions: extensionsOf(options) }) });
}

function extensionsOf({ label, says, sayable, onEdit, onCaretLine, onSave, onPicture }: TextViewOptions): Extension {
  return [
    history(), drawSelection(), highlightSpecialChars(), closeBrackets(), highlightSelectionMatches(),
    EditorView.lineWrapping, lessonLanguage, textLook, numbers.of([]), search({ top: true }), suggestions(sayable),
    // The tab stop is said in so many words: what scrolls must hold something that takes the focus, and not every tool counts an editable field.
    EditorView.contentAttributes.of({ tabindex: '0', 'aria-label': label, 'aria-description': says, spellcheck: 'true', autocorrect: 'on', autocapitalize: 'sentences' }),
    keymap.of([
      { key: 'Mod-s', preventDefault: true, run: () => { onSave(); return true; } },
      { key: 'F8', run: nextDiagnostic },
      { key: 'Shift-F8', run: previousDiagnostic },
      // Tab is nobody's key here: it leaves the field, as everywhere on the page.
      ...closeBracketsKeymap, ...completionKeymap, ...searchKeymap, ...historyKeymap, ...defaultKeymap,
    ]),
    EditorView.updateListener.of(({ docChanged, selectionSet, state }) => {
      if (docChanged) onEdit();
      if (docChanged || selectionSet) onCaretLine(state.doc.lineAt(state.selection.main.head).number);
    }),
    EditorView.domEventHandlers({
      drop: (event, view) => takesFile(event, event.dataTransfer, view.posAtCoords({ x: event.clientX, y: event.clientY }) ?? view.state.selection.main.head, onPicture),
      paste: (event, view) => takesFile(event, event.clipboardData, view.state.selection.main.head, onPicture),
    }),
  ];
}

/** A file becomes a picture, words stay words: what a page copies often has both, and then the words count. */
function takesFile(event: Event, data: DataTransfer | null, place: number, onPicture: TextViewOptions['onPicture']): boolean {
  const file = data?.files[0];
  if (file === undefined || data?.types.includes('text/plain') === true) return false;
  event.preventDefault();
  onPicture(file, place);
  return true;
}

/** Puts the focus into the field with `stretch` chosen and in sight. */
export function choose(view: EditorView, { from, to }: Stretch): void {
  const most = view.state.doc.length;
  view.dispatch({ selection: { anchor: Math.min(from, most), head: Math.min(to, most) }, effects: EditorView.scrollIntoView(Math.min(from, most), { y: 'center' }) });
  view.focus();
}

export function replaceStretch(view: EditorView, { from, to, text, selectFrom, selectTo }: PutIn): void {
  view.dispatch({ changes: { from, to, insert: text }, selection: { anchor: selectFrom, head: selectTo }, scrollIntoView: true, userEvent: 'input.complete' });
  view.focus();
}

/** One change, so that one undo brings the old text back. */
export function replaceAll(view: EditorView, text: string): void {
  view.dispatch({ changes: { from: 0, to: view.state.doc.length, insert: text } });
  view.focus();
}

export function showLineNumbers(view: EditorView, shown: boolean): void {
  view.dispatch({ effects: numbers.reconfigure(shown ? [lineNumbers(), lintGutter()] : []) });
}

/** Underlines what the remarks speak of; `source` is the text they were made on, and must be the text on the screen. */
export function underline(view: EditorView, source: string, { problems, warnings }: TextRemarks): void {
  const marks = (remarks: TextRemarks['problems'], severity: Diagnostic['severity']): Diagnostic[] =>
    remarks.map((remark) => {
      const { from, to } = stretchOfRemark(source, remark);
      return { from, to, severity, message: `Line ${remark.line}: ${remark.reason}` };
    });
  const all = [...marks(problems, 'error'), ...marks(warnings, 'warning')].sort((a, b) => a.from - b.from);
  view.dispatch(setDiagnostics(view.state, all));
}

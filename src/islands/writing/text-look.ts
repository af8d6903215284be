/** What the text field of a lesson looks like: the page's own letters and colours, in both schemes. */
import { HighlightStyle, syntaxHighlighting } from '@codemirror/language';
import { EditorView } from '@codemirror/view';
import { tags } from '@lezer/highlight';

const colour = (role: string): string => `rgb(var(--${role}))`;
const sheet = { backgroundColor: colour('sheet'), color: colour('ink'), border: `1px solid ${colour('ink')}` };
const mono = "ui-monospace, 'DejaVu Sans Mono', monospace";

const frame = EditorView.theme({
  '&': { minHeight: 'min(640px, 70vh)', maxHeight: '85vh', color: 'inherit', backgroundColor: 'transparent' },
  '&.cm-focused': { outline: 'none' },
  '.cm-scroller': { fontFamily: 'inherit', lineHeight: '1.55', overflow: 'auto' },
  '.cm-content': { padding: '10px 0', caretColor: colour('ink') },
  '.cm-line': { padding: '0 12px' },
  '.cm-gutters': { backgroundColor: 'transparent', color: colour('ink-2'), border: 'none', fontSize: '0.8em' },
  '.cm-cursor, .cm-dropCursor': { borderLeft: `2px solid ${colour('ink')}` },
  '.cm-selectionMatch': { backgroundColor: 'rgb(var(--link) / 0.14)' },
  '&.cm-focused > .cm-scroller > .cm-selectionLayer .cm-selectionBackground, .cm-selectionBackground': { backgroundColor: 'rgb(var(--link) / 0.28)' },
});

const remarks = EditorView.theme({
  // A wave for what cannot be read, dots for what is worth a look: told by shape before colour.
  '.cm-lintRange-error': { backgroundImage: 'none', textDecoration: `underline wavy ${colour('mend')} 2px`, textUnderlineOffset: '0.2em' },
  '.cm-lintRange-warning': { backgroundImage: 'none', textDecoration: `underline dotted ${colour('ink')} 2px`, textUnderlineOffset: '0.2em' },
  '.cm-lintPoint::after': { borderBottomColor: colour('mend') },
  '.cm-diagnostic': { padding: '8px 12px', borderLeft: `5px solid ${colour('ink-2')}` },
  '.cm-diagnostic-error': { borderLeftColor: colour('mend') },
});

const sheets = EditorView.theme({
  '.cm-tooltip': { ...sheet, maxWidth: 'min(560px, 90vw)', zIndex: '20' },
  '.cm-tooltip.cm-tooltip-autocomplete > ul': { fontFamily: 'inherit', maxHeight: '22em', minWidth: 'min(360px, 80vw)' },
  '.cm-tooltip.cm-tooltip-autocomplete > ul > li': { display: 'flex', gap: '12px', padding: '7px 12px', lineHeight: '1.35' },
  '.cm-tooltip.cm-tooltip-autocomplete > ul > li[aria-selected]': { backgroundColor: colour('act'), color: colour('on-act') },
  '.cm-tooltip.cm-tooltip-autocomplete > ul > completion-section': { padding: '8px 12px 2px', borderBottom: `1px solid ${colour('rule')}`, opacity: '1', color: colour('ink-2') },
  '.cm-completionMatchedText': { textDecoration: 'underline' },
  '.cm-completionDetail': { marginLeft: 'auto', fontStyle: 'normal', fontWeight: '600', fontVariantNumeric: 'tabular-nums' },
  '.cm-completionInfo': { width: '280px', padding: '10px' },
  '.cm-completionInfo svg': { display: 'block', width: '100%', height: 'auto' },
  '.cm-panels': { backgroundColor: colour('sheet'), color: colour('ink') },
  '.cm-panels.cm-panels-top': { borderBottom: `1px solid ${colour('rule')}` },
  '.cm-panel.cm-search': { padding: '8px 12px', fontSize: '14px' },
  '.cm-textfield': { backgroundColor: colour('field'), color: colour('ink'), border: `1px solid ${colour('edge')}`, padding: '4px 8px', fontSize: '14px' },
  '.cm-button': { backgroundImage: 'none', backgroundColor: 'transparent', color: colour('ink'), border: `1px solid ${colour('edge')}`, padding: '4px 8px', fontSize: '14px' },
  '.cm-search .cm-button:focus-visible, .cm-search input:focus-visible, .cm-search button:focus-visible': { outline: `3px solid ${colour('ring')}`, outlineOffset: '2px' },
});

const signs = HighlightStyle.define([
  { tag: tags.heading, fontWeight: '700', fontSize: '1.15em' },
  { tag: tags.strong, fontWeight: '700' },
  { tag: tags.emphasis, fontStyle: 'italic' },
  { tag: tags.strikethrough, textDecoration: 'line-through' },
  { tag: tags.tagName, color: colour('link'), fontWeight: '600' },
  { tag: tags.attributeName, color: colour('ink-2') },
  { tag: tags.string, color: colour('link') },
  { tag: tags.link, color: colour('link'), textDecoration: 'underline' },
  { tag: tags.monospace, fontFamily: mono, fontSize: '0.9em' },
  { tag: tags.processingInstruction, color: colour('ink-2'), fontWeight: '700' },
  { tag: tags.invalid, color: colour('mend'), fontWeight: '700' },
]);

export const textLook = [frame, remarks, sheets, syntaxHighlighting(signs)];

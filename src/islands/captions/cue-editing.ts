/** Captions being written, apart from any screen: lines, which one is in hand, what can be undone, how they are kept. */
import { captionFaults } from '#core/captions/caption-faults.ts';
import type { Cue } from '#core/captions/cues.ts';
import { inOrder, shiftCues } from '#core/captions/shift-cues.ts';
import { cueAt } from '#core/captions/transcript.ts';

/** A line with a name of its own, which it keeps while it is moved and written. */
export interface EditLine extends Cue {
  readonly key: number;
}

export interface CueEditing {
  readonly lines: readonly EditLine[];
  /** The line that is marked and written. */
  readonly inHand: number | null;
  readonly before: readonly (readonly EditLine[])[];
  /** The line into which words were written last, until anything else happens. */
  readonly writing: number | null;
  readonly nextKey: number;
  /** Changes so far, and how many of them are kept. */
  readonly edits: number;
  readonly keptEdits: number;
  readonly revision: number;
  readonly isSaving: boolean;
  readonly savedAt: string | null;
  readonly trouble: string | null;
  /** What another window kept in the meantime. */
  readonly behind: { readonly revision: number; readonly cues: readonly Cue[] } | null;
}

export type CueEvent =
  | { readonly kind: 'choose'; readonly key: number }
  | { readonly kind: 'write'; readonly key: number; readonly words: string }
  | { readonly kind: 'add' | 'mark-in' | 'mark-out'; readonly atMs: number }
  | { readonly kind: 'take-out'; readonly key: number }
  | { readonly kind: 'shift'; readonly byMs: number }
  | { readonly kind: 'undo' | 'save-began' | 'keep-mine' | 'take-theirs' }
  | { readonly kind: 'kept'; readonly revision: number; readonly savedAt: string; readonly edits: number }
  | { readonly kind: 'failed'; readonly says: string }
  | { readonly kind: 'behind'; readonly revision: number; readonly cues: readonly Cue[] };

const NEW_LINE_MS = 3_000;
const LEAST_MS = 300;
const MOST_UNDO = 100;

export function beginCueEditing(cues: readonly Cue[], revision: number): CueEditing {
  return { lines: cues.map((cue, key) => ({ ...cue, key })), inHand: null, before: [], writing: null, nextKey: cues.length, edits: 0, keptEdits: 0, revision, isSaving: false, savedAt: null, trouble: null, behind: null };
}

export function cueEditingAfter(state: CueEditing, event: CueEvent): CueEditing {
  switch (event.kind) {
    case 'choose':
      return { ...state, inHand: event.key, writing: state.writing === event.key ? event.key : null };
    case 'write':
      return changed(state, ofLine(state, event.key, () => ({ words: event.words })), event.key);
    case 'add':
      return added(state, event.atMs);
    case 'mark-in':
      return marked(state, event.atMs, ({ toMs }) => ({ fromMs: event.atMs, toMs: Math.max(toMs, event.atMs + LEAST_MS) }));
    case 'mark-out':
      return marked(state, event.atMs, ({ fromMs }) => ({ toMs: Math.max(event.atMs, fromMs + LEAST_MS) }));
    case 'take-out':
      return { ...changed(state, state.lines.filter(({ key }) => key !== event.key)), inHand: null };
    case 'shift':
      return changed(state, shiftCues(state.lines, event.byMs).map((cue, at) => ({ ...cue, key: state.lines[at]?.key ?? at })));
    case 'undo': {
      const last = state.before.at(-1);
      return last === undefined ? state : { ...state, lines: last, before: state.before.slice(0, -1), writing: null, edits: state.edits + 1 };
    }
    case 'save-began':
      return { ...state, isSaving: true };
    case 'kept':
      return { ...state, isSaving: false, trouble: null, revision: event.revision, savedAt: event.savedAt, keptEdits: event.edits };
    case 'failed':
      return { ...state, isSaving: false, trouble: event.says };
    case 'behind':
      return { ...state, isSaving: false, behind: { revision: event.revision, cues: event.cues } };
    case 'keep-mine':
      return state.behind === null ? state : { ...state, revision: state.behind.revision, behind: null, edits: state.edits + 1 };
    case 'take-theirs':
      return state.behind === null ? state : beginCueEditing(state.behind.cues, state.behind.revision);
  }
}

/** Lines as they are kept: in order, those without words left out. */
export function cuesOf({ lines }: Pick<CueEditing, 'lines'>): Cue[] {
  return inOrder(lines.filter(({ words }) => words.trim() !== '')).map(({ fromMs, toMs, words }) => ({ fromMs: Math.round(fromMs), toMs: Math.round(toMs), words: words.trim().replace(/\s+/g, ' ') }));
}

/** What cannot stand, by the key of its line. */
export function faultsOf({ lines }: Pick<CueEditing, 'lines'>, durationMs: number): ReadonlyMap<number, string> {
  const written = lines.filter(({ words }) => words.trim() !== '');
  return new Map(captionFaults(written, durationMs).map(({ index, says }) => [written[index]?.key ?? -1, says]));
}

export function isUnsaved({ edits, keptEdits }: Pick<CueEditing, 'edits' | 'keptEdits'>): boolean {
  return edits > keptEdits;
}

function ofLine({ lines }: CueEditing, wanted: number, change: (line: EditLine) => Partial<Cue>): EditLine[] {
  return inLineOrder(lines.map((line) => (line.key === wanted ? { ...line, ...change(line) } : line)));
}

function inLineOrder(lines: readonly EditLine[]): EditLine[] {
  return [...lines].sort((a, b) => a.fromMs - b.fromMs || a.key - b.key);
}

/** Without a line in hand the one that plays is marked. */
function marked(state: CueEditing, atMs: number, change: (line: EditLine) => Partial<Cue>): CueEditing {
  const key = state.inHand ?? state.lines[cueAt(state.lines, atMs)]?.key;
  return key === undefined ? state : { ...changed(state, ofLine(state, key, change)), inHand: key };
}

/** A new line ends where the next one begins, when there is room. */
function added(state: CueEditing, atMs: number): CueEditing {
  const key = state.nextKey;
  const next = state.lines.find(({ fromMs }) => fromMs > atMs);
  const toMs = Math.max(atMs + LEAST_MS, Math.min(atMs + NEW_LINE_MS, next?.fromMs ?? Infinity));
  return { ...changed(state, inLineOrder([...state.lines, { key, fromMs: atMs, toMs, words: '' }])), inHand: key, nextKey: key + 1 };
}

/** Signs written one after the other into a line are undone together. */
function changed(state: CueEditing, lines: readonly EditLine[], writing: number | null = null): CueEditing {
  const before = writing !== null && state.writing === writing ? state.before : [...state.before, state.lines].slice(-MOST_UNDO);
  return { ...state, lines, before, writing, edits: state.edits + 1 };
}

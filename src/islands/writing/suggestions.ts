/** What the editor offers while a lesson is written: the palette (`/` at the start of a line, or Ctrl K), tags, names. */
import { autocompletion, startCompletion, type Completion, type CompletionContext, type CompletionResult } from '@codemirror/autocomplete';
import { ChangeSet, type Extension } from '@codemirror/state';
import { keymap, type EditorView } from '@codemirror/view';
import { putIn, snippetOfMedia, type Snippet } from '#islands/writing/put-in.ts';
import type { Sayable } from '#islands/writing/sayable.ts';

const section = (name: string, rank: number) => ({ name, rank });
const BLOCKS = section('Put in', 0);
const AMOUNTS = section('Amounts of the plan', 1);
const FIGURES = section('Figures', 2);
const MEDIA = section('Videos and pictures', 3);

export function suggestions(sayable: Sayable): Extension {
  return [
    autocompletion({
      override: [(context) => suggestionsFor(context, sayable)],
      icons: false, maxRenderedOptions: 300,
      // The list opens only where it is asked for, so its Enter may follow as fast as a hand can.
      interactionDelay: 0,
    }),
    keymap.of([{ key: 'Mod-k', preventDefault: true, run: startCompletion }]),
  ];
}

/** What can stand at a place; null when nothing is offered there. */
export function suggestionsFor(context: CompletionContext, sayable: Sayable): CompletionResult | null {
  return valueOf(context, sayable) ?? tagOrPalette(context, sayable);
}

/** Within the quotes of an attribute: the names that can stand there. */
function valueOf(context: CompletionContext, { amounts, figures, media }: Sayable): CompletionResult | null {
  const before = context.matchBefore(/<(?:Amount|Figure|Picture|Video)\s[^<>]*?(?:of|name)="[\w.-]*/);
  if (before === null) return null;
  const quote = before.text.lastIndexOf('"') + 1;
  const tag = /^<(\w+)/.exec(before.text)?.[1];
  const named = (options: Completion[]): CompletionResult => ({ from: before.from + quote, options, validFor: /^[\w.-]*$/ });
  if (tag === 'Amount') return named(amounts.map(({ key, label, text }) => ({ label: `${key} ${label}`, displayLabel: label, detail: text, apply: key })));
  if (tag === 'Figure') return named(figures.map(({ value, label }) => ({ label: value, displayLabel: label, apply: value })));
  const kind = tag === 'Video' ? 'video/' : 'picture/';
  return named(media.filter(({ value }) => value.startsWith(kind)).map(({ value, label }) => ({ label: value.slice(kind.length), displayLabel: label, apply: value.slice(kind.length) })));
}

/** A tag that is begun, a slash at the start of a line, or whatever is asked for by key. */
function tagOrPalette(context: CompletionContext, sayable: Sayable): CompletionResult | null {
  const begun = context.matchBefore(/<[A-Z]?\w*$/) ?? context.matchBefore(/^\/[\w -]*$/);
  if (begun === null && !context.explicit) return null;
  const from = begun?.from ?? context.pos;
  // The sign that opened the list is no part of what is looked for.
  return { from: begun === null ? from : from + 1, options: paletteOf(sayable).map((option) => withoutSign(option, begun === null ? 0 : 1)), validFor: /^[\w -]*$/ };
}

function withoutSign(option: Completion, sign: number): Completion {
  const { apply } = option;
  return typeof apply !== 'function' ? option : { ...option, apply: (view, completion, from, to) => apply(view, completion, from - sign, to) };
}

function paletteOf({ amounts, figures, media }: Sayable): Completion[] {
  const option = (given: Omit<Completion, 'apply'>, snippet: Snippet): Completion => ({ ...given, apply: (view, _completion, from, to) => putInstead(view, from, to, snippet) });
  return [
    option({ label: 'Step to tick', section: BLOCKS, boost: 4 }, { kind: 'step' }),
    option({ label: 'Caution', section: BLOCKS, boost: 3 }, { kind: 'caution' }),
    option({ label: 'Tip', section: BLOCKS, boost: 2 }, { kind: 'tip' }),
    option({ label: 'Heading', section: BLOCKS, boost: 1 }, { kind: 'heading' }),
    ...amounts.map(({ key, label, text }) => option({ label: `Amount: ${label}`, displayLabel: label, detail: text, section: AMOUNTS }, { kind: 'amount', key })),
    ...figures.map(({ value, label }) => option({ label: `Figure: ${label}`, displayLabel: label, section: FIGURES }, { kind: 'figure', of: value })),
    ...media.map(({ value, label }) => option({ label, section: MEDIA }, snippetOfMedia(value))),
  ];
}

/** Puts `snippet` where `from` to `to` was typed to find it; one step of undo. */
function putInstead(view: EditorView, from: number, to: number, snippet: Snippet): void {
  const gone = view.state.changes({ from, to });
  const text = gone.apply(view.state.doc).toString();
  const { from: at, to: end, text: insert, selectFrom, selectTo } = putIn(text, { from, to: from }, snippet);
  const changes = gone.compose(ChangeSet.of({ from: at, to: end, insert }, text.length));
  view.dispatch({ changes, selection: { anchor: selectFrom, head: selectTo }, scrollIntoView: true, userEvent: 'input.complete' });
}

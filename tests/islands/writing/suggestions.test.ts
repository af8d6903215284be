import { CompletionContext } from '@codemirror/autocomplete';
import { EditorState } from '@codemirror/state';
import { EditorView } from '@codemirror/view';
import { describe, expect, it } from 'vitest';
import { lessonLanguage } from '#islands/writing/lesson-language.ts';
import type { Sayable } from '#islands/writing/sayable.ts';
import { suggestionsFor } from '#islands/writing/suggestions.ts';

const SAYABLE: Sayable = {
  amounts: [{ key: 'ends', label: 'Warp ends', text: '66' }, { key: 'cord', label: 'Hanging cord', text: '1.2 m' }],
  figures: [{ value: 'soumak', label: 'Soumak' }],
  media: [{ value: 'video/dress', label: 'Video: Dress the loom' }, { value: 'picture/warped-loom', label: 'Picture: Warped loom' }],
};

/** What is offered where `|` stands in the text, by the words a teacher sees. */
function offered(marked: string, explicit = false) {
  const pos = marked.indexOf('|');
  const state = EditorState.create({ doc: marked.replace('|', ''), extensions: [lessonLanguage] });
  const result = suggestionsFor(new CompletionContext(state, pos, explicit), SAYABLE);
  return { result, state, words: result?.options.map(({ label, displayLabel, detail }) => [displayLabel ?? label, detail].filter(Boolean).join(' ')) };
}

/** The text after one of them was taken. */
function taken(marked: string, label: string, explicit = false): string {
  const { result, state } = offered(marked, explicit);
  const option = result?.options.find((each) => (each.displayLabel ?? each.label) === label);
  if (result === null || option === undefined) throw new Error(`${label} is not offered`);
  const view = new EditorView({ state });
  const to = marked.indexOf('|');
  if (typeof option.apply === 'function') option.apply(view, option, result.from, to);
  else view.dispatch({ changes: { from: result.from, to, insert: option.apply ?? option.label } });
  const text = view.state.doc.toString();
  view.destroy();
  return text;
}

describe('what the editor offers', () => {
  it('is everything after a slash at the start of a line, amounts with their present value', () => {
    expect(offered('Words.\n\n/|').words).toEqual(['Step to tick', 'Caution', 'Tip', 'Heading', 'Warp ends 66', 'Hanging cord 1.2 m', 'Soumak', 'Video: Dress the loom', 'Picture: Warped loom']);
  });

  it('is nothing within a sentence, unless asked for by key', () => {
    expect(offered('either/|').words).toBeUndefined();
    expect(offered('Wind |', true).words).toContain('Warp ends 66');
  });

  it('is the names that can stand in the quotes', () => {
    expect(offered('Wind <Amount of="|').words).toEqual(['Warp ends 66', 'Hanging cord 1.2 m']);
    expect(offered('<Figure of="s|').words).toEqual(['Soumak']);
    expect(offered('<Video name="|').words).toEqual(['Video: Dress the loom']);
    expect(offered('<Picture alt="x" name="|').words).toEqual(['Picture: Warped loom']);
  });

  it('takes the place of what was typed to find it', () => {
    expect(taken('Words.\n\n/ste|', 'Step to tick')).toBe('Words.\n\n<Step id="step-1">\nSay what the hand does.\n</Step>');
    expect(taken('Words.\n\n<Cau|', 'Caution')).toMatch(/^Words\.\n\n<Caution title=/);
    expect(taken('Wind | ends', 'Hanging cord', true)).toBe('Wind <Amount of="cord"/> ends');
    expect(taken('Wind <Amount of="|"/>', 'Warp ends')).toBe('Wind <Amount of="ends"/>');
  });

  it('puts a block after the paragraph, never into a sentence', () => {
    expect(taken('One sentence |goes on.', 'Tip', true)).toMatch(/^One sentence goes on\.\n\n<Tip /);
  });
});

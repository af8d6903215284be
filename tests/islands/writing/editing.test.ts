import { describe, expect, it } from 'vitest';
import type { DraftKept } from '#contracts/workroom.ts';
import { isUnsaved, maySave, statusWords } from '#islands/keeping/keeping.ts';
import { beginEditing, editingAfter, type EditEvent, type Editing } from '#islands/writing/editing.ts';
import { lineAt, stretchOfLine, stretchOfRemark, wordsOfLine } from '#islands/writing/lines.ts';
import { putIn, type Snippet } from '#islands/writing/put-in.ts';

const NONE = { problems: [], warnings: [] };
const problem = { line: 3, column: 1, code: 'code', reason: 'Curly braces mean code.' } as const;
const kept = (revision: number, given: Partial<DraftKept> = {}): DraftKept => ({ revision, savedAt: '14:02', ...NONE, ...given });
const after = (...events: EditEvent[]): Editing => events.reduce(editingAfter, beginEditing(4, NONE));

describe('a text being written', () => {
  it('is unsaved from the first letter until it was kept', () => {
    expect(isUnsaved(after())).toBe(false);
    expect(statusWords(after({ kind: 'typed' }))).toBe('Not saved yet.');
    const done = after({ kind: 'typed' }, { kind: 'save-began' }, { kind: 'kept', edits: 1, draft: kept(5) });
    expect([isUnsaved(done), done.revision, statusWords(done)]).toEqual([false, 5, 'Saved 14:02']);
  });

  it('stays unsaved when more was typed while it was being kept', () => {
    const state = after({ kind: 'typed' }, { kind: 'save-began' }, { kind: 'typed' }, { kind: 'kept', edits: 1, draft: kept(5) });
    expect([isUnsaved(state), maySave(state)]).toEqual([true, true]);
  });

  it('is not kept twice at once', () => {
    expect(maySave(after({ kind: 'typed' }, { kind: 'save-began' }))).toBe(false);
  });

  it('says what stands in the way, and tries again', () => {
    const state = after({ kind: 'typed' }, { kind: 'save-began' }, { kind: 'failed', says: 'The line is down.' });
    expect([statusWords(state), maySave(state)]).toEqual(['The line is down.', true]);
  });

  it('keeps nothing by itself after another window was first, until its writer has decided', () => {
    const behind = [{ kind: 'typed' }, { kind: 'save-began' }, { kind: 'behind', other: { revision: 9, source: 'Theirs.' } }] as const;
    expect([maySave(after(...behind)), isUnsaved(after(...behind))]).toEqual([false, true]);
    const mine = after(...behind, { kind: 'keep-mine' });
    expect([maySave(mine), mine.revision, mine.behind]).toEqual([true, 9, null]);
    const theirs = after(...behind, { kind: 'typed' }, { kind: 'took-other' });
    expect([isUnsaved(theirs), theirs.revision]).toEqual([false, 9]);
  });

  it('never shows remarks on an older text in place of those on a newer one', () => {
    const state = after({ kind: 'typed' }, { kind: 'typed' }, { kind: 'read', edits: 2, remarks: { problems: [problem], warnings: [] } }, { kind: 'read', edits: 1, remarks: NONE });
    expect(state.remarks.problems).toEqual([problem]);
  });
});

describe('places by lines', () => {
  const text = 'one\n\nthree {x}\nfour';
  it.each([[1, 'one'], [2, ''], [3, 'three {x}'], [4, 'four'], [9, '']])('line %i is “%s”', (line, words) => {
    const { from, to } = stretchOfLine(text, line);
    expect(text.slice(from, to)).toBe(words);
  });

  it('a remark chooses its columns, or the line where it has none', () => {
    const chosen = (remark: { line: number; column: number; endColumn?: number }): string => {
      const { from, to } = stretchOfRemark(text, remark);
      return text.slice(from, to);
    };
    expect([chosen({ line: 3, column: 7, endColumn: 10 }), chosen({ line: 3, column: 7 }), chosen({ line: 3, column: 7, endColumn: 99 })]).toEqual(['{x}', 'three {x}', 'three {x}']);
  });

  it('tells the line of a place, and shortens long lines', () => {
    expect([lineAt(text, 0), lineAt(text, 4), lineAt(text, 5), lineAt(text, text.length)]).toEqual([1, 2, 3, 4]);
    expect(wordsOfLine('a'.repeat(100), 1)).toHaveLength(80);
  });
});

describe('what the buttons put in', () => {
  const result = (source: string, from: number, to: number, snippet: Snippet): [string, string] => {
    const change = putIn(source, { from, to }, snippet);
    const text = source.slice(0, change.from) + change.text + source.slice(change.to);
    return [text, text.slice(change.selectFrom, change.selectTo)];
  };

  it('an amount stands within the sentence', () => {
    expect(result('Wind  up.', 5, 5, { kind: 'amount', key: 'ends' })[0]).toBe('Wind <Amount of="ends"/> up.');
  });

  it('a step goes after the paragraph, with an empty line between, its words ready to be typed over', () => {
    expect(result('Wind it.\n\nThen tie.', 3, 3, { kind: 'step' })).toEqual(['Wind it.\n\n<Step id="step-1">\nSay what the hand does.\n</Step>\n\nThen tie.', 'Say what the hand does.']);
  });

  it('words that are chosen go into a step and give it its name, which no other step has', () => {
    expect(result('Tie the first knot.', 0, 19, { kind: 'step' })[0]).toBe('<Step id="tie-the-first-knot">\nTie the first knot.\n</Step>');
    expect(result('<Step id="tie-on">\nA\n</Step>\n\nTie on', 30, 36, { kind: 'step' })[0]).toContain('<Step id="tie-on-2">');
    expect(result('<Step id="step-1">\nA\n</Step>', 28, 28, { kind: 'step' })[0]).toContain('<Step id="step-2">');
  });

  it.each([
    [{ kind: 'video', name: 'wind' }, '<Video name="wind"/>'],
    [{ kind: 'figure', of: 'soumak' }, '<Figure of="soumak" caption="What it shows"/>'],
    [{ kind: 'heading' }, '## A heading'],
  ] as const)('into an empty text, as it stands: %j', (snippet, text) => {
    expect(result('', 0, 0, snippet)[0]).toBe(text);
  });
});

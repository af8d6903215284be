/** How the signs of a lesson's text are told apart on the screen. Only for the eye: what a text means, the reader says. */
import { StreamLanguage, type StringStream } from '@codemirror/language';

interface State {
  /** Within a tag: between `<` and `>`, which may lie on different lines. */
  inTag: boolean;
  /** The signs that close a block of code, while in one. */
  fence: string | null;
}

/** Names of the kinds of sign, as the highlighter knows them. */
type Kind = 'heading' | 'processingInstruction' | 'tagName' | 'attributeName' | 'string' | 'monospace' | 'strong' | 'emphasis' | 'strikethrough' | 'link' | 'invalid' | null;

function inTag(stream: StringStream, state: State): Kind {
  if (stream.eatSpace()) return null;
  if (stream.match(/^"[^"]*"?/)) return 'string';
  if (stream.match(/^\/?>/)) {
    state.inTag = false;
    return 'tagName';
  }
  if (stream.match(/^[\w-]+/)) return 'attributeName';
  stream.next();
  return null;
}

function atLineStart(stream: StringStream, state: State): Kind | undefined {
  const fence = stream.match(/^ {0,3}(```+|~~~+)/, false);
  if (fence !== null && typeof fence === 'object') {
    state.fence = fence[1] ?? null;
    stream.skipToEnd();
    return 'monospace';
  }
  if (stream.match(/^#{1,6}(?=\s)/)) {
    stream.skipToEnd();
    return 'heading';
  }
  return stream.match(/^\s*(?:[-*+]|\d{1,9}[.)]|>)(?=\s)/) ? 'processingInstruction' : undefined;
}

function inFence(stream: StringStream, state: State, fence: string): Kind {
  if (stream.sol() && stream.string.trim().startsWith(fence)) state.fence = null;
  stream.skipToEnd();
  return 'monospace';
}

const SPANS: readonly (readonly [RegExp, Kind])[] = [
  [/^\\./, null],
  [/^`[^`]*`/, 'monospace'],
  [/^\*\*(?=\S)[^*]*\*\*/, 'strong'],
  [/^\*(?=[^\s*])[^*]*\*/, 'emphasis'],
  [/^~~[^~]+~~/, 'strikethrough'],
  [/^!?\[[^\]]*\]\([^)]*\)/, 'link'],
  [/^[{}]/, 'invalid'],
];

/** The highlighter's own reading, one line at a time: it never looks further than the line it draws. */
export const lessonLanguage = StreamLanguage.define<State>({
  name: 'lesson',
  startState: () => ({ inTag: false, fence: null }),
  token(stream, state): Kind {
    if (state.fence !== null) return inFence(stream, state, state.fence);
    if (state.inTag) return inTag(stream, state);
    const first = stream.sol() ? atLineStart(stream, state) : undefined;
    if (first !== undefined) return first;
    if (stream.match(/^<\/?[A-Za-z][\w.]*/)) {
      state.inTag = true;
      return 'tagName';
    }
    const span = SPANS.find(([pattern]) => stream.match(pattern));
    if (span !== undefined) return span[1];
    stream.next();
    stream.eatWhile(/[^\\`*~![{}<]/);
    return null;
  },
  blankLine: () => undefined,
  languageData: { closeBrackets: { brackets: ['"', '`'] } },
});

import { CODE_WORDS, type Code } from '#core/craft/reading/code-words.ts';
import type { ReactNode } from 'react';

export interface Finding {
  /** One of the engine's codes; what has none is told by its sentence alone. */
  readonly code?: string | undefined;
  readonly says: ReactNode;
}

const isCode = (code: string | undefined): code is Code => code !== undefined && Object.hasOwn(CODE_WORDS, code);

/** Sentences of problems or warnings; under those of one kind, folded, what that kind means and what to do. */
export function Findings({ found }: { found: readonly Finding[] }) {
  if (found.length === 0) return null;
  const kinds = [...new Set(found.map(({ code }) => code))];
  return (
    <ul className="findings small">
      {kinds.map((kind) => (
        <li key={kind ?? ''}>
          {found.filter(({ code }) => code === kind).map(({ says }, index) => <p key={index}>{says}</p>)}
          <CodeWords code={kind} />
        </li>
      ))}
    </ul>
  );
}

/** What a code means and what to do, to be unfolded beside its sentence. */
export function CodeWords({ code }: { code: string | undefined }) {
  if (!isCode(code)) return null;
  const { title, means, toDo } = CODE_WORDS[code];
  return (
    <details className="code-words">
      <summary>{title}: what this means</summary>
      <p>{means}</p>
      <p><b>What to do:</b> {toDo}</p>
    </details>
  );
}

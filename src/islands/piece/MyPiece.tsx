/**
 * A student's own making beside the pattern: loom, width, ends and yarns, reckoned and drawn as she types. Without script
 * it is a form; the answer is the same, because the same core gives it.
 */
import { useDeferredValue, useEffect, useMemo, useReducer, useRef, useState, type ReactNode } from 'react';
import { judgeMine } from '#core/craft/my-piece/judge-mine.ts';
import type { KeptPiece } from '#core/craft/my-piece/judge-woven.ts';
import { LOOM_NAME, type NamedLoom } from '#core/craft/my-piece/own-loom.ts';
import type { TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import { planWoven } from '#core/craft/frame-loom/plan-woven.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { Button } from '#islands/ui/Button.tsx';
import { LoomChoice } from './LoomChoice.tsx';
import { LoomFields } from './LoomFields.tsx';
import { typedBefore } from '#islands/ui/typed-before.ts';
import { eventOfField, mineAfter } from './mine-after.ts';
import { MineAnswer } from './MineAnswer.tsx';
import { WayFields } from './WayFields.tsx';
import { WovenFields } from './WovenFields.tsx';
import { YarnFields } from './YarnFields.tsx';

export interface MyPieceProps {
  readonly slug: string;
  /** How the piece is spoken of: "Low Tide". */
  readonly name: string;
  /** First name of the teacher. */
  readonly teacher: string;
  readonly pattern: FrameLoomPiece;
  readonly typed: TypedMine;
  /** What was kept last: begun, it can no longer change. */
  readonly kept: KeptPiece;
  /** Counts what was kept; sent back, so that two windows do not undo each other. */
  readonly revision: number;
  /** What the server said of the form as it was sent, by field. */
  readonly errors: Readonly<Record<string, string>>;
  readonly action: string;
  /** Those of her list. */
  readonly looms: readonly NamedLoom[];
  /** How wraps are measured, drawn by the page. */
  readonly guide?: ReactNode;
}

export function MyPiece({ slug, name, teacher, pattern, typed: before, kept, revision, errors, action, looms, guide }: MyPieceProps) {
  const [typed, change] = useReducer(mineAfter, before);
  const [alive, setAlive] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    setAlive(true);
    const found = form.current === null ? [] : typedBefore(form.current);
    for (const [name, text] of found.toSorted(([a], [b]) => Number(a === 'units') - Number(b === 'units'))) change(eventOfField(before, name, text));
  }, []);
  const settled = useDeferredValue(typed);
  const judged = useMemo(() => judgeMine(settled, pattern, kept), [settled, pattern, kept]);
  const planned = useMemo(() => planWoven(pattern, settled.units), [pattern, settled.units]);
  const woven = judged.fitted ?? null;
  const now = judged.ok ? {} : Object.fromEntries(judged.problems.map(({ field, says }) => [field, says]));
  // Whether a name is free only the server knows.
  const nameFault = errors[LOOM_NAME];
  const faults = alive ? { ...(nameFault === undefined ? {} : { [LOOM_NAME]: nameFault }), ...now } : errors;
  return (
    <div className="my-piece">
      <form ref={form} method="post" action={action} className="stack stack-wide" aria-label="My piece" noValidate>
        <input type="hidden" name="series" value={slug} />
        <input type="hidden" name="revision" value={revision} />
        {/* What the enter key presses: the first button of a form, and that must not be one that only fills in a loom. */}
        <button type="submit" hidden>Keep my piece</button>
        <LoomFields {...{ typed, pattern, faults, change, alive }} choice={<LoomChoice {...{ slug, looms, typed, change }} />} />
        <WayFields typed={settled} chosen={typed} {...{ pattern, name, change, faults }} asPattern={planned.ok ? { piece: pattern, plan: planned.value } : null} />
        <YarnFields {...{ typed, pattern, faults, change, alive, guide }} fitted={judged.ok ? judged.fitted : null} />
        <WovenFields {...{ typed, faults, change }} piece={woven?.piece ?? pattern} plan={woven?.plan ?? null} />
        <div className="row">
          <Button type="submit" kind="act">Keep my piece</Button>
          <Button type="submit" kind="quiet" name="asPattern" value="yes">All as in the pattern</Button>
        </div>
      </form>
      {planned.ok && <MineAnswer {...{ name, teacher, judged }} pattern={{ piece: pattern, plan: planned.value }} units={settled.units} />}
    </div>
  );
}

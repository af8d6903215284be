import type { ReactNode } from 'react';
import { actText, type Act } from '#core/craft/piece-form/change-typed.ts';
import { useHands } from './hands.ts';

interface ActButtonProps {
  readonly act: Act;
  /** Id of what the page shall show when it is drawn again without script. */
  readonly to: string;
  readonly className?: string;
  /** Read aloud where there is only a glyph. */
  readonly label?: string;
  /** It cannot be pressed; stays in the row of focus. */
  readonly off?: boolean;
  readonly children: ReactNode;
}

/** A button that moves rows: at once with script; without, it sends the form, which comes back with everything typed. */
export function ActButton({ act, to, className, label, off = false, children }: ActButtonProps) {
  const hands = useHands();
  return (
    <button
      type="submit"
      name="do"
      value={actText(act)}
      formAction={`${hands.action}#${to}`}
      formNoValidate
      className={className}
      aria-label={label}
      title={label}
      aria-disabled={off || undefined}
      onClick={(event) => { event.preventDefault(); if (!off) hands.act(act); }}
    >
      {children}
    </button>
  );
}

/** Only where there is no script: shows the fields that belong to what was chosen. */
export function LookButton({ to, children }: Pick<ActButtonProps, 'to' | 'children'>) {
  const { action } = useHands();
  return <noscript><button type="submit" name="do" value="look" formAction={`${action}#${to}`} className="btn btn-sm">{children}</button></noscript>;
}

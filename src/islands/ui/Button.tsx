import type { ComponentProps, ReactNode } from 'react';
import { useId } from 'react';
import { buttonClass, type ButtonKind } from '#islands/ui/button-class.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import type { GlyphName } from '#islands/ui/glyphs.ts';

interface ButtonProps extends Omit<ComponentProps<'button'>, 'disabled'> {
  kind?: ButtonKind | undefined;
  small?: boolean | undefined;
  wide?: boolean | undefined;
  glyph?: GlyphName | undefined;
  /** The reason why it cannot be pressed now. It stays in the row of focus, so that the reason can be read. */
  off?: string | undefined;
  busy?: boolean | undefined;
  children: ReactNode;
}

/** A button of the house; `type="button"` unless told. While busy or off, presses do nothing. */
export function Button({ kind, small, wide, glyph, off, busy = false, children, className, onClick, ...rest }: ButtonProps) {
  const why = useId();
  const classes = [buttonClass({ kind, small, wide }), className].filter(Boolean).join(' ');
  const idle = off !== undefined || busy;
  const button = (
    <button
      type="button"
      {...rest}
      className={classes}
      aria-busy={busy || undefined}
      aria-disabled={idle || undefined}
      aria-describedby={off === undefined ? rest['aria-describedby'] : why}
      onClick={idle ? (event) => event.preventDefault() : onClick}
    >
      {glyph && <Glyph name={glyph} />}
      {children}
    </button>
  );
  if (off === undefined) return button;
  return (
    <span className="off-row">
      {button}
      <span className="small quiet" id={why}>{off}</span>
    </span>
  );
}

interface IconButtonProps extends Omit<ComponentProps<'button'>, 'children' | 'disabled'> {
  glyph: GlyphName;
  /** Read aloud, and shown when the mouse rests on it. */
  label: string;
  kind?: ButtonKind | undefined;
  small?: boolean | undefined;
  /** Cannot be pressed now; the label should say why. */
  off?: boolean | undefined;
}

/** A glyph alone, 44 × 44. */
export function IconButton({ glyph, label, kind = 'quiet', small, off = false, className, onClick, ...rest }: IconButtonProps) {
  const classes = [buttonClass({ kind, small, icon: true }), className].filter(Boolean).join(' ');
  return (
    <button type="button" {...rest} className={classes} aria-label={label} title={label} aria-disabled={off || undefined} onClick={off ? undefined : onClick}>
      <Glyph name={glyph} />
    </button>
  );
}

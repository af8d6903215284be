// The classes of a button, for pages and islands alike; written out, so that the sheet keeps exactly those in use.

/** `act`: the one act of the screen. `on` and `mend`: verdicts. `warn`: takes something away, outlined. */
export type ButtonKind = 'act' | 'plain' | 'quiet' | 'on' | 'mend' | 'warn';

export interface ButtonLook {
  kind?: ButtonKind | undefined;
  /** 36 px, for the mouse; a finger still gets 44 px. */
  small?: boolean | undefined;
  /** As wide as its place. */
  wide?: boolean | undefined;
  /** 44 × 44 with a glyph and no words. */
  icon?: boolean | undefined;
}

const ofKind = { act: ' btn-act', plain: '', quiet: ' btn-quiet', on: ' btn-on', mend: ' btn-mend full', warn: ' btn-mend' } as const;

export function buttonClass({ kind = 'plain', small = false, wide = false, icon = false }: ButtonLook): string {
  return `btn${ofKind[kind]}${small ? ' btn-sm' : ''}${wide ? ' btn-wide' : ''}${icon ? ' btn-icon' : ''}`;
}

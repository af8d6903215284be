import type { Column, MacramePiece, MacramePlan, Section } from '#core/craft/macrame/piece.ts';
import { planPiece } from '#core/craft/plan.ts';

/** Two folded cords of 3 mm on a rod: four ends, knotted over 90 cm. */
export const BRAID: MacramePiece = {
  craft: 'macrame',
  rod: { kind: 'rod', diameterMm: 20 },
  yarns: { main: { label: 'Cotton cord', colour: '#ddd3bb', diameterMm: 3 } },
  columns: [{ name: 'braid', yarn: 'main', cords: 2, sections: [{ technique: 'square-knots', name: 'knots', heightMm: 900 }] }],
};

export const hangingOf = (sections: readonly Section[], column: Partial<Column> = {}): MacramePiece => ({
  ...BRAID,
  columns: [{ name: 'braid', yarn: 'main', cords: 2, ...column, sections }],
});

export function planOf(piece: MacramePiece): MacramePlan {
  const planned = planPiece(piece);
  if (!planned.ok) throw new Error(JSON.stringify(planned.problems, null, 1));
  return planned.value;
}

/** As `CODE /path`. */
export function refusals(piece: unknown): string[] {
  const planned = planPiece(piece);
  return planned.ok ? [] : planned.problems.map(({ code, path }) => `${code} ${path}`);
}

/** How a table of the handbook is written: its shape, and how its figures are rounded. */

export interface FigureTableData {
  readonly title: string;
  /** The first column names the row. */
  readonly columns: readonly { readonly name: string; readonly unit?: string }[];
  readonly rows: readonly (readonly string[])[];
  /** Where the numbers come from and how far to trust them. */
  readonly reckonedBy: string;
}

export const MM_PER_INCH = 25.4;
const THIN_SPACE = '\u2009';

/** A number with so many decimals, thousands set apart. */
export function figure(value: number, decimals = 0): string {
  const [whole = '', rest] = value.toFixed(decimals).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(?:\d{3})+$)/g, THIN_SPACE) : whole;
  return rest === undefined ? grouped : `${grouped}.${rest}`;
}

/** At most two decimals, and none that say nothing. */
export function size(value: number): string {
  return String(Math.round((value + 1e-9) * 100) / 100);
}

/** To two digits that count: for values that are estimates. */
export function about(value: number): string {
  const step = 10 ** Math.max(0, Math.floor(Math.log10(value)) - 1);
  return figure(Math.round(value / step) * step);
}

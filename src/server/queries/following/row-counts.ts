import { rowsOf, type RowCounts, type Tally } from '#core/following/row-count.ts';
import { RowTally } from '#server/models/index.ts';

/** Rows woven in each band of one seat, all devices together. */
export async function rowCounts(enrolmentId: number): Promise<RowCounts> {
  return summed(await RowTally.findAll({ where: { enrolmentId } }));
}

/** Of several seats, by their ids; a seat that counted nothing is missing. */
export async function rowCountsOf(enrolmentIds: readonly number[]): Promise<ReadonlyMap<number, RowCounts>> {
  const rows = await RowTally.findAll({ where: { enrolmentId: [...enrolmentIds] } });
  return new Map([...new Set(rows.map((row) => row.enrolmentId))].map((id) => [id, summed(rows.filter(({ enrolmentId }) => enrolmentId === id))]));
}

/** The same, one device apart from all others. */
export async function talliesFor(enrolmentId: number, device: string): Promise<{ own: Record<string, Tally>; others: RowCounts }> {
  const rows = await RowTally.findAll({ where: { enrolmentId } });
  const own = rows.filter((row) => row.device === device).map(({ bandKey, counted, version }) => [bandKey, { rows: counted, version }] as const);
  return { own: Object.fromEntries(own), others: added(rows.filter((row) => row.device !== device)) };
}

const byBand = (rows: readonly RowTally[], sum: (counted: readonly number[]) => number): RowCounts =>
  Object.fromEntries([...new Set(rows.map(({ bandKey }) => bandKey))].map((key) => [key, sum(rows.filter(({ bandKey }) => bandKey === key).map(({ counted }) => counted))]));

const summed = (rows: readonly RowTally[]): RowCounts => byBand(rows, rowsOf);

/** May lie below zero: together with the one device it is a count. */
const added = (rows: readonly RowTally[]): RowCounts => byBand(rows, (counted) => counted.reduce((sum, one) => sum + one, 0));

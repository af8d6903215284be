import { QueryTypes } from 'sequelize';
import { rowsOf, type Tally } from '#core/following/row-count.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { RowTally } from '#server/models/index.ts';

/** The device of forms, and of whatever else says a number of rows outright. */
const PAGES = 'pages';

/** Writes what one device counted; an older state of it changes nothing. */
export async function writeTallies(enrolmentId: number, device: string, tallies: Readonly<Record<string, Tally>>, now: Date): Promise<void> {
  const rows = Object.entries(tallies);
  if (rows.length === 0) return;
  // `counted` is set first: it asks for the version that stood before.
  await sequelize.query(
    `INSERT INTO row_tallies (enrolment_id, band_key, device, counted, version, created_at, updated_at) VALUES ${rows.map(() => '(?, ?, ?, ?, ?, ?, ?)').join(', ')}
     ON DUPLICATE KEY UPDATE
       counted = IF(VALUES(version) > version, VALUES(counted), counted),
       updated_at = IF(VALUES(version) > version, VALUES(updated_at), updated_at),
       version = GREATEST(version, VALUES(version))`,
    { replacements: rows.flatMap(([band, { rows: counted, version }]) => [enrolmentId, band, device, counted, version, now, now]), type: QueryTypes.INSERT },
  );
}

/** Makes the rows of a band come to `rows`, whatever devices counted. Needs the seat locked. */
export async function setRows(enrolmentId: number, bandKey: string, rows: number, now: Date): Promise<void> {
  const tallies = await RowTally.findAll({ where: { enrolmentId, bandKey } });
  const own = tallies.find(({ device }) => device === PAGES);
  const others = tallies.filter((one) => one !== own).reduce((sum, { counted }) => sum + counted, 0);
  if (rowsOf(tallies.map(({ counted }) => counted)) === rows) return;
  await writeTallies(enrolmentId, PAGES, { [bandKey]: { rows: rows - others, version: (own?.version ?? 0) + 1 } }, now);
}

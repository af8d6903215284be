/** What was ticked of a seat since a device last knew. */
import { QueryTypes } from 'sequelize';
import type { TickNow } from '#contracts/ticks.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { Tick } from '#server/models/index.ts';

/** How many changes of ticks a seat has seen. A page that is to be ticked asks before it reads the ticks: it may then know more, never less. */
export async function tickRevision(enrolmentId: number): Promise<number> {
  return (await Tick.max<number | null, Tick>('revision', { where: { enrolmentId } })) ?? 0;
}

/** Every tick changed after that revision, as it is now. */
export async function ticksSince(enrolmentId: number, revision: number): Promise<TickNow[]> {
  const rows = await sequelize.query<Omit<TickNow, 'ticked'> & { ticked: number }>(
    'SELECT subject, item_key AS `key`, is_ticked AS ticked, revision FROM ticks WHERE enrolment_id = ? AND revision > ? ORDER BY revision',
    { replacements: [enrolmentId, revision], type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, ticked: row.ticked === 1 }));
}

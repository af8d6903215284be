import { Op, Transaction } from 'sequelize';
import { judgeTick, type ToldTick } from '#core/following/judge-tick.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize } from '#server/errors.ts';
import { Enrolment, GatheringItem, Tick } from '#server/models/index.ts';
import type { SeriesFor } from '#server/queries/series/series-for.ts';

export interface TickToWrite {
  readonly subject: 'gather' | 'step';
  readonly key: string;
  readonly ticked: boolean;
}

/**
 * Writes what was told, but for what another device said later: that stays as it is.
 * @returns the seat's revision after it
 */
export function writeTicks(enrolmentId: number, ticks: readonly TickToWrite[], told: ToldTick): Promise<number> {
  return withTransaction(async () => {
    await Enrolment.findByPk(enrolmentId, { lock: Transaction.LOCK.UPDATE });
    const last = (await Tick.max<number | null, Tick>('revision', { where: { enrolmentId } })) ?? 0;
    const before = await Tick.findAll({ where: { enrolmentId, itemKey: { [Op.in]: ticks.map(({ key }) => key) } } });
    const taken = ticks.filter(({ subject, key }) => judgeTick(before.find((one) => one.subject === subject && one.itemKey === key) ?? null, told) === 'take');
    if (taken.length === 0) return last;
    await Tick.bulkCreate(
      taken.map(({ subject, key, ticked }) => ({ enrolmentId, subject, itemKey: key, isTicked: ticked, changedAt: told.madeAt, revision: last + 1, device: told.device, sequence: told.sequence })),
      { updateOnDuplicate: ['isTicked', 'changedAt', 'revision', 'device', 'sequence'] },
    );
    return last + 1;
  });
}

/** As a form says it that a page without script sends: she saw what stood there. */
export const toldByPage = (now: Date): ToldTick => ({ seen: null, madeAt: now, device: null, sequence: null });

/** Throws NOT_FOUND unless all things stand on lists of this series. */
export async function requireItemsOf(series: SeriesFor, items: readonly string[]): Promise<void> {
  const rows = await GatheringItem.findAll({ where: { publicId: [...items], takenOutAt: null } });
  authorize(rows.length === new Set(items).size && rows.every(({ lessonId }) => series.parts.some(({ id }) => id === lessonId)));
}

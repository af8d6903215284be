import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { authorize } from '#server/errors.ts';
import { GatheringItem } from '#server/models/index.ts';
import type { SeriesFor } from '#server/queries/series/series-for.ts';

export interface TickToWrite {
  readonly subject: 'gather' | 'step';
  readonly key: string;
  readonly ticked: boolean;
}

/** Writes ticks made at `changedAt`; what was changed later by another device stays as it is. */
export async function writeTicks(enrolmentId: number, ticks: readonly TickToWrite[], changedAt: Date): Promise<void> {
  if (ticks.length === 0) return;
  await sequelize.query(
    `INSERT INTO ticks (enrolment_id, subject, item_key, is_ticked, changed_at) VALUES ${ticks.map(() => '(?, ?, ?, ?, ?)').join(', ')}
     ON DUPLICATE KEY UPDATE
       is_ticked = IF(VALUES(changed_at) >= changed_at, VALUES(is_ticked), is_ticked),
       changed_at = GREATEST(changed_at, VALUES(changed_at))`,
    { replacements: ticks.flatMap(({ subject, key, ticked }) => [enrolmentId, subject, key, ticked ? 1 : 0, changedAt]), type: QueryTypes.INSERT },
  );
}

/** Throws NOT_FOUND unless all things stand on lists of this series. */
export async function requireItemsOf(series: SeriesFor, items: readonly string[]): Promise<void> {
  const rows = await GatheringItem.findAll({ where: { publicId: [...items], takenOutAt: null } });
  authorize(rows.length === new Set(items).size && rows.every(({ lessonId }) => series.parts.some(({ id }) => id === lessonId)));
}

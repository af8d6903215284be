import { WeavingTime } from '#server/models/index.ts';

export interface WeavingEntry {
  readonly publicId: string;
  readonly enrolmentId: number;
  /** On her calendar: `2026-12-01`. */
  readonly day: string;
  readonly minutes: number;
}

/** What was written down for these seats, the newest day first. */
export async function weavingTimes(enrolmentIds: readonly number[]): Promise<WeavingEntry[]> {
  const rows = await WeavingTime.findAll({ where: { enrolmentId: [...enrolmentIds] }, order: [['day', 'DESC'], ['id', 'DESC']] });
  return rows.map(({ publicId, enrolmentId, day, minutes }) => ({ publicId, enrolmentId, day, minutes }));
}

/** Parts that are open to people with a seat and not yet on record as such, seat by seat. */
import { QueryTypes } from 'sequelize';
import { openingMoment, standingOf, type OpeningRule } from '#core/timetable/opening.ts';
import { sequelize } from '#server/db/sequelize.ts';

export interface OpenPart {
  readonly lessonId: number;
  readonly publicId: string;
  /** As students count: among the parts they can read. */
  readonly number: number;
  readonly title: string;
  readonly openedAt: Date;
}

interface PartRow { readonly lessonId: number; readonly publicId: string; readonly number: number; readonly title: string; readonly isPreview: number; readonly opens: OpeningRule }
interface CandidateRow extends PartRow { readonly enrolmentId: number; readonly startedAt: Date }
interface WovenRow { readonly enrolmentId: number; readonly publicId: string; readonly at: Date }

// What opens on a date that has not come is left where it lies; the rest is judged by core. A window counts the parts
// anew, because a part that was taken out leaves no number behind.
const CANDIDATES = `
  SELECT e.id AS enrolmentId, e.started_at AS startedAt, p.lessonId, p.publicId, p.number, p.title, p.isPreview, p.opens
    FROM enrolments e
    JOIN (SELECT l.id AS lessonId, l.series_id AS seriesId, l.public_id AS publicId, l.title, l.is_preview AS isPreview, l.opens, l.opens_at AS opensAt,
                 ROW_NUMBER() OVER (PARTITION BY l.series_id ORDER BY l.position, l.id) AS number
            FROM lessons l
           WHERE l.taken_out_at IS NULL AND l.published_version_id IS NOT NULL) p ON p.seriesId = e.series_id
    LEFT JOIN part_openings o ON o.enrolment_id = e.id AND o.lesson_id = p.lessonId
   WHERE e.id IN (:seats) AND e.state = 'active' AND o.lesson_id IS NULL AND (p.opensAt IS NULL OR p.opensAt <= :now OR p.isPreview = 1)
   ORDER BY e.id, p.number`;

const WOVEN_ON = `
  SELECT p.enrolment_id AS enrolmentId, l.public_id AS publicId, MIN(p.verdict_at) AS at
    FROM progress_photos p JOIN lessons l ON l.id = p.lesson_id
   WHERE p.enrolment_id IN (:seats) AND p.verdict = 'weave-on'
   GROUP BY p.enrolment_id, l.public_id`;

const FINISHED = `
  SELECT v.enrolment_id AS enrolmentId, l.public_id AS publicId, v.finished_at AS at
    FROM lesson_visits v JOIN lessons l ON l.id = v.lesson_id
   WHERE v.enrolment_id IN (:seats) AND v.finished_at IS NOT NULL`;

/** Ids of active seats after `afterId`, in order, at most `most`. */
export async function activeSeatsAfter(afterId: number, most: number): Promise<number[]> {
  const rows = await sequelize.query<{ id: number }>(`SELECT id FROM enrolments WHERE state = 'active' AND id > :afterId ORDER BY id LIMIT :most`, { replacements: { afterId, most }, type: QueryTypes.SELECT });
  return rows.map(({ id }) => id);
}

/** By seat, in the order of the parts; a seat without news is left out. */
export async function unmarkedOpenings(seats: readonly number[], now: Date): Promise<Map<number, OpenPart[]>> {
  if (seats.length === 0) return new Map();
  const asked = { replacements: { seats: [...seats], now }, type: QueryTypes.SELECT } as const;
  const [candidates, woven, finished] = await Promise.all([sequelize.query<CandidateRow>(CANDIDATES, asked), sequelize.query<WovenRow>(WOVEN_ON, asked), sequelize.query<WovenRow>(FINISHED, asked)]);
  const open = new Map<number, OpenPart[]>();
  for (const { enrolmentId, startedAt, isPreview, opens, ...part } of candidates) {
    const rule: OpeningRule = isPreview === 1 ? { rule: 'at-once' } : opens;
    const ofSeat = (rows: readonly WovenRow[]): [string, Date][] => rows.filter((row) => row.enrolmentId === enrolmentId).map(({ publicId, at }) => [publicId, at]);
    const [wovenOnAt, doneAt] = [new Map(ofSeat(woven)), new Map([...ofSeat(woven), ...ofSeat(finished)])];
    if (!standingOf(rule, { seatStartedAt: startedAt, wovenOn: new Set(wovenOnAt.keys()), done: new Set(doneAt.keys()), now }).open) continue;
    const openedAt = openingMoment(rule, { seatStartedAt: startedAt, wovenOnAt, doneAt }) ?? now;
    open.set(enrolmentId, [...(open.get(enrolmentId) ?? []), { ...part, openedAt }]);
  }
  return open;
}

/** The gathering lists of a series' parts, with what one student has ticked. */
import { QueryTypes } from 'sequelize';
import type { GatheringLine } from '#core/gathering/merge.ts';
import { sequelize } from '#server/db/sequelize.ts';

interface Row extends Omit<GatheringLine, 'part' | 'ticked'> { lessonId: number; ticked: number }

/**
 * Lines in the order of `parts`, then of their lists. Lists are for everybody: what to gather is known before paying.
 * @param enrolmentId null: nothing is ticked.
 */
export async function gatheringLines(parts: readonly { readonly id: number; readonly number: number }[], enrolmentId: number | null): Promise<GatheringLine[]> {
  if (parts.length === 0) return [];
  const rows = await sequelize.query<Row>(
    `SELECT g.public_id AS publicId, g.lesson_id AS lessonId, g.kind, g.name, g.amount_key AS amountKey, g.amount_text AS amountText,
            g.stand_in AS standIn, g.until_part AS untilPart, g.note, g.look_out AS lookOut, g.get_from AS getFrom, COALESCE(t.is_ticked, 0) AS ticked
       FROM gathering_items g
       LEFT JOIN ticks t ON t.enrolment_id = :enrolmentId AND t.subject = 'gather' AND t.item_key = g.public_id
      WHERE g.lesson_id IN (:lessonIds) AND g.taken_out_at IS NULL
      ORDER BY g.position, g.id`,
    { replacements: { lessonIds: parts.map(({ id }) => id), enrolmentId: enrolmentId ?? 0 }, type: QueryTypes.SELECT },
  );
  return parts.flatMap(({ id, number }) => rows.filter(({ lessonId }) => lessonId === id).map(({ lessonId: _lessonId, ticked, ...line }) => ({ ...line, part: number, ticked: ticked === 1 })));
}

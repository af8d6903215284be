/** A series as its teacher has it on her table: what she sells, its parts with the state of their texts, and what is missing. */
import { QueryTypes } from 'sequelize';
import type { Checkpoint } from '#contracts/lesson.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { Plan } from '#core/craft/crafts.ts';
import { whatIsMissing, type Missing } from '#core/series/missing.ts';
import type { OpeningRule } from '#core/timetable/opening.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { Enrolment, Series, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { seriesInHand } from '#server/queries/series/series-in-hand.ts';

/** How a part's text, with the videos it speaks of, stands to what students read. */
export type TextState = 'empty' | 'never-published' | 'changed' | 'as-published';

export interface DeskPart {
  readonly publicId: string;
  readonly number: number;
  readonly title: string;
  readonly minutes: number;
  readonly isPreview: boolean;
  readonly opens: OpeningRule;
  readonly checkpoint: Checkpoint | null;
  readonly textState: TextState;
  readonly publishedAt: Date | null;
  /** Lines on its gathering list. */
  readonly lineCount: number;
}

export interface TakenOutPart {
  readonly publicId: string;
  readonly title: string;
  /** The number it had. */
  readonly number: number;
  readonly takenOutAt: Date;
}

export interface SeriesDesk {
  readonly slug: string;
  readonly title: string;
  readonly craft: Series['craft'];
  readonly level: Series['level'];
  readonly summary: string;
  readonly story: string;
  readonly techniques: readonly string[];
  readonly priceMinor: number | null;
  readonly currency: string;
  readonly state: Series['state'];
  readonly publishedAt: Date | null;
  readonly revision: number;
  readonly workroom: { readonly name: string; readonly timeZone: string };
  /** People who have a seat. */
  readonly seatCount: number;
  readonly parts: readonly DeskPart[];
  readonly takenOut: readonly TakenOutPart[];
  readonly missing: readonly Missing[];
  /** Null while it is not described, or cannot be woven as it is. */
  readonly planned: { readonly piece: Piece; readonly plan: Plan } | null;
}

interface PartRow {
  publicId: string; position: number; title: string; minutes: number; isPreview: number; opens: OpeningRule; checkpoint: Checkpoint | null;
  isEmpty: number; publishedAt: Date | null; isSame: number | null; takenOutAt: Date | null; lineCount: number; hasNewMedia: number;
}

// Texts are compared where they lie; none of them has to travel for it. BINARY: letters in another case are a change.
const PARTS = `
  SELECT l.public_id AS publicId, l.position, l.title, l.minutes, l.is_preview AS isPreview, l.opens, l.checkpoint,
         TRIM(l.draft_source) = '' AS isEmpty, v.created_at AS publishedAt, BINARY v.source = BINARY l.draft_source AS isSame, l.taken_out_at AS takenOutAt,
         (SELECT COUNT(*) FROM gathering_items g WHERE g.lesson_id = l.id AND g.taken_out_at IS NULL) AS lineCount,
         EXISTS (SELECT 1 FROM series_media m LEFT JOIN media d ON d.id = m.draft_media_id LEFT JOIN media p ON p.id = m.media_id
                  WHERE m.series_id = l.series_id AND (d.state = 'ready' OR p.draft_detail IS NOT NULL)
                    AND JSON_CONTAINS(JSON_EXTRACT(l.draft_reading, '$.media[*].name'), JSON_QUOTE(m.name))) AS hasNewMedia
    FROM lessons l
    LEFT JOIN lesson_versions v ON v.id = l.published_version_id
   WHERE l.series_id = ?
   ORDER BY l.position, l.id`;

/** @returns null when there is no such series, or it is another teacher's. */
export async function seriesDesk(actor: Actor, slug: string): Promise<SeriesDesk | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const [workroom, rows, { inHand, pattern }, seatCount] = await Promise.all([
    Workroom.findByPk(series.workroomId, { rejectOnEmpty: true }),
    sequelize.query<PartRow>(PARTS, { replacements: [series.id], type: QueryTypes.SELECT }),
    seriesInHand(series),
    Enrolment.count({ where: { seriesId: series.id, state: 'active' } }),
  ]);
  const { title, craft, level, summary, story, techniques, priceMinor, currency, state, publishedAt, revision } = series;
  return {
    slug, title, craft, level, summary, story, techniques, priceMinor, currency, state, publishedAt, revision,
    workroom: { name: workroom.name, timeZone: workroom.timeZone },
    seatCount,
    parts: rows.filter(({ takenOutAt }) => takenOutAt === null).map(partOf),
    takenOut: rows.flatMap(({ publicId, title: name, position, takenOutAt }) => (takenOutAt === null ? [] : [{ publicId, title: name, number: position, takenOutAt }])),
    missing: whatIsMissing(inHand),
    planned: pattern?.planned.ok === true ? { piece: pattern.piece, plan: pattern.planned.value } : null,
  };
}

function partOf({ publicId, title, minutes, isPreview, opens, checkpoint, isEmpty, isSame, publishedAt, lineCount, hasNewMedia }: PartRow, index: number): DeskPart {
  const textState: TextState = publishedAt !== null ? (isSame === 1 && hasNewMedia === 0 ? 'as-published' : 'changed') : isEmpty === 1 ? 'empty' : 'never-published';
  return { publicId, number: index + 1, title, minutes, isPreview: isPreview === 1, opens, checkpoint, textState, publishedAt, lineCount };
}

/** Everything on one person's loom: her seats with how far she is in each, and what she paid. Five statements. */
import { QueryTypes } from 'sequelize';
import type { MyPiece } from '#core/craft/fit.ts';
import type { CraftName, Piece } from '#core/craft/crafts.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { PartInHand, Verdict } from '#core/following/progress.ts';
import type { RowCounts } from '#core/following/row-count.ts';
import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import { standingOf, type OpeningRule, type Standing } from '#core/timetable/opening.ts';
import type { Checkpoint } from '#contracts/lesson.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { rowCountsOf } from '#server/queries/following/row-counts.ts';

export interface PartOnLoom extends PartInHand {
  readonly id: number;
  readonly publicId: string;
  readonly minutes: number;
  readonly checkpoint: Checkpoint | null;
  readonly publishedVersionId: number;
  readonly amountKeys: readonly string[];
  /** Of the newest photo: when it was posted, and when it was answered. */
  readonly photoAt: Date | null;
  readonly answeredAt: Date | null;
  readonly noteCount: number;
}

export interface SeatOnLoom {
  readonly enrolmentId: number;
  readonly publicId: string;
  readonly slug: string;
  readonly title: string;
  readonly craft: CraftName;
  readonly teacherName: string;
  readonly answerDays: number;
  readonly startedAt: Date;
  readonly pattern: Piece | null;
  readonly mine: MyPiece;
  /** As she said in *My piece*. */
  readonly woven: WovenSoFar;
  /** Rows she counted at the loom. */
  readonly counts: RowCounts;
  readonly parts: readonly PartOnLoom[];
  /** Parts behind those that are published: still being written. */
  readonly partsToCome: number;
}

export interface PaidOrder {
  readonly publicId: string;
  readonly seriesTitle: string;
  readonly seriesSlug: string;
  /** `review`: paid, but something about it is looked into. */
  readonly state: 'paid' | 'review';
  readonly receiptNumber: number | null;
  readonly amountMinor: number;
  readonly currency: string;
  readonly at: Date;
}

export interface MyLoom {
  /** The one she worked at last comes first. */
  readonly seats: readonly SeatOnLoom[];
  /** Newest first. */
  readonly orders: readonly PaidOrder[];
}

interface SeatRow extends Omit<SeatOnLoom, 'parts' | 'mine' | 'woven' | 'counts'> { readonly seriesId: number; readonly mine: MyPiece | null; readonly woven: WovenSoFar | null }

interface PartRow {
  readonly enrolmentId: number; readonly id: number; readonly publicId: string; readonly title: string; readonly minutes: number;
  readonly opens: OpeningRule; readonly checkpoint: Checkpoint | null; readonly publishedVersionId: number; readonly facts: LessonFacts;
  readonly finishedAt: Date | null; readonly verdict: Verdict | null; readonly photoAt: Date | null; readonly answeredAt: Date | null; readonly noteCount: number; readonly wovenOn: number;
}

const SEATS = `
  SELECT e.id AS enrolmentId, e.public_id AS publicId, e.started_at AS startedAt, s.id AS seriesId, s.slug, s.title, s.craft,
         (SELECT COUNT(*) FROM lessons l WHERE l.series_id = s.id AND l.taken_out_at IS NULL AND l.published_version_id IS NULL
             AND l.position > COALESCE((SELECT MAX(o.position) FROM lessons o WHERE o.series_id = s.id AND o.taken_out_at IS NULL AND o.published_version_id IS NOT NULL), 0)) AS partsToCome,
         u.name AS teacherName, w.answer_days AS answerDays, p.data AS pattern, m.data AS mine, m.woven
    FROM enrolments e
    JOIN series s ON s.id = e.series_id
    JOIN workrooms w ON w.id = s.workroom_id
    JOIN users u ON u.id = w.owner_id
    LEFT JOIN pieces p ON p.series_id = s.id
    LEFT JOIN my_pieces m ON m.enrolment_id = e.id
   WHERE e.user_id = :userId AND e.state = 'active'
   ORDER BY GREATEST(COALESCE((SELECT MAX(t.changed_at) FROM ticks t WHERE t.enrolment_id = e.id), e.started_at), COALESCE((SELECT MAX(r.updated_at) FROM row_tallies r WHERE r.enrolment_id = e.id), e.started_at)) DESC, e.id DESC`;

const PARTS = `
  SELECT e.id AS enrolmentId, l.id, l.public_id AS publicId, l.title, l.minutes, l.opens, l.checkpoint, l.published_version_id AS publishedVersionId, v.facts,
         i.finished_at AS finishedAt, p.verdict, p.created_at AS photoAt, p.verdict_at AS answeredAt,
         (SELECT COUNT(*) FROM photo_notes n WHERE n.photo_id = p.id) AS noteCount,
         EXISTS (SELECT 1 FROM progress_photos o WHERE o.enrolment_id = e.id AND o.lesson_id = l.id AND o.verdict = 'weave-on') AS wovenOn
    FROM enrolments e
    JOIN lessons l ON l.series_id = e.series_id AND l.taken_out_at IS NULL
    JOIN lesson_versions v ON v.id = l.published_version_id
    LEFT JOIN lesson_visits i ON i.lesson_id = l.id AND i.enrolment_id = e.id
    LEFT JOIN progress_photos p ON p.id = (SELECT q.id FROM progress_photos q WHERE q.enrolment_id = e.id AND q.lesson_id = l.id ORDER BY q.created_at DESC, q.id DESC LIMIT 1)
   WHERE e.id IN (:enrolmentIds)
   ORDER BY e.id, l.position, l.id`;

const ORDERS = `
  SELECT o.public_id AS publicId, s.title AS seriesTitle, s.slug AS seriesSlug, o.state, o.receipt_number AS receiptNumber, o.amount_minor AS amountMinor, o.currency,
         COALESCE(o.paid_at, o.created_at) AS \`at\`
    FROM orders o JOIN series s ON s.id = o.series_id
   WHERE o.user_id = :userId AND o.state IN ('paid', 'review')
   ORDER BY \`at\` DESC, o.id DESC`;

export async function myLoom(actor: Actor, now: Date): Promise<MyLoom> {
  const [seats, orders] = await Promise.all([
    sequelize.query<SeatRow>(SEATS, { replacements: { userId: actor.userId }, type: QueryTypes.SELECT }),
    sequelize.query<PaidOrder>(ORDERS, { replacements: { userId: actor.userId }, type: QueryTypes.SELECT }),
  ]);
  if (seats.length === 0) return { seats: [], orders };
  const enrolmentIds = seats.map(({ enrolmentId }) => enrolmentId);
  const [parts, ticks, counts] = await Promise.all([
    sequelize.query<PartRow>(PARTS, { replacements: { enrolmentIds }, type: QueryTypes.SELECT }),
    sequelize.query<{ enrolmentId: number; itemKey: string }>(
      `SELECT enrolment_id AS enrolmentId, item_key AS itemKey FROM ticks WHERE enrolment_id IN (:enrolmentIds) AND subject = 'step' AND is_ticked = 1`,
      { replacements: { enrolmentIds }, type: QueryTypes.SELECT },
    ),
    rowCountsOf(enrolmentIds),
  ]);
  return {
    orders,
    seats: seats.map(({ seriesId: _seriesId, mine, woven, ...seat }) => {
      const own = parts.filter(({ enrolmentId }) => enrolmentId === seat.enrolmentId);
      const keys = ticks.filter(({ enrolmentId }) => enrolmentId === seat.enrolmentId).map(({ itemKey }) => itemKey);
      const wovenOn = new Set(own.filter((part) => part.wovenOn === 1).map(({ publicId }) => publicId));
      const done = new Set(own.filter((part) => part.wovenOn === 1 || part.finishedAt !== null).map(({ publicId }) => publicId));
      return { ...seat, mine: mine ?? {}, woven: woven ?? NOTHING_WOVEN, counts: counts.get(seat.enrolmentId) ?? {}, parts: own.map((part, index) => partOnLoom(part, index + 1, keys, standingOf(part.opens, { seatStartedAt: seat.startedAt, wovenOn, done, now }))) };
    }),
  };
}

function partOnLoom(part: PartRow, number: number, keys: readonly string[], standing: Standing): PartOnLoom {
  const { enrolmentId: _enrolmentId, opens: _opens, wovenOn: _wovenOn, facts, finishedAt, ...row } = part;
  const begins = `${part.publicId}:`;
  return {
    ...row,
    number,
    standing,
    steps: facts.steps.map(({ id }) => id),
    amountKeys: facts.amounts,
    ticked: new Set(keys.filter((key) => key.startsWith(begins)).map((key) => key.slice(begins.length))),
    isFinished: finishedAt !== null,
    asksForPhoto: part.checkpoint !== null,
  };
}

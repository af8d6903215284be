/** The series of one or several workrooms with everybody who has a seat, and where each of them is. Always five statements. */
import { QueryTypes } from 'sequelize';
import { wovenOf } from '#core/craft/cloth-of.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { madeFor } from '#core/craft/made-for.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { countedCloth, type CountedCloth } from '#core/following/counted-cloth.ts';
import type { Verdict } from '#core/following/progress.ts';
import { rowsOf, type RowCounts } from '#core/following/row-count.ts';
import type { Units } from '#core/units/units.ts';
import { classPlace, type PartOfOne } from '#core/workroom/class-place.ts';
import { sequelize } from '#server/db/sequelize.ts';

export interface ClassPart {
  readonly id: number;
  readonly number: number;
  readonly title: string;
  readonly opensAt: Date | null;
  /** Amounts its text speaks of, which tell the bands it weaves. */
  readonly amountKeys: readonly string[];
}

export interface ClassStudent {
  /** Public id. */
  readonly seat: string;
  readonly name: string;
  readonly seriesId: number;
  readonly startedAt: Date;
  readonly source: 'bought' | 'gift' | 'granted';
  /** Place of the part in hand, from 0; undefined when all parts are done. */
  readonly at: number | undefined;
  readonly done: number;
  readonly verdict: Verdict | null;
  readonly lastStepAt: Date;
  /** When she was last nudged from this workroom; null when never. */
  readonly nudgedAt: Date | null;
}

export interface ClassSeries {
  readonly id: number;
  readonly slug: string;
  readonly title: string;
  readonly state: 'draft' | 'published';
  readonly publishedAt: Date | null;
  readonly priceMinor: number | null;
  readonly currency: string;
  readonly workroomId: number;
  readonly piece: Piece | null;
  /** Those students can read; a draft has all it holds. */
  readonly parts: readonly ClassPart[];
  readonly students: readonly ClassStudent[];
}

type SeriesRow = Omit<ClassSeries, 'parts' | 'students'>;
interface PartRow {
  readonly id: number; readonly publicId: string; readonly seriesId: number; readonly title: string; readonly opensAt: Date | null;
  readonly isPublished: number; readonly amountKeys: string[] | null; readonly steps: number | null;
}
interface SeatRow {
  readonly id: number; readonly seat: string; readonly seriesId: number; readonly name: string; readonly startedAt: Date; readonly source: ClassStudent['source'];
  readonly tickedAt: Date | null; readonly shownAt: Date | null; readonly finishedAt: Date | null; readonly countedAt: Date | null; readonly nudgedAt: Date | null;
  readonly units: Units; readonly mine: MyPiece | null; readonly woven: WovenSoFar | null;
}
interface MarkRow { readonly enrolmentId: number; readonly lessonId: number; readonly isFinished: number; readonly verdict: Verdict | null }
/** Steps ticked of a part, by its public id; or rows that one device counted in a band, by the band's key. */
interface CountRow { readonly enrolmentId: number; readonly of: 'steps' | 'rows'; readonly key: string; readonly counted: number }

const SERIES = `
  SELECT s.id, s.slug, s.title, s.state, s.published_at AS publishedAt, s.price_minor AS priceMinor, s.currency, s.workroom_id AS workroomId, p.data AS piece
    FROM series s LEFT JOIN pieces p ON p.series_id = s.id
   WHERE s.workroom_id IN (:workrooms)
   ORDER BY s.state = 'published' DESC, s.published_at DESC, s.id DESC`;

const PARTS = `
  SELECT l.id, l.public_id AS publicId, l.series_id AS seriesId, l.title, l.opens_at AS opensAt, v.id IS NOT NULL AS isPublished,
         JSON_EXTRACT(v.facts, '$.amounts') AS amountKeys, JSON_LENGTH(v.facts, '$.steps') AS steps
    FROM lessons l JOIN series s ON s.id = l.series_id LEFT JOIN lesson_versions v ON v.id = l.published_version_id
   WHERE s.workroom_id IN (:workrooms) AND l.taken_out_at IS NULL
   ORDER BY l.series_id, l.position, l.id`;

const SEATS = `
  SELECT e.id, e.public_id AS seat, e.series_id AS seriesId, u.name, e.started_at AS startedAt, e.source, u.units, m.data AS mine, m.woven,
         (SELECT MAX(t.changed_at) FROM ticks t WHERE t.enrolment_id = e.id) AS tickedAt,
         (SELECT MAX(p.created_at) FROM progress_photos p WHERE p.enrolment_id = e.id) AS shownAt,
         (SELECT MAX(v.finished_at) FROM lesson_visits v WHERE v.enrolment_id = e.id) AS finishedAt,
         (SELECT MAX(r.updated_at) FROM row_tallies r WHERE r.enrolment_id = e.id) AS countedAt,
         (SELECT MAX(n.sent_at) FROM notice_receipts r JOIN notices n ON n.id = r.notice_id WHERE r.user_id = e.user_id AND n.workroom_id = s.workroom_id AND n.kind = 'nudge') AS nudgedAt
    FROM enrolments e JOIN series s ON s.id = e.series_id JOIN users u ON u.id = e.user_id LEFT JOIN my_pieces m ON m.enrolment_id = e.id
   WHERE s.workroom_id IN (:workrooms) AND e.state = 'active'
   ORDER BY e.started_at DESC, e.id DESC`;

/** Parts that were finished or shown, with the verdict on the newest photo. */
const MARKS = `
  SELECT m.enrolmentId, m.lessonId, MAX(m.isFinished) AS isFinished, MAX(m.verdict) AS verdict
    FROM (SELECT v.enrolment_id AS enrolmentId, v.lesson_id AS lessonId, v.finished_at IS NOT NULL AS isFinished, NULL AS verdict FROM lesson_visits v
          UNION ALL
          SELECT p.enrolment_id, p.lesson_id, 0, p.verdict
            FROM progress_photos p
           WHERE NOT EXISTS (SELECT 1 FROM progress_photos n WHERE n.enrolment_id = p.enrolment_id AND n.lesson_id = p.lesson_id AND (n.created_at, n.id) > (p.created_at, p.id))) m
    JOIN enrolments e ON e.id = m.enrolmentId AND e.state = 'active'
    JOIN series s ON s.id = e.series_id
   WHERE s.workroom_id IN (:workrooms)
   GROUP BY m.enrolmentId, m.lessonId`;

/** A step's key begins with the public id of its part. */
const COUNTS = `
  SELECT t.enrolment_id AS enrolmentId, 'steps' AS \`of\`, SUBSTRING_INDEX(t.item_key, ':', 1) AS \`key\`, COUNT(*) AS counted
    FROM ticks t JOIN enrolments e ON e.id = t.enrolment_id AND e.state = 'active' JOIN series s ON s.id = e.series_id
   WHERE s.workroom_id IN (:workrooms) AND t.subject = 'step' AND t.is_ticked = 1
   GROUP BY t.enrolment_id, \`key\`
  UNION ALL
  SELECT r.enrolment_id, 'rows', r.band_key, r.counted
    FROM row_tallies r JOIN enrolments e ON e.id = r.enrolment_id AND e.state = 'active' JOIN series s ON s.id = e.series_id
   WHERE s.workroom_id IN (:workrooms)`;

export async function classOf(workrooms: readonly number[]): Promise<ClassSeries[]> {
  if (workrooms.length === 0) return [];
  const asked = { replacements: { workrooms: [...workrooms] }, type: QueryTypes.SELECT } as const;
  const [series, parts, seats, marks, counts] = await Promise.all([
    sequelize.query<SeriesRow>(SERIES, asked),
    sequelize.query<PartRow>(PARTS, asked),
    sequelize.query<SeatRow>(SEATS, asked),
    sequelize.query<MarkRow>(MARKS, asked),
    sequelize.query<CountRow>(COUNTS, asked),
  ]);
  const markOf = new Map(marks.map((mark) => [`${mark.enrolmentId}:${mark.lessonId}`, mark]));
  const tickedOf = new Map(counts.filter((count) => count.of === 'steps').map(({ enrolmentId, key, counted }) => [`${enrolmentId}:${key}`, counted]));
  const rows = counts.filter((count) => count.of === 'rows');
  return series.map((one) => {
    const own = parts.filter(({ seriesId }) => seriesId === one.id);
    const shown = one.state === 'published' ? own.filter(({ isPublished }) => isPublished === 1) : own;
    const partOf = (seat: SeatRow, part: PartRow): PartOfOne => {
      const mark = markOf.get(`${seat.id}:${part.id}`);
      return { isFinished: mark?.isFinished === 1, verdict: mark?.verdict ?? null, steps: part.steps ?? 0, ticked: tickedOf.get(`${seat.id}:${part.publicId}`) ?? 0 };
    };
    const amountKeys = shown.map((part) => part.amountKeys ?? []);
    return {
      ...one,
      parts: shown.map(({ id, title, opensAt, amountKeys }, index) => ({ id, number: index + 1, title, opensAt, amountKeys: amountKeys ?? [] })),
      students: seats.filter(({ seriesId }) => seriesId === one.id).map((seat) => studentOf(seat, shown.map((part) => partOf(seat, part)), clothOf(seat, one.piece, amountKeys, rowsCountedBy(seat.id, rows)))),
    };
  });
}

function rowsCountedBy(seat: number, rows: readonly CountRow[]): RowCounts {
  const own = rows.filter(({ enrolmentId }) => enrolmentId === seat);
  return Object.fromEntries([...new Set(own.map(({ key }) => key))].map((key) => [key, rowsOf(own.filter((row) => row.key === key).map(({ counted }) => counted))]));
}

/** Null where nothing was counted: only who counts rows has her piece reckoned here. */
function clothOf({ mine, units, woven }: SeatRow, pattern: Piece | null, amountKeys: readonly (readonly string[])[], counts: RowCounts): CountedCloth | null {
  const said = woven ?? NOTHING_WOVEN;
  if (pattern === null || (Object.keys(counts).length === 0 && said.bandsDone === 0 && (said.rows ?? 0) === 0)) return null;
  const made = madeFor(pattern, mine ?? {}, units, said);
  const cloth = made && wovenOf(made.piece, made.plan, '');
  return made && cloth && countedCloth(made, cloth, amountKeys, counts, said);
}

function studentOf({ seat, name, seriesId, startedAt, source, tickedAt, shownAt, finishedAt, countedAt, nudgedAt }: SeatRow, parts: readonly PartOfOne[], cloth: CountedCloth | null): ClassStudent {
  const steps = [startedAt, tickedAt, shownAt, finishedAt, countedAt].filter((moment): moment is Date => moment !== null);
  return { seat, name, seriesId, startedAt, source, ...classPlace(parts, cloth), lastStepAt: new Date(Math.max(...steps.map((moment) => moment.getTime()))), nudgedAt };
}

/**
 * A series as one person meets it: its parts in order, each with what she may do there. Every page about a series,
 * and every endpoint behind one, begins here, so that the rule of who may read what is asked in one way.
 */
import { QueryTypes } from 'sequelize';
import type { CraftName } from '#core/craft/crafts.ts';
import { standingOf, type OpeningRule, type SeatFacts, type Standing } from '#core/timetable/opening.ts';
import type { Checkpoint } from '#contracts/lesson.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { lessonAccess, worksIn, type LessonAccess } from '#server/policies/lesson.ts';

export type Verdict = 'waits' | 'weave-on' | 'mend-first';

export interface PartFor {
  readonly id: number;
  readonly publicId: string;
  /** 1 for the first part. */
  readonly number: number;
  readonly title: string;
  readonly minutes: number;
  readonly isPreview: boolean;
  readonly opens: OpeningRule;
  readonly checkpoint: Checkpoint | null;
  readonly publishedVersionId: number | null;
  readonly access: LessonAccess;
  /** Of the newest photo in the checkpoint's thread; null without one. */
  readonly verdict: Verdict | null;
  readonly finishedAt: Date | null;
}

export interface SeriesFor {
  readonly id: number;
  readonly publicId: string;
  readonly slug: string;
  readonly title: string;
  readonly craft: CraftName;
  readonly level: 'beginner' | 'some-practice' | 'sure-hand';
  readonly summary: string;
  readonly story: string;
  readonly techniques: readonly string[];
  readonly priceMinor: number | null;
  readonly currency: string;
  readonly state: 'draft' | 'published';
  readonly workroom: { readonly id: number; readonly handle: string; readonly name: string; readonly teacherName: string; readonly answerDays: number; readonly timeZone: string };
  readonly seat: { readonly enrolmentId: number; readonly publicId: string; readonly startedAt: Date } | null;
  readonly parts: readonly PartFor[];
  /** Parts behind the last one that can be read: they are still being written. Empty for who looks after the series. */
  readonly toCome: readonly PartToCome[];
}

/** A part that nobody can read yet. */
export interface PartToCome {
  readonly number: number;
  readonly title: string;
  /** Before this moment it does not open, however soon it is written; null where no date says so. */
  readonly notBefore: Date | null;
}

interface SeriesRow extends Omit<SeriesFor, 'workroom' | 'seat' | 'parts' | 'toCome'> {
  workroomId: number; handle: string; workroomName: string; teacherName: string; answerDays: number; timeZone: string;
  enrolmentId: number | null; enrolmentPublicId: string | null; startedAt: Date | null;
}

interface PartRow {
  id: number; publicId: string; title: string; minutes: number; isPreview: number; opens: OpeningRule; opensAt: Date | null; checkpoint: Checkpoint | null;
  publishedVersionId: number | null; verdict: Verdict | null; wovenOn: number; finishedAt: Date | null;
}

const SERIES = `
  SELECT s.id, s.public_id AS publicId, s.slug, s.title, s.craft, s.level, s.summary, s.story, s.techniques, s.price_minor AS priceMinor, s.currency, s.state,
         w.id AS workroomId, w.handle, w.name AS workroomName, u.name AS teacherName, w.answer_days AS answerDays, w.time_zone AS timeZone,
         e.id AS enrolmentId, e.public_id AS enrolmentPublicId, e.started_at AS startedAt
    FROM series s
    JOIN workrooms w ON w.id = s.workroom_id
    JOIN users u ON u.id = w.owner_id
    LEFT JOIN enrolments e ON e.series_id = s.id AND e.user_id = :userId AND e.state = 'active'
   WHERE s.slug = :slug`;

const PARTS = `
  SELECT l.id, l.public_id AS publicId, l.title, l.minutes, l.is_preview AS isPreview, l.opens, l.opens_at AS opensAt, l.checkpoint, l.published_version_id AS publishedVersionId,
         v.finished_at AS finishedAt,
         (SELECT p.verdict FROM progress_photos p WHERE p.enrolment_id = :enrolmentId AND p.lesson_id = l.id ORDER BY p.created_at DESC, p.id DESC LIMIT 1) AS verdict,
         EXISTS (SELECT 1 FROM progress_photos p WHERE p.enrolment_id = :enrolmentId AND p.lesson_id = l.id AND p.verdict = 'weave-on') AS wovenOn
    FROM lessons l
    LEFT JOIN lesson_visits v ON v.lesson_id = l.id AND v.enrolment_id = :enrolmentId
   WHERE l.series_id = :seriesId AND l.taken_out_at IS NULL
   ORDER BY l.position, l.id`;

/** @returns null when there is no such series, or when it must look as if there were none. */
export async function seriesFor(actor: Actor | null, slug: string, now: Date): Promise<SeriesFor | null> {
  const [row] = await sequelize.query<SeriesRow>(SERIES, { replacements: { slug, userId: actor?.userId ?? 0 }, type: QueryTypes.SELECT });
  if (row === undefined) return null;
  const mayLookAfter = worksIn(actor, row.workroomId);
  if (row.state !== 'published' && row.enrolmentId === null && !mayLookAfter) return null;
  const rows = await sequelize.query<PartRow>(PARTS, { replacements: { seriesId: row.id, enrolmentId: row.enrolmentId ?? 0 }, type: QueryTypes.SELECT });
  const visible = mayLookAfter ? rows : rows.filter(({ publishedVersionId }) => publishedVersionId !== null);
  const wovenOn = new Set(rows.filter((part) => part.wovenOn === 1).map(({ publicId }) => publicId));
  const done = new Set(rows.filter((part) => part.wovenOn === 1 || part.finishedAt !== null).map(({ publicId }) => publicId));
  const parts = visible.map((part, index) => partFor(actor, row, part, index + 1, { wovenOn, done, now }));
  const behind = mayLookAfter ? [] : rows.slice(rows.findLastIndex(({ publishedVersionId }) => publishedVersionId !== null) + 1);
  const toCome = behind.map(({ title, opensAt }, index) => ({ number: parts.length + index + 1, title, notBefore: opensAt }));
  return { ...presentRow(row), parts, toCome };
}

function presentRow(row: SeriesRow): Omit<SeriesFor, 'parts' | 'toCome'> {
  const { workroomId, handle, workroomName, teacherName, answerDays, timeZone, enrolmentId, enrolmentPublicId, startedAt, ...series } = row;
  return {
    ...series,
    workroom: { id: workroomId, handle, name: workroomName, teacherName, answerDays, timeZone },
    seat: enrolmentId === null || enrolmentPublicId === null || startedAt === null ? null : { enrolmentId, publicId: enrolmentPublicId, startedAt },
  };
}

function partFor(actor: Actor | null, series: SeriesRow, part: PartRow, number: number, facts: Omit<SeatFacts, 'seatStartedAt'>): PartFor {
  const standing: Standing | null = series.startedAt === null ? null : standingOf(part.opens, { seatStartedAt: series.startedAt, ...facts });
  const access = lessonAccess(actor, {
    workroomId: series.workroomId,
    seriesPublished: series.state === 'published',
    lessonPublished: part.publishedVersionId !== null,
    isPreview: part.isPreview === 1,
    seat: standing === null ? null : { active: true, standing },
  });
  const { wovenOn: _wovenOn, opensAt: _opensAt, isPreview, ...rest } = part;
  return { ...rest, isPreview: isPreview === 1, number, access };
}

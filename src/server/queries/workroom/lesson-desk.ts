/** One part as its teacher writes it: her text, how it was read, its settings, and what it can speak of. */
import { QueryTypes } from 'sequelize';
import type { Checkpoint } from '#contracts/lesson.ts';
import type { SeriesMediaFile } from '#contracts/media.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { LessonText, RefusedText } from '#core/lesson-text/parse-lesson-text.ts';
import { whatIsMissing, type Missing } from '#core/series/missing.ts';
import { partMayGoOut, type PartMayGoOut } from '#core/series/publishing-order.ts';
import type { OpeningRule } from '#core/timetable/opening.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { GatheringItem, Lesson, LessonVersion, Series, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { listsOf, seriesInHand } from '#server/queries/series/series-in-hand.ts';

export interface PartOfSeries {
  readonly id: number;
  readonly publicId: string;
  readonly number: number;
  readonly title: string;
  readonly asksForPhoto: boolean;
  readonly opens: OpeningRule;
}

export interface ListLine {
  readonly publicId: string;
  readonly kind: 'tool' | 'yarn' | 'material';
  readonly name: string;
  readonly amountKey: string | null;
  readonly amountText: string | null;
  readonly standIn: string | null;
  readonly untilPart: number | null;
  readonly note: string | null;
  readonly lookOut: string | null;
  readonly getFrom: string | null;
}

export interface SeatChoice {
  /** Public id of the seat. */
  readonly seat: string;
  readonly studentName: string;
}

export interface LessonDesk {
  readonly series: { readonly id: number; readonly slug: string; readonly title: string; readonly state: Series['state']; readonly workroomName: string; readonly timeZone: string };
  /** All parts that are in, in their order. */
  readonly parts: readonly PartOfSeries[];
  /** Its place in that order; null for a part that was taken out. */
  readonly number: number | null;
  readonly publicId: string;
  readonly title: string;
  readonly minutes: number;
  readonly isPreview: boolean;
  readonly opens: OpeningRule;
  readonly checkpoint: Checkpoint | null;
  readonly draft: { readonly source: string; readonly revision: number; readonly reading: LessonText | RefusedText };
  /** What students read; null before it was published. */
  readonly published: { readonly number: number; readonly at: Date; readonly source: string } | null;
  /** What it lacks before it can be published, and what is worth a look. */
  readonly missing: readonly Missing[];
  /** Whether its draft may go out by itself; null for a part that was taken out. */
  readonly mayGoOut: PartMayGoOut | null;
  /** Its gathering list, in order. */
  readonly list: readonly ListLine[];
  /** Lines taken off it, newest first. */
  readonly linesOut: readonly { readonly publicId: string; readonly name: string; readonly takenOutAt: Date }[];
  readonly pattern: Piece | null;
  readonly media: readonly SeriesMediaFile[];
  /** People inside, by name; the first hundred. */
  readonly seats: readonly SeatChoice[];
}

const SEATS = `
  SELECT e.public_id AS seat, u.name AS studentName
    FROM enrolments e JOIN users u ON u.id = e.user_id
   WHERE e.series_id = ? AND e.state = 'active'
   ORDER BY u.name, e.id LIMIT 100`;

/** @returns null when there is no such part in a series of the asker. */
export async function lessonDesk(actor: Actor, slug: string, publicId: string): Promise<LessonDesk | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const { inHand, drafts, pattern, media } = await seriesInHand(series);
  const at = drafts.findIndex((draft) => draft.lesson.publicId === publicId);
  const lesson = drafts[at]?.lesson ?? (await Lesson.findOne({ where: { publicId, seriesId: series.id } }));
  if (lesson === null) return null;
  const [workroom, version, { list, linesOut }, seats] = await Promise.all([
    Workroom.findByPk(series.workroomId, { rejectOnEmpty: true }),
    lesson.publishedVersionId === null ? null : LessonVersion.findByPk(lesson.publishedVersionId, { attributes: ['number', 'source', 'createdAt'] }),
    drafts[at] ?? GatheringItem.findAll({ where: { lessonId: lesson.id }, order: ['position', 'id'] }).then(listsOf),
    sequelize.query<SeatChoice>(SEATS, { replacements: [series.id], type: QueryTypes.SELECT }),
  ]);
  const parts = drafts.map(({ lesson: part }, index) => ({ id: part.id, publicId: part.publicId, number: index + 1, title: part.title, asksForPhoto: part.checkpoint !== null, opens: part.opens }));
  const missing = whatIsMissing(inHand);
  const number = at === -1 ? null : at + 1;
  const { title, minutes, isPreview, opens, checkpoint, draftSource, draftRevision, draftReading } = lesson;
  return {
    series: { id: series.id, slug, title: series.title, state: series.state, workroomName: workroom.name, timeZone: workroom.timeZone },
    parts,
    number,
    missing: missing.filter(({ part }) => part === number && part !== null),
    mayGoOut: number === null ? null : partMayGoOut(number, drafts.map((draft, index) => ({ number: index + 1, isPublished: draft.lesson.publishedVersionId !== null })), missing),
    publicId, title, minutes, isPreview, opens, checkpoint,
    draft: { source: draftSource, revision: draftRevision, reading: draftReading },
    published: version === null ? null : { number: version.number, at: version.createdAt, source: version.source },
    list: list.map(shownLine),
    linesOut: linesOut.flatMap(({ publicId: line, name, takenOutAt }) => (takenOutAt === null ? [] : [{ publicId: line, name, takenOutAt }])).toSorted((a, b) => b.takenOutAt.getTime() - a.takenOutAt.getTime()),
    pattern: pattern?.piece ?? null,
    media,
    seats,
  };
}

function shownLine({ publicId, kind, name, amountKey, amountText, standIn, untilPart, note, lookOut, getFrom }: GatheringItem): ListLine {
  return { publicId, kind, name, amountKey, amountText, standIn, untilPart, note, lookOut, getFrom };
}

/** What finishers say of a series, as one person meets it. */
import { hasFinished } from '#core/following/progress.ts';
import type { Actor } from '#server/context.ts';
import { Review } from '#server/models/index.ts';
import { mayReview } from '#server/policies/review.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import type { SeriesFor } from '#server/queries/series/series-for.ts';

export interface ReviewShown {
  readonly publicId: string;
  readonly name: string;
  readonly words: string;
  readonly wouldMakeAgain: boolean;
  readonly writtenAt: Date;
  /** Of the teacher; empty without one. */
  readonly answer: string;
}

export interface SeriesReviews {
  /** The newest first, hidden ones left out. */
  readonly shown: readonly ReviewShown[];
  readonly total: number;
  readonly againCount: number;
  /** Her own, shown or hidden; `hiddenWhy` is empty while it is shown. */
  readonly mine: { readonly words: string; readonly name: string; readonly wouldMakeAgain: boolean; readonly hiddenWhy: string } | null;
  readonly mayWrite: boolean;
  readonly mayAnswer: boolean;
}

/** Every part of the series, read for the person who has the seat, is done. */
export function finishedBy({ seat, parts, toCome }: SeriesFor): boolean {
  return seat !== null && hasFinished(parts.map(({ finishedAt, verdict }) => ({ isFinished: finishedAt !== null, verdict })), toCome.length);
}

const MOST_SHOWN = 50;

export async function reviewsOf(actor: Actor | null, series: SeriesFor): Promise<SeriesReviews> {
  const visible = { seriesId: series.id, hiddenAt: null };
  const [rows, total, againCount, mine] = await Promise.all([
    Review.findAll({ where: visible, order: [['createdAt', 'DESC'], ['id', 'DESC']], limit: MOST_SHOWN }),
    Review.count({ where: visible }),
    Review.count({ where: { ...visible, wouldMakeAgain: true } }),
    series.seat === null ? null : Review.findOne({ where: { enrolmentId: series.seat.enrolmentId } }),
  ]);
  return {
    shown: rows.map(({ publicId, shownName, words, wouldMakeAgain, createdAt, answer }) => ({ publicId, name: shownName, words, wouldMakeAgain, writtenAt: createdAt, answer })),
    total,
    againCount,
    mine: mine === null ? null : { words: mine.words, name: mine.shownName, wouldMakeAgain: mine.wouldMakeAgain, hiddenWhy: mine.hiddenAt === null ? '' : mine.hiddenWhy },
    mayWrite: mayReview(actor, { workroomId: series.workroom.id, hasFinished: finishedBy(series) }),
    mayAnswer: mayTeachIn(actor, series.workroom.id),
  };
}

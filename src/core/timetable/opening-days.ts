/**
 * The days on which the parts of a series open to one seat, real or imagined: what a student's calendar shows, and what
 * a teacher sees who asks what somebody meets that starts on a day of her choice.
 */
import { awaitedPart, openingMoment, type OpeningRule } from '#core/timetable/opening.ts';

const DAY_MS = 86_400_000;

export interface PartToOpen {
  readonly publicId: string;
  readonly number: number;
  readonly title: string;
  readonly opens: OpeningRule;
  readonly isPreview: boolean;
  readonly asksForPhoto: boolean;
}

export type OpeningDay = PartToOpen & (
  /** Open from the first minute of the seat, or to everybody. */
  | { readonly when: 'from-the-start' }
  | { readonly when: 'at'; readonly at: Date }
  /**
   * When the photo of part `after` has the verdict *weave on*. `earliest`: if the photo is shown on the day that part
   * opens, and answered in the time the teacher promises; null where nobody can say.
   */
  | { readonly when: 'verdict'; readonly after: number | null; readonly earliest: Date | null }
  /** When part `after` is done. `earliest`: if that is the day on which it opens, with the answer to its photo where it asks for one. */
  | { readonly when: 'part'; readonly after: number | null; readonly earliest: Date | null }
);

export interface SeatInTime {
  readonly seatStartedAt: Date;
  /** By public id of a lesson, when its photo had the verdict *weave on*. */
  readonly wovenOnAt: ReadonlyMap<string, Date>;
  /** By public id of a lesson, when it was done. */
  readonly doneAt: ReadonlyMap<string, Date>;
  /** Days in which the teacher promises an answer. */
  readonly answerDays: number;
  /** A photo not shown yet is shown no earlier. */
  readonly now: Date;
}

/** In the order of `parts`, which are the parts that are in, in theirs. */
export function openingDays(parts: readonly PartToOpen[], seat: SeatInTime): OpeningDay[] {
  const days: OpeningDay[] = [];
  for (const part of parts) days.push(dayOf(part, days, seat));
  return days;
}

function dayOf(part: PartToOpen, earlier: readonly OpeningDay[], seat: SeatInTime): OpeningDay {
  if (part.isPreview) return { ...part, when: 'from-the-start' };
  const at = openingMoment(part.opens, seat);
  if (at !== null) return at <= seat.seatStartedAt ? { ...part, when: 'from-the-start' } : { ...part, when: 'at', at };
  // Only an earlier part can be waited for; of another nobody can say when.
  const awaited = earlier.find(({ publicId }) => publicId === awaitedPart(part.opens));
  const shown = awaited === undefined ? null : earliestOf(awaited, seat);
  const when = part.opens.rule === 'after-part' ? 'part' : 'verdict';
  const answer = when === 'verdict' || awaited?.asksForPhoto === true ? seat.answerDays * DAY_MS : 0;
  const earliest = shown === null ? null : new Date(Math.max(shown.getTime(), seat.now.getTime()) + answer);
  return { ...part, when, after: awaited?.number ?? null, earliest };
}

/** The first moment at which a part can be open; null where nobody can say. */
export function earliestOf(day: OpeningDay, { seatStartedAt }: Pick<SeatInTime, 'seatStartedAt'>): Date | null {
  if (day.when === 'at') return day.at;
  return day.when === 'from-the-start' ? seatStartedAt : day.earliest;
}

/**
 * When a part opens for one student. A teacher chooses one of five rules for each part; the answer depends only on
 * when the seat started, what was said of the student's photos, which parts are done, and the time now.
 */
import { DateTime, IANAZone } from 'luxon';

export type OpeningRule =
  | { readonly rule: 'at-once' }
  /** `wall` is the teacher's own clock, `YYYY-MM-DDTHH:mm`, in the IANA zone `zone`. */
  | { readonly rule: 'on-date'; readonly wall: string; readonly zone: string }
  | { readonly rule: 'after-seat'; readonly days: number }
  /** `lesson` is the public id of an earlier part with a checkpoint. */
  | { readonly rule: 'after-verdict'; readonly lesson: string }
  /** `lesson` is the public id of an earlier part; it is done when the student says so, or by its verdict. */
  | { readonly rule: 'after-part'; readonly lesson: string };

export interface SeatFacts {
  readonly seatStartedAt: Date;
  /** Public ids of the lessons whose checkpoint has the verdict *weave on*. */
  readonly wovenOn: ReadonlySet<string>;
  /** Public ids of the lessons that are done, by the student's word or by their verdict. */
  readonly done: ReadonlySet<string>;
  readonly now: Date;
}

export type Standing =
  | { readonly open: true }
  | { readonly open: false; readonly until: 'date'; readonly opensAt: Date }
  | { readonly open: false; readonly until: 'verdict' | 'part'; readonly lesson: string };

const MINUTE_MS = 60_000;
const DAY_MS = 86_400_000;

/**
 * The instant of a wall-clock time in a zone. A time that a change of clocks skips counts as the next minute there is,
 * one that comes twice as the first of the two.
 * @returns null when the wall time or the zone is not one.
 */
export function instantOfWall(wall: string, zone: string): Date | null {
  if (!/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/.test(wall) || !IANAZone.isValidZone(zone)) return null;
  const asIfUtc = DateTime.fromISO(wall, { zone: 'UTC' });
  if (!asIfUtc.isValid) return null;
  const clock = IANAZone.create(zone);
  const at = asIfUtc.toMillis();
  // The offsets a day before and a day after are the only ones the wall time can have been meant in.
  const meant = [at - DAY_MS, at + DAY_MS].map((around) => ({ offset: clock.offset(around), instant: at - clock.offset(around) * MINUTE_MS }));
  const real = meant.filter(({ offset, instant }) => clock.offset(instant) === offset).map(({ instant }) => instant);
  const instants = meant.map(({ instant }) => instant);
  return new Date(real.length > 0 ? Math.min(...real) : changeBetween(clock, Math.min(...instants), Math.max(...instants)));
}

/** The minute at which the offset of `clock` changes between two instants that have different offsets. */
function changeBetween(clock: IANAZone, from: number, to: number): number {
  let [before, after] = [from, to];
  while (after - before > MINUTE_MS) {
    const middle = before + Math.floor((after - before) / 2 / MINUTE_MS) * MINUTE_MS;
    if (clock.offset(middle) === clock.offset(before)) before = middle;
    else after = middle;
  }
  return after;
}

/**
 * The moment at which a part with `rule` opens to one seat; null while it waits for a verdict or for another part. `wovenOnAt`
 * tells by public id of a lesson when its checkpoint had the verdict *weave on*, `doneAt` when it was done. A date that is none counts as open from the start.
 */
export function openingMoment(rule: OpeningRule, seat: { readonly seatStartedAt: Date; readonly wovenOnAt: ReadonlyMap<string, Date>; readonly doneAt: ReadonlyMap<string, Date> }): Date | null {
  switch (rule.rule) {
    case 'at-once':
      return seat.seatStartedAt;
    case 'on-date':
      return instantOfWall(rule.wall, rule.zone) ?? seat.seatStartedAt;
    case 'after-seat':
      return new Date(seat.seatStartedAt.getTime() + rule.days * DAY_MS);
    case 'after-verdict':
      return seat.wovenOnAt.get(rule.lesson) ?? null;
    case 'after-part':
      return seat.doneAt.get(rule.lesson) ?? null;
  }
}

/** Whether a part with `rule` is open to the student of `facts`, and if not, what it waits for. */
export function standingOf(rule: OpeningRule, { seatStartedAt, wovenOn, done, now }: SeatFacts): Standing {
  if (rule.rule === 'after-verdict') return wovenOn.has(rule.lesson) ? { open: true } : { open: false, until: 'verdict', lesson: rule.lesson };
  if (rule.rule === 'after-part') return done.has(rule.lesson) ? { open: true } : { open: false, until: 'part', lesson: rule.lesson };
  const opensAt = openingMoment(rule, { seatStartedAt, wovenOnAt: new Map(), doneAt: new Map() });
  return opensAt === null || rule.rule === 'at-once' || opensAt <= now ? { open: true } : { open: false, until: 'date', opensAt };
}

/** The part that a rule waits for; undefined for one that goes by the clock. */
export function awaitedPart(rule: OpeningRule): string | undefined {
  return rule.rule === 'after-verdict' || rule.rule === 'after-part' ? rule.lesson : undefined;
}

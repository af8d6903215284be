/**
 * When a part opens for one student. A teacher chooses one of four rules for each part; the answer depends only on
 * when the seat started, what was said of the student's photos, and the time now.
 */
import { DateTime, IANAZone } from 'luxon';

export type OpeningRule =
  | { readonly rule: 'at-once' }
  /** `wall` is the teacher's own clock, `YYYY-MM-DDTHH:mm`, in the IANA zone `zone`. */
  | { readonly rule: 'on-date'; readonly wall: string; readonly zone: string }
  | { readonly rule: 'after-seat'; readonly days: number }
  /** `lesson` is the public id of an earlier part with a checkpoint. */
  | { readonly rule: 'after-verdict'; readonly lesson: string };

export interface SeatFacts {
  readonly seatStartedAt: Date;
  /** Public ids of the lessons whose checkpoint has the verdict *weave on*. */
  readonly wovenOn: ReadonlySet<string>;
  readonly now: Date;
}

export type Standing =
  | { readonly open: true }
  | { readonly open: false; readonly until: 'date'; readonly opensAt: Date }
  | { readonly open: false; readonly until: 'verdict'; readonly lesson: string };

const DAY_MS = 86_400_000;

/**
 * The instant of a wall-clock time in a zone. A time that a change of clocks skips counts as the next valid minute,
 * one that comes twice as the first of the two.
 * @returns null when the wall time or the zone is not one.
 */
export function instantOfWall(wall: string, zone: string): Date | null {
  if (!/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/.test(wall) || !IANAZone.isValidZone(zone)) return null;
  const asked = DateTime.fromISO(wall, { zone });
  if (!asked.isValid) return null;
  if (asked.toFormat("yyyy-MM-dd'T'HH:mm") !== wall) {
    // The clock jumped over the asked time: the first minute that exists is the jump itself.
    const before = DateTime.fromISO(wall, { zone: 'UTC' }).minus({ minutes: asked.minus({ hours: 3 }).offset }).toUTC();
    const jump = firstOffsetChange(before.minus({ hours: 3 }), zone);
    return jump ?? asked.toJSDate();
  }
  const earlier = asked.minus({ hours: 1 });
  return earlier.toFormat("yyyy-MM-dd'T'HH:mm") === wall ? earlier.toJSDate() : asked.toJSDate();
}

/** The first instant after `from`, within six hours, at which the zone's offset differs; by bisection to the minute. */
function firstOffsetChange(from: DateTime, zone: string): Date | null {
  const offsetAt = (minutes: number): number => from.plus({ minutes }).setZone(zone).offset;
  let low = 0;
  let high = 360;
  if (offsetAt(low) === offsetAt(high)) return null;
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (offsetAt(middle) === offsetAt(low)) low = middle;
    else high = middle;
  }
  return from.plus({ minutes: high }).toJSDate();
}

/** Whether a part with `rule` is open to the student of `facts`, and if not, what it waits for. */
export function standingOf(rule: OpeningRule, facts: SeatFacts): Standing {
  switch (rule.rule) {
    case 'at-once':
      return { open: true };
    case 'on-date': {
      const opensAt = instantOfWall(rule.wall, rule.zone);
      return opensAt === null || opensAt <= facts.now ? { open: true } : { open: false, until: 'date', opensAt };
    }
    case 'after-seat': {
      const opensAt = new Date(facts.seatStartedAt.getTime() + rule.days * DAY_MS);
      return opensAt <= facts.now ? { open: true } : { open: false, until: 'date', opensAt };
    }
    case 'after-verdict':
      return facts.wovenOn.has(rule.lesson) ? { open: true } : { open: false, until: 'verdict', lesson: rule.lesson };
  }
}

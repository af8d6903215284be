/** When the one letter of a day goes out. */
import { DateTime, IANAZone } from 'luxon';
import { instantOfWall } from './opening.ts';

export interface Morning {
  /** `YYYY-MM-DD` on her calendar. */
  readonly day: string;
  readonly at: Date;
}

/** The first seven in the morning after `now` by the clocks of `zone`; by UTC where the zone is not one. */
export function nextMorning(now: Date, zone: string): Morning {
  const clock = IANAZone.isValidZone(zone) ? zone : 'UTC';
  const today = DateTime.fromJSDate(now, { zone: clock });
  const mornings = [0, 1].map((days) => {
    const day = today.plus({ days }).toFormat('yyyy-MM-dd');
    return { day, at: instantOfWall(`${day}T07:00`, clock) ?? now };
  });
  const [first, second] = mornings as [Morning, Morning];
  return first.at > now ? first : second;
}

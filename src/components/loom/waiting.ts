// What waits for whom: photos with a teacher, notes for the student, parts that open on a day.
import type { FlagKind } from '#islands/ui/flag-kinds.ts';
import { firstName } from '#core/following/opening-words.ts';
import { dayWords } from '#core/moment-words.ts';
import { titleHalves } from '#core/series/title.ts';
import type { MyLoom, SeatOnLoom } from '#server/queries/loom/my-loom.ts';

export interface Waiting {
  readonly kind: FlagKind;
  readonly flag: string;
  readonly words: string;
  readonly link: { readonly label: string; readonly href: string };
}

/** What the student can do something about comes first. */
export function whatWaits({ seats, orders }: MyLoom, timeZone: string): Waiting[] {
  const all = seats.flatMap((seat) => [...photosOf(seat, timeZone), ...daysOf(seat, timeZone)]);
  const looked = orders.filter(({ state }) => state === 'review').map((order): Waiting => ({
    kind: 'held',
    flag: 'Looked into',
    words: `Your payment for ${order.seriesTitle}. Nothing is lost: somebody looks at it and writes to you.`,
    link: { label: 'Read', href: '#orders' },
  }));
  const order: readonly FlagKind[] = ['mend', 'held', 'waits', 'opens'];
  return [...looked, ...all].sort((a, b) => order.indexOf(a.kind) - order.indexOf(b.kind));
}

function photosOf(seat: SeatOnLoom, timeZone: string): Waiting[] {
  const { name } = titleHalves(seat.title);
  const teacher = firstName(seat.teacherName);
  return seat.parts.flatMap((part): Waiting[] => {
    const href = `/series/${seat.slug}/${part.number}#checkpoint`;
    if (part.verdict === 'waits') return [{ kind: 'waits', flag: `Waits for ${teacher}`, words: `${name}, your photo of Part ${part.number}${part.photoAt === null ? '' : `, sent ${dayWords(part.photoAt, timeZone)}`}.`, link: { label: 'See it', href } }];
    if (part.verdict === 'mend-first') return [{ kind: 'mend', flag: 'Waits for you', words: `${name}, Part ${part.number}: mend first${part.answeredAt === null ? '' : `, answered ${dayWords(part.answeredAt, timeZone)}`}.`, link: { label: 'Read', href } }];
    return [];
  });
}

/** The next part that opens by the calendar. */
function daysOf(seat: SeatOnLoom, timeZone: string): Waiting[] {
  const { name } = titleHalves(seat.title);
  const next = seat.parts.find(({ standing }) => !standing.open && standing.until === 'date');
  if (next === undefined || next.standing.open || next.standing.until !== 'date') return [];
  return [{ kind: 'opens', flag: `Opens ${dayWords(next.standing.opensAt, timeZone)}`, words: `${name}, Part ${next.number}, ${next.title}.`, link: { label: 'Gather', href: `/series/${seat.slug}/gather?part=${next.number}` } }];
}

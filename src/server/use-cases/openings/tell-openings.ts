import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found } from '#server/errors.ts';
import { postLetter, type LetterTo } from '#server/mail/outbox.ts';
import { Enrolment, PartOpening, Series, User, Workroom } from '#server/models/index.ts';
import { putUpLetter } from '#server/notices/put-up.ts';
import { activeSeatsAfter, unmarkedOpenings, type OpenPart } from '#server/queries/openings/unmarked-openings.ts';

const SEATS_AT_ONCE = 200;

/**
 * Writes to everybody with a seat for whom a part has opened: once for each part and seat, however many workers ask and
 * whatever dies in between, since the letter and the record of it are written together. Parts that were open when the
 * seat began are news to nobody; what a verdict opened, its own letter said.
 */
export async function tellOpenings(ctx: Context): Promise<void> {
  for (let seats = await activeSeatsAfter(0, SEATS_AT_ONCE); seats.length > 0; seats = await activeSeatsAfter(seats.at(-1) ?? 0, SEATS_AT_ONCE)) {
    const news = await unmarkedOpenings(seats, ctx.clock.now());
    for (const seat of news.keys()) await tellOne(ctx, seat);
  }
}

async function tellOne(ctx: Context, enrolmentId: number): Promise<void> {
  await withTransaction(async () => {
    const now = ctx.clock.now();
    const seat = found(await Enrolment.findByPk(enrolmentId, { lock: true }));
    // Asked again under the lock: another worker may have told her meanwhile.
    const open = (await unmarkedOpenings([seat.id], now)).get(seat.id) ?? [];
    const isFirstLook = seat.openingsBegunAt === null;
    const news = open.filter(({ openedAt }) => !isFirstLook || openedAt > seat.startedAt);
    await PartOpening.bulkCreate(open.map((part) => ({ enrolmentId: seat.id, lessonId: part.lessonId, toldBy: news.includes(part) ? 'letter' : 'seat', openedAt: part.openedAt })));
    if (isFirstLook) await seat.update({ openingsBegunAt: now });
    await writeLetter(seat, news);
  });
}

/** One letter for all that opened together, and the same in her page. */
async function writeLetter(seat: Enrolment, parts: readonly OpenPart[]): Promise<void> {
  const [first] = parts;
  const student = found(await User.findByPk(seat.userId));
  if (first === undefined || student.suspendedAt !== null) return;
  const series = found(await Series.findByPk(seat.seriesId));
  const workroom = found(await Workroom.findByPk(series.workroomId));
  const letter: LetterTo<'parts-opened'> = {
    template: 'parts-opened',
    dedupeKey: `opened:${seat.publicId}:${first.publicId}`,
    to: { userId: student.id, name: student.name, address: student.email },
    data: {
      seriesTitle: series.title,
      seriesSlug: series.slug,
      workroomName: workroom.name,
      parts: parts.map(({ number, title }) => ({ number, title })),
    },
  };
  await postLetter(letter);
  await putUpLetter(letter, { kind: 'opening', seriesId: series.id });
}

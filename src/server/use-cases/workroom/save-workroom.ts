import { DateTime } from 'luxon';
import type { WorkroomInput } from '#contracts/workroom.ts';
import { instantOfWall, type OpeningRule } from '#core/timetable/opening.ts';
import { audit } from '#server/audit.ts';
import type { Clock, Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found, signedIn } from '#server/errors.ts';
import { Lesson, Series, Workroom } from '#server/models/index.ts';
import { requireOpenable } from './_require-openable.ts';

/**
 * Keeps name and time zone of the asker's workroom; its address stays. Dates at which parts open go on to be written in
 * the workroom's zone: those to come keep their moment or their clock as she chose, those past keep their moment.
 * @throws FORBIDDEN without a workroom; CONFLICT when parts of an open series would come out of their order.
 */
export async function saveWorkroom(ctx: Context, { name, timeZone, dates }: WorkroomInput): Promise<void> {
  const { workroomId } = signedIn(ctx);
  authorize(workroomId !== null, 'FORBIDDEN');
  await withTransaction(async () => {
    const workroom = found(await Workroom.findByPk(workroomId, { lock: true }));
    const before = { name: workroom.name, timeZone: workroom.timeZone };
    await workroom.update({ name, timeZone });
    const moved = before.timeZone === timeZone ? 0 : await writeAnew(workroomId, timeZone, dates, ctx.clock);
    await audit(ctx, 'workroom-changed', { kind: 'workroom', id: workroom.publicId }, { before, after: { name, timeZone }, moved });
  });
}

/** @returns how many parts open at another moment now. */
async function writeAnew(workroomId: number, zone: string, dates: WorkroomInput['dates'], clock: Clock): Promise<number> {
  let moved = 0;
  for (const series of await Series.findAll({ where: { workroomId }, order: ['id'], lock: true })) {
    for (const lesson of await Lesson.findAll({ where: { seriesId: series.id } })) {
      const { opens, opensAt } = lesson;
      if (opens.rule !== 'on-date' || opensAt === null) continue;
      const at = dates === 'clock' && opensAt > clock.now() ? instantOfWall(opens.wall, zone) : null;
      const changed: OpeningRule = { ...opens, zone, wall: at === null ? wallOf(opensAt, zone) : opens.wall };
      const isMoved = at !== null && at.getTime() !== opensAt.getTime();
      await lesson.update({ opens: changed, opensAt: at ?? opensAt, timetableRevision: lesson.timetableRevision + (isMoved ? 1 : 0) });
      moved += isMoved ? 1 : 0;
    }
    await requireOpenable(series);
  }
  return moved;
}

function wallOf(moment: Date, zone: string): string {
  return DateTime.fromJSDate(moment, { zone }).toFormat("yyyy-MM-dd'T'HH:mm");
}

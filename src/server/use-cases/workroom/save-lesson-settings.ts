import { isDeepStrictEqual } from 'node:util';
import type { LessonSettingsInput } from '#contracts/workroom.ts';
import type { Checkpoint } from '#contracts/lesson.ts';
import { awaitedPart, instantOfWall, type OpeningRule } from '#core/timetable/opening.ts';
import type { Context } from '#server/context.ts';
import { fieldError, found } from '#server/errors.ts';
import { Lesson, Workroom } from '#server/models/index.ts';
import { placeOf, type PartPlace } from './_part-place.ts';
import { requireOpenable } from './_require-openable.ts';
import { ownLesson, withSeriesLocked } from './_own-series.ts';

/**
 * Keeps a part's title, length, timetable and checkpoint. They hold at once, for those inside too.
 * @throws VALIDATION at the field that does not work.
 */
export async function saveLessonSettings(ctx: Context, input: LessonSettingsInput): Promise<PartPlace> {
  const { lesson: known, series } = await ownLesson(ctx, input.lesson);
  const workroom = found(await Workroom.findByPk(series.workroomId));
  return withSeriesLocked(series, async (locked) => {
    const lesson = found(await Lesson.findByPk(known.id));
    refuseStrayField(input, lesson.opens);
    const opens = await openingOf(ctx, input, lesson, workroom.timeZone);
    const isAsBefore = lesson.title === input.title && lesson.isPreview === input.isPreview && isDeepStrictEqual(lesson.opens, opens);
    await lesson.update({
      title: input.title,
      minutes: input.minutes,
      isPreview: input.isPreview,
      opens,
      opensAt: opens.rule === 'on-date' ? instantOfWall(opens.wall, opens.zone) : null,
      checkpoint: checkpointOf(input),
      timetableRevision: lesson.timetableRevision + (isAsBefore ? 0 : 1),
    });
    await requireOpenable(locked, ({ part }) => {
      if (part !== lesson.position) return input.asksForPhoto ? 'wall' : 'asksForPhoto';
      return input.rule === 'after-verdict' ? 'after' : input.rule === 'after-part' ? 'afterPart' : 'wall';
    });
    return placeOf(series, lesson);
  });
}

/** Something newly typed beside a rule that is not chosen is mostly meant: better to ask than to drop it. */
function refuseStrayField({ rule, wall = '', days = '', after = '', afterPart = '' }: LessonSettingsInput, kept: OpeningRule): void {
  const typed = [
    { rule: 'on-date', field: 'wall', value: wall, was: kept.rule === 'on-date' ? kept.wall : '', name: 'On a date' },
    { rule: 'after-seat', field: 'days', value: days.trim(), was: kept.rule === 'after-seat' ? String(kept.days) : '', name: 'Some days after the seat began' },
    { rule: 'after-verdict', field: 'after', value: after, was: kept.rule === 'after-verdict' ? kept.lesson : '', name: 'After you have seen a photo' },
    { rule: 'after-part', field: 'afterPart', value: afterPart, was: kept.rule === 'after-part' ? kept.lesson : '', name: 'When an earlier part is done' },
  ] as const;
  const stray = typed.find((one) => one.rule !== rule && one.value !== '' && one.value !== one.was);
  if (stray !== undefined) throw fieldError(stray.field, `This is filled in, but another way is chosen. Choose “${stray.name}” above it, or empty it.`);
}

function checkpointOf({ asksForPhoto, ask, look }: LessonSettingsInput): Checkpoint | null {
  if (!asksForPhoto) return null;
  if (ask === '') throw fieldError('ask', 'Say what the photo shall show, for instance: Show your warped loom.');
  return { ask, look };
}

async function openingOf(ctx: Context, input: LessonSettingsInput, lesson: Lesson, zone: string): Promise<OpeningRule> {
  switch (input.rule) {
    case 'at-once':
      return { rule: 'at-once' };
    case 'after-seat':
      return { rule: 'after-seat', days: daysOf(input.days) };
    case 'on-date':
      return onDate(ctx, input.wall ?? '', zone, lesson);
    case 'after-part':
      return afterPart(input.afterPart ?? '', lesson);
    case 'after-verdict': {
      const earlier = await otherPart(input.after ?? '', lesson);
      if (earlier?.checkpoint == null) throw fieldError('after', 'Choose an earlier part that asks for a photo.');
      if (earlier.position >= lesson.position) throw fieldError('after', 'That part comes later, so this one could never open. Choose an earlier one.');
      return { rule: 'after-verdict', lesson: earlier.publicId };
    }
  }
}

function otherPart(publicId: string, { seriesId }: Lesson): Promise<Lesson | null> {
  return Lesson.findOne({ where: { publicId, seriesId, takenOutAt: null } });
}

async function afterPart(publicId: string, lesson: Lesson): Promise<OpeningRule> {
  const before = await otherPart(publicId, lesson);
  if (before === null) throw fieldError('afterPart', 'Choose an earlier part.');
  if (before.id === lesson.id) throw fieldError('afterPart', 'A part cannot wait for itself: nobody could ever open it. Choose an earlier one.');
  if (awaitedPart(before.opens) === lesson.publicId) throw fieldError('afterPart', `“${before.title}” waits for this part already, so neither could ever open. Choose another one.`);
  if (before.position > lesson.position) throw fieldError('afterPart', 'That part comes later, so this one could never open. Choose an earlier one.');
  return { rule: 'after-part', lesson: before.publicId };
}

function daysOf(typed: string | undefined): number {
  const days = Number(typed);
  if (typed === undefined || typed.trim() === '' || !Number.isInteger(days) || days < 0 || days > 365) throw fieldError('days', 'Between 0 and 365 days works.');
  return days;
}

function onDate(ctx: Context, wall: string, zone: string, lesson: Lesson): OpeningRule {
  const opensAt = instantOfWall(wall, zone);
  if (opensAt === null) throw fieldError('wall', 'The day and time are missing. Write them like 2027-03-01 09:00.');
  // A date that has passed is fine as long as it was there before: the part is open, and its teacher changes the title.
  const unchanged = lesson.opens.rule === 'on-date' && lesson.opens.wall === wall;
  if (opensAt <= ctx.clock.now() && !unchanged) throw fieldError('wall', 'This moment has passed. Choose a later one, or let the part open at once.');
  return { rule: 'on-date', wall, zone };
}

import { Op } from 'sequelize';
import { seeToMend } from '#core/following/see-to-mend.ts';
import { awaitedPart } from '#core/timetable/opening.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found } from '#server/errors.ts';
import type { LetterTo } from '#server/mail/outbox.ts';
import { Enrolment, HeldVerdict, Lesson, PartOpening, PhotoNote, ProgressPhoto, Series, User, Workroom } from '#server/models/index.ts';
import { answerList, tellAnswer } from '#server/notices/tell-answer.ts';
import { factsOfPart } from '#server/queries/lessons/facts-of-part.ts';

/** A verdict as it was said, `round` telling which time. */
export interface SaidVerdict {
  readonly photoId: number;
  readonly round: number;
}

/**
 * Carries out a verdict that was not taken back: the photo is answered, the part behind it opens, the student is
 * told. Once, however often it is asked.
 */
export async function sendVerdict(ctx: Context, { photoId, round }: SaidVerdict): Promise<void> {
  await withTransaction(async () => {
    const photo = await ProgressPhoto.findByPk(photoId, { lock: true });
    const held = await HeldVerdict.findByPk(photoId);
    if (photo === null || held === null || held.goesOutAt === null || held.round !== round) return;
    await photo.update({ verdict: held.verdict, verdictWords: held.words, see: held.see, verdictAt: ctx.clock.now(), verdictById: held.byId });
    await PhotoNote.bulkCreate(held.notes.map((note, index) => ({ photoId, position: index + 1, authorId: held.byId, ...note })));
    await tellStudent(photo, held, ctx.clock.now());
    await held.destroy();
  });
}

/** When all tries failed: the photo comes back to the bench, with what was said of it. */
export async function bringBackVerdict(_ctx: Context, { photoId, round }: SaidVerdict): Promise<void> {
  await HeldVerdict.update({ goesOutAt: null }, { where: { photoId, round } });
}

async function tellStudent(photo: ProgressPhoto, { verdict, words, notes, see, byId }: HeldVerdict, now: Date): Promise<void> {
  const enrolment = found(await Enrolment.findByPk(photo.enrolmentId));
  const [series, student, by] = [found(await Series.findByPk(enrolment.seriesId)), found(await User.findByPk(enrolment.userId)), found(await User.findByPk(byId))];
  const workroom = found(await Workroom.findByPk(series.workroomId));
  const lessons = await Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null, publishedVersionId: { [Op.ne]: null } }, order: ['position', 'id'] });
  const partNumber = lessons.findIndex(({ id }) => id === photo.lessonId) + 1;
  const opened = verdict === 'weave-on' ? await openedBy(photo, lessons) : [];
  const how = see === null ? null : seeToMend(see, (await factsOfPart(photo.lessonId))?.steps ?? []);
  const letter: LetterTo<'verdict'> = {
    template: 'verdict',
    dedupeKey: `verdict:${photo.publicId}`,
    to: { userId: student.id, name: student.name, address: student.email },
    data: {
      seriesTitle: series.title,
      seriesSlug: series.slug,
      partNumber,
      teacherName: by.name,
      verdict,
      words,
      notes: notes.map((note) => note.words),
      openedParts: opened.map((lesson) => lessons.indexOf(lesson) + 1),
      // A step is an anchor of the part's own page.
      see: how === null ? null : { label: how.label, href: how.href.startsWith('#') ? `/series/${series.slug}/${partNumber}${how.href}` : how.href },
      list: answerList(student, workroom),
    },
  };
  await tellAnswer(letter, { to: student, workroom, seriesId: series.id, kind: 'verdict', wantsLetter: true }, now);
}

/** The parts that waited for this verdict. They are put on record as told, so that no second letter says they are open. */
async function openedBy({ enrolmentId, lessonId, verdictAt }: ProgressPhoto, lessons: readonly Lesson[]): Promise<Lesson[]> {
  const shown = lessons.find(({ id }) => id === lessonId);
  const opened = lessons.filter(({ opens, isPreview }) => !isPreview && shown !== undefined && awaitedPart(opens) === shown.publicId);
  await PartOpening.bulkCreate(opened.map(({ id }) => ({ enrolmentId, lessonId: id, toldBy: 'verdict' as const, openedAt: verdictAt ?? new Date() })), { ignoreDuplicates: true });
  return opened;
}

import { Op } from 'sequelize';
import type { VerdictInput } from '#contracts/bench.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { postLetter, type LetterTo } from '#server/mail/outbox.ts';
import { Enrolment, Lesson, PartOpening, PhotoNote, ProgressPhoto, Series, User } from '#server/models/index.ts';
import { putUpLetter } from '#server/notices/put-up.ts';
import { maySitAtBench } from '#server/policies/workroom.ts';

/**
 * Says *weave on* or *mend first* of a waiting photo, with words and pinned notes, and writes to the student. Of two who
 * answer at once the first is heard; the other is told who was.
 * @throws NOT_FOUND for another workroom's photo; CONFLICT when it was answered in the meantime.
 */
export async function giveVerdict(ctx: Context, input: VerdictInput): Promise<ProgressPhoto> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const { actor } = ctx;
  const known = found(await ProgressPhoto.findOne({ where: { publicId: input.photo } }));
  const enrolment = found(await Enrolment.findByPk(known.enrolmentId));
  const series = found(await Series.findByPk(enrolment.seriesId));
  authorize(maySitAtBench(actor, series.workroomId));
  return withTransaction(async () => {
    const photo = found(await ProgressPhoto.findByPk(known.id, { lock: true }));
    if (photo.verdict !== 'waits') throw await answeredAlready(photo);
    await photo.update({ verdict: input.verdict, verdictWords: input.words, verdictAt: ctx.clock.now(), verdictById: actor.userId });
    await PhotoNote.bulkCreate(input.notes.map((note, index) => ({ photoId: photo.id, position: index + 1, authorId: actor.userId, ...note })));
    await audit(ctx, `verdict-${input.verdict}`, { kind: 'photo', id: photo.publicId });
    await tellStudent({ photo, enrolment, series, teacherName: actor.name, input });
    return photo;
  });
}

async function answeredAlready(photo: ProgressPhoto): Promise<AppError> {
  const by = photo.verdictById === null ? null : await User.findByPk(photo.verdictById);
  return new AppError('CONFLICT', { says: `${by?.name ?? 'Somebody'} answered this photo in the meantime: ${photo.verdict === 'weave-on' ? 'weave on' : 'mend first'}. Yours was not sent.` });
}

async function tellStudent(told: { photo: ProgressPhoto; enrolment: Enrolment; series: Series; teacherName: string; input: VerdictInput }): Promise<void> {
  const { photo, enrolment, series, teacherName, input } = told;
  const student = found(await User.findByPk(enrolment.userId));
  const lessons = await Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null, publishedVersionId: { [Op.ne]: null } }, order: ['position', 'id'] });
  const partNumber = lessons.findIndex(({ id }) => id === photo.lessonId) + 1;
  const opened = input.verdict === 'weave-on' ? await openedBy(photo, lessons) : [];
  const letter: LetterTo<'verdict'> = {
    template: 'verdict',
    dedupeKey: `verdict:${photo.publicId}`,
    to: { userId: student.id, name: student.name, address: student.email },
    data: {
      seriesTitle: series.title,
      seriesSlug: series.slug,
      partNumber,
      teacherName,
      verdict: input.verdict,
      words: input.words,
      notes: input.notes.map(({ words }) => words),
      openedParts: opened.map((lesson) => lessons.indexOf(lesson) + 1),
    },
  };
  await postLetter(letter);
  await putUpLetter(letter, { kind: 'verdict', seriesId: series.id });
}

/** The parts that waited for this verdict. They are put on record as told, so that no second letter says they are open. */
async function openedBy({ enrolmentId, lessonId, verdictAt }: ProgressPhoto, lessons: readonly Lesson[]): Promise<Lesson[]> {
  const shown = lessons.find(({ id }) => id === lessonId);
  const opened = lessons.filter(({ opens, isPreview }) => !isPreview && opens.rule === 'after-verdict' && opens.lesson === shown?.publicId);
  await PartOpening.bulkCreate(opened.map(({ id }) => ({ enrolmentId, lessonId: id, toldBy: 'verdict' as const, openedAt: verdictAt ?? new Date() })), { ignoreDuplicates: true });
  return opened;
}

/** What the demo students have done: Maud is at her warped loom and waits for an answer, Jonas has just come. */
import { writeFile, rm } from 'node:fs/promises';
import sharp from 'sharp';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { LETTER_KINDS } from '#core/notices/letter-kinds.ts';
import { fitPiece, type MyPiece } from '#core/craft/fit.ts';
import { services } from '#server/services.ts';
import { actingAs } from '#server/demo/acting-as.ts';
import { withOwnDrawings } from '#server/media/decoders.ts';
import { Enrolment, GatheringItem, Lesson, LessonVisit, MyPieceRow, type Series, type User, type Workroom } from '#server/models/index.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { chooseLetters } from '#server/use-cases/letters/choose-letters.ts';
import { keepNotice } from '#server/use-cases/notices/keep-notice.ts';
import { sendNotice } from '#server/use-cases/notices/send-notice.ts';
import { postPhoto } from '#server/use-cases/photos/post-photo.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';

const DAY_MS = 86_400_000;

/** Narrower than the pattern, on a small frame with nails at 8 mm worked in pairs. */
const MAUDS_PIECE: MyPiece = { loom: { insideWidthMm: 360, insideHeightMm: 640, nailPitchMm: 8 }, widthMm: 300, endsTogether: 2 };

export async function giveSeat(student: User, series: Series, daysAgo: number, now: Date): Promise<Enrolment> {
  return Enrolment.create({ userId: student.id, seriesId: series.id, source: 'granted', startedAt: new Date(now.getTime() - daysAgo * DAY_MS) });
}

/** Maud: piece reckoned for her loom, Part 1 gathered and done, half of Part 2, her photo on the bench. */
export async function bringMaudToPartTwo(maud: User, series: Series, seat: Enrolment): Promise<void> {
  const ctx = await actingAs(maud);
  await MyPieceRow.create({ enrolmentId: seat.id, data: MAUDS_PIECE });
  const [first, second] = await Lesson.findAll({ where: { seriesId: series.id }, order: ['position'], limit: 2 });
  if (first === undefined || second === undefined) throw new RangeError('the series has fewer than two parts');
  for (const lesson of [first, second]) {
    const items = await GatheringItem.findAll({ where: { lessonId: lesson.id } });
    const had = lesson === first ? items : items.slice(0, -1);
    await setTick(ctx, { subject: 'gather', series: series.slug, items: had.map(({ publicId }) => publicId), ticked: true });
    for (const step of lesson.draftReading.ok ? lesson.draftReading.steps : []) {
      await setTick(ctx, { subject: 'step', series: series.slug, lesson: lesson.publicId, item: step.id, ticked: true });
    }
  }
  // A tick counts as a visit already, so the rows may be there.
  await LessonVisit.upsert({ enrolmentId: seat.id, lessonId: first.id, finishedAt: ctx.clock.now() });
  await LessonVisit.upsert({ enrolmentId: seat.id, lessonId: second.id });
  const path = await drawnPhoto(series, seat);
  try {
    await postPhoto(ctx, { series: series.slug, lesson: second.publicId, words: 'The two ends at the left look slacker than the rest. Is that enough to wind it again?', files: [{ path, originalName: 'warped-loom.jpg' }] });
  } finally {
    await rm(path, { force: true });
  }
}

/** Maud wants to hear from Ilse by letter too. */
export async function askForLetters(maud: User, { publicId }: Workroom): Promise<void> {
  await chooseLetters(await actingAs(maud), { workroom: publicId, source: 'seat', wanted: [...LETTER_KINDS], answers: 'at-once' });
}

/** What Ilse wrote to her class on the day before. */
export async function writeToClass(ilse: User, series: Series): Promise<void> {
  const ctx = await actingAs(ilse);
  const notice = await keepNotice(ctx, {
    series: series.slug, part: null, still: null, postalAddress: '', title: 'The grey of the shore is back',
    words: 'The mill has spun the grey of the dark shore again. For the whole piece you need <Amount of="yarn.shore"/> of it.\n\nIf you took another grey meanwhile: keep it. What hangs beside it decides, not the label.',
  });
  await sendNotice(ctx, { notice: notice.publicId, when: 'now', wall: '' });
}

/** A picture of her bare warp, drawn from her own piece and saved as a phone would. */
async function drawnPhoto(series: Series, seat: Enrolment): Promise<string> {
  const { pattern, mine } = await piecesOf(series.id, seat.id);
  const fitted = pattern === null ? null : fitPiece(pattern, mine);
  if (fitted?.ok !== true) throw new RangeError('the demo piece does not fit the demo loom');
  const { piece, plan } = fitted.value;
  const svg = drawCloth(clothOf(piece, plan, series.title), { id: 'photo', as: 'loom', width: 1_100, woven: 0, decorative: true });
  const path = await services().media.temporaryPath('warped-loom.jpg');
  const loom = await withOwnDrawings(() => sharp(Buffer.from(svg)).png().toBuffer());
  const { height = 0 } = await sharp(loom).metadata();
  const photo = sharp({ create: { width: 1_400, height: height + 300, channels: 3, background: '#8a7a66' } }).composite([{ input: loom, left: 150, top: 150 }]);
  await writeFile(path, await photo.jpeg({ quality: 86 }).toBuffer());
  return path;
}

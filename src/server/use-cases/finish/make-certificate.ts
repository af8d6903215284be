import type { CertificateInput } from '#contracts/certificate.ts';
import { describeCloth } from '#core/craft/cloth/describe-cloth.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { craftOf } from '#core/craft/crafts.ts';
import { dayWords } from '#core/moment-words.ts';
import { titleHalves } from '#core/series/title.ts';
import { dayIn } from '#core/timetable/day-in.ts';
import { minutesText } from '#core/units/minutes-text.ts';
import { drawCertificate } from '#server/certificate/draw-certificate.ts';
import type { Context } from '#server/context.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import { mayCertify } from '#server/policies/finish.ts';
import { finishedPiece } from '#server/queries/finish/finished-piece.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * The certificate of who made every part, as PDF. Nothing is kept of what stands on it; the same asked twice is the
 * same file.
 * @throws UNAUTHENTICATED; NOT_FOUND unless every part is done on a seat of hers; VALIDATION for a day to come; RATE_LIMITED.
 */
export async function makeCertificate(ctx: Context, slug: string, { name, day, hours, paper }: CertificateInput): Promise<Uint8Array> {
  const actor = signedIn(ctx);
  const now = ctx.clock.now();
  const piece = found(await finishedPiece(actor, slug, now));
  authorize(mayCertify({ hasSeat: true, hasFinished: piece.hasFinished }));
  if (day > dayIn(now, actor.timeZone)) throw new AppError('VALIDATION', { fields: { day: 'That day is still to come.' } });
  await countUse(RATE_RULES.certificate, actor.publicId);
  const { series: { title, workroom }, made } = piece;
  const { name: series, rest } = titleHalves(title);
  const cloth = made === null ? null : clothOf(made.piece, made.plan, series);
  const at = new Date(`${day}T12:00:00Z`);
  const minutes = piece.minutes ?? piece.writtenDownMinutes;
  return drawCertificate({
    name, series, seriesRest: rest, teacher: workroom.teacherName, workroom: workroom.name, day: dayWords(at, 'UTC'), at, paper, cloth,
    hours: hours && minutes > 0 ? minutesText(minutes) : '',
    size: made === null ? '' : craftOf(made.piece).size(made, actor.units),
    clothWords: cloth === null ? '' : describeCloth(cloth, { units: actor.units }),
  });
}

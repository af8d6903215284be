/** What waits for a teacher or helper today, and what happened since Monday. */
import { QueryTypes } from 'sequelize';
import { DateTime } from 'luxon';
import { sumUp, type CurrencySum, type LedgerSum } from '#core/money/month-sums.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { waitingPhotos, type WaitingPhoto } from '#server/queries/bench/waiting-photos.ts';
import { classOf, type ClassSeries } from './class-of.ts';

export interface Today {
  readonly waiting: readonly WaitingPhoto[];
  readonly series: readonly ClassSeries[];
  /** Days within which photos are answered, as promised to students; null without a workroom. */
  readonly answerDays: number | null;
  /** Null for who may see no money. */
  readonly sold: readonly CurrencySum[] | null;
  /** Hours from photo to verdict, of every verdict since Monday. */
  readonly answerHours: readonly number[];
  readonly monday: Date;
}

interface WorkroomRow { readonly id: number; readonly answerDays: number }
interface AnswerRow { readonly minutes: number }

/** The last Monday's beginning on this person's clock. */
export function lastMonday(now: Date, timeZone: string): Date {
  return DateTime.fromJSDate(now, { zone: timeZone }).startOf('week').toJSDate();
}

export async function today(actor: Actor, now: Date): Promise<Today> {
  const workrooms = [...(actor.workroomId === null ? [] : [actor.workroomId]), ...actor.helpsInWorkroomIds];
  const monday = lastMonday(now, actor.timeZone);
  if (workrooms.length === 0) return { waiting: [], series: [], answerDays: null, sold: null, answerHours: [], monday };
  const asked = { replacements: { workrooms, monday, own: actor.workroomId ?? 0 }, type: QueryTypes.SELECT } as const;
  const [waiting, series, rooms, answers, ledger] = await Promise.all([
    waitingPhotos(actor),
    classOf(workrooms),
    sequelize.query<WorkroomRow>('SELECT id, answer_days AS answerDays FROM workrooms WHERE id IN (:workrooms)', asked),
    sequelize.query<AnswerRow>(
      `SELECT TIMESTAMPDIFF(MINUTE, p.created_at, p.verdict_at) AS minutes
         FROM progress_photos p JOIN enrolments e ON e.id = p.enrolment_id JOIN series s ON s.id = e.series_id
        WHERE s.workroom_id IN (:workrooms) AND p.verdict_at >= :monday`, asked),
    sequelize.query<LedgerSum>(
      `SELECT kind, currency, COUNT(*) AS count, CAST(SUM(amount_minor) AS SIGNED) AS amountMinor
         FROM ledger_entries WHERE workroom_id = :own AND created_at >= :monday GROUP BY kind, currency`, asked),
  ]);
  const mine = rooms.find(({ id }) => id === actor.workroomId) ?? rooms[0];
  const teaches = actor.workroomId !== null && mayTeachIn(actor, actor.workroomId);
  return { waiting, series, answerDays: mine?.answerDays ?? null, sold: teaches ? sumUp(ledger) : null, answerHours: answers.map(({ minutes }) => minutes / 60), monday };
}

/** What waits for a teacher or helper today, and what happened since Monday. */
import { QueryTypes } from 'sequelize';
import { DateTime } from 'luxon';
import { sumsOf, type Sums } from '#core/money/statement.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { mayTeachIn, workroomsOf } from '#server/policies/workroom.ts';
import { waitingPhotos, type WaitingPhoto } from '#server/queries/bench/waiting-photos.ts';
import { classOf, type ClassSeries } from './class-of.ts';
import { ledgerSince } from './ledger.ts';

export interface Today {
  readonly waiting: readonly WaitingPhoto[];
  readonly series: readonly ClassSeries[];
  /** Days within which photos are answered, as promised to students; null without a workroom. */
  readonly answerDays: number | null;
  /** By currency; null for who may see no money. */
  readonly sold: ReadonlyMap<string, Sums> | null;
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
  const workrooms = workroomsOf(actor);
  const monday = lastMonday(now, actor.timeZone);
  if (workrooms.length === 0) return { waiting: [], series: [], answerDays: null, sold: null, answerHours: [], monday };
  const teaches = actor.workroomId !== null && mayTeachIn(actor, actor.workroomId);
  const asked = { replacements: { workrooms, monday }, type: QueryTypes.SELECT } as const;
  const [waiting, series, rooms, answers, ledger] = await Promise.all([
    waitingPhotos(actor),
    classOf(workrooms),
    sequelize.query<WorkroomRow>('SELECT id, answer_days AS answerDays FROM workrooms WHERE id IN (:workrooms)', asked),
    sequelize.query<AnswerRow>(
      `SELECT TIMESTAMPDIFF(MINUTE, p.created_at, p.verdict_at) AS minutes
         FROM progress_photos p JOIN enrolments e ON e.id = p.enrolment_id JOIN series s ON s.id = e.series_id
        WHERE s.workroom_id IN (:workrooms) AND p.verdict_at >= :monday`, asked),
    teaches ? ledgerSince(actor.workroomId, monday) : [],
  ]);
  const mine = rooms.find(({ id }) => id === actor.workroomId) ?? rooms[0];
  const currencies = [...new Set(ledger.map(({ currency }) => currency))];
  const sold = new Map(currencies.map((currency) => [currency, sumsOf(ledger.filter((entry) => entry.currency === currency))]));
  return { waiting, series, answerDays: mine?.answerDays ?? null, sold: teaches ? sold : null, answerHours: answers.map(({ minutes }) => minutes / 60), monday };
}

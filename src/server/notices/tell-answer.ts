/**
 * Tells a student that something of hers was answered, a photo or a question: in her page always, by letter as often as
 * she chose. What is gathered for the letter of the day lies in that letter itself, which waits in the outbox for the
 * morning: nothing has to run to gather it, and it goes out once.
 */
import { Op } from 'sequelize';
import type { Said, ToldKind } from '#core/notices/said.ts';
import { nextMorning } from '#core/timetable/next-morning.ts';
import { leaveKey } from '#server/auth/leave-key.ts';
import { found } from '#server/errors.ts';
import { postLetter, type LetterTo } from '#server/mail/outbox.ts';
import type { AnswerList, GatheredAnswer } from '#server/mail/templates/answers.ts';
import { Mail, User, type Workroom } from '#server/models/index.ts';
import { putUpLetter, saidIn } from '#server/notices/put-up.ts';
import { letterPace } from '#server/queries/letters/letter-choices.ts';

const GATHERED = 'answers-gathered';

export interface AnswerTold {
  readonly to: User;
  readonly workroom: Workroom;
  readonly seriesId: number;
  readonly kind: ToldKind;
  /** False where she said with this very question that no letter is to come. */
  readonly wantsLetter: boolean;
}

/** What letters about answers say of the list they belong to. */
export function answerList({ publicId: person }: User, { name, handle, publicId: workroom }: Workroom): AnswerList {
  return { workroomName: name, workroomHandle: handle, leaveKey: leaveKey({ person, workroom, kind: 'answers' }) };
}

/** Part of the caller's transaction. Her own row is locked, so that what is gathered and what she chooses follow one another. */
export async function tellAnswer<T extends 'verdict' | 'question-answered'>(letter: LetterTo<T>, { to, workroom, seriesId, kind, wantsLetter }: AnswerTold, now: Date): Promise<void> {
  found(await User.findByPk(to.id, { lock: true, attributes: ['id'] }));
  const pace = wantsLetter ? await letterPace(to.id, workroom.id, 'answers') : 'never';
  const isNew = await putUpLetter(letter, { kind, seriesId, byLetter: pace !== 'never' });
  if (!isNew || pace === 'never') return;
  if (pace === 'at-once') await postLetter({ ...letter, list: { workroomId: workroom.id, kind: 'answers' } });
  else await gather(saidIn(letter.template, letter.data), to, workroom, now);
}

/** Puts it into the letter of the next morning; where that one is on its way already, into the one after. */
async function gather({ title, blocks, act }: Said, to: User, workroom: Workroom, now: Date): Promise<void> {
  const answer: GatheredAnswer = { title, blocks: [...blocks], act };
  for (let morning = nextMorning(now, to.timeZone); ; morning = nextMorning(morning.at, to.timeZone)) {
    const dedupeKey = `${GATHERED}:${to.publicId}:${workroom.publicId}:${morning.day}`;
    const waiting = await Mail.findOne({ where: { dedupeKey }, lock: true });
    if (waiting === null) {
      await postLetter({
        template: GATHERED,
        dedupeKey,
        notBefore: morning.at,
        to: { userId: to.id, name: to.name, address: to.email },
        list: { workroomId: workroom.id, kind: 'answers' },
        data: { list: answerList(to, workroom), answers: [answer] },
      });
      return;
    }
    if (waiting.state === 'ready' && waiting.attempts === 0) {
      const kept = waiting.data['answers'];
      const earlier: readonly unknown[] = Array.isArray(kept) ? kept : [];
      await waiting.update({ data: { ...waiting.data, answers: [...earlier, answer] } });
      return;
    }
  }
}

/** Lets go what waits for the morning: she wants answers at once. Part of the caller's transaction, which holds her row. */
export async function sendGatheredNow(userId: number, workroomId: number, now: Date): Promise<void> {
  await Mail.update({ runAt: now }, { where: { userId, listWorkroomId: workroomId, template: GATHERED, state: 'ready', attempts: 0, runAt: { [Op.gt]: now } } });
}

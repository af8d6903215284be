/** What letters about answers share, and the one letter a day that gathers them. */
import { z } from 'astro/zod';
import { SaidBlocks } from '#contracts/notices.ts';
import type { Block, MailingList } from '#server/mail/letter.ts';
import { defineTemplate } from '#server/mail/template.ts';

/** The list such a letter belongs to: answers of one workroom. */
export const AnswerList = z.object({ workroomName: z.string(), workroomHandle: z.string(), leaveKey: z.string() });
export type AnswerList = z.output<typeof AnswerList>;

const GatheredAnswer = z.object({ title: z.string(), blocks: SaidBlocks, act: z.object({ label: z.string(), href: z.string() }).nullable() });
export type GatheredAnswer = z.output<typeof GatheredAnswer>;

const leaveHref = ({ leaveKey }: AnswerList, publicUrl: string): string => `${publicUrl}/leave/${leaveKey}`;

export function listOfAnswers(list: AnswerList, publicUrl: string): MailingList {
  return { label: `answers.${list.workroomHandle}`, leaveHref: leaveHref(list, publicUrl) };
}

/** Why she has it, how to have it otherwise, and how it ends. */
export function footOfAnswers(list: AnswerList, publicUrl: string, why = `you have a seat with ${list.workroomName}`): Block {
  return {
    kind: 'foot',
    words: `You have this letter because ${why}. How often answers of ${list.workroomName} come by letter, you choose at ${publicUrl}/account#letters.`,
    act: { label: 'No more of these letters', href: leaveHref(list, publicUrl) },
  };
}

export const answersGathered = defineTemplate({
  data: z.object({ list: AnswerList, answers: z.array(GatheredAnswer).min(1) }),
  write: ({ list, answers }, { publicUrl }) => ({
    subject: answers.length === 1 ? (answers[0]?.title ?? '') : `${answers.length} answers from ${list.workroomName}`,
    list: listOfAnswers(list, publicUrl),
    blocks: [
      ...answers.flatMap(({ title, blocks, act }): Block[] => [
        { kind: 'prose', runs: [{ words: title, strong: true }] },
        ...blocks,
        ...(act === null ? [] : [{ kind: 'act' as const, label: act.label, href: `${publicUrl}${act.href}` }]),
      ]),
      footOfAnswers(list, publicUrl, 'you chose one a day'),
    ],
  }),
});

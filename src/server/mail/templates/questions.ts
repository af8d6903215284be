/** Letters about questions. */
import { z } from 'astro/zod';
import { titleHalves } from '#core/series/title.ts';
import { defineTemplate } from '#server/mail/template.ts';
import { AnswerList, footOfAnswers, listOfAnswers } from './answers.ts';

export const questionAnswered = defineTemplate({
  data: z.object({
    seriesTitle: z.string(),
    seriesSlug: z.string(),
    partNumber: z.number().int(),
    /** Public id of the question. */
    question: z.string(),
    asked: z.string(),
    answer: z.string(),
    byName: z.string(),
    /** Name of the teacher whom the one who answered helps; null when it was the teacher. */
    helpsName: z.string().nullable(),
    list: AnswerList.optional(),
  }),
  write: (data, { publicUrl }) => ({
    subject: `${data.byName} answered your question`,
    ...(data.list && { list: listOfAnswers(data.list, publicUrl) }),
    blocks: [
      { kind: 'words', words: `You asked on Part ${data.partNumber} of ${titleHalves(data.seriesTitle).name}:` },
      { kind: 'words', words: data.asked },
      { kind: 'words', words: `${data.byName}${data.helpsName === null ? '' : `, who helps ${data.helpsName},`} answers:` },
      { kind: 'words', words: data.answer },
      { kind: 'act', label: 'See it beside the part', href: `${publicUrl}/series/${data.seriesSlug}/${data.partNumber}#q-${data.question}` },
      data.list === undefined
        ? { kind: 'foot', words: 'You have this letter because you asked for it with your question.' }
        : footOfAnswers(data.list, publicUrl, 'you asked for it with your question'),
    ],
  }),
});

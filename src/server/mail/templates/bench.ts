/** Letters about photos. */
import { z } from 'astro/zod';
import { listed } from '#core/listed.ts';
import type { Block } from '#server/mail/letter.ts';
import { defineTemplate } from '#server/mail/template.ts';
import { AnswerList, footOfAnswers, listOfAnswers } from './answers.ts';

const partsAreOpen = (numbers: readonly number[]): string => (numbers.length === 1 ? `Part ${numbers.join('')} is open.` : `Parts ${listed(numbers.map(String))} are open.`);

const howToMend = ({ label, href }: { readonly label: string; readonly href: string }): Block => ({ kind: 'prose', runs: [{ words: 'How to mend it: ' }, { words: label, href }] });

export const verdict = defineTemplate({
  data: z.object({
    seriesTitle: z.string(),
    seriesSlug: z.string(),
    partNumber: z.number().int(),
    teacherName: z.string(),
    verdict: z.enum(['weave-on', 'mend-first']),
    words: z.string(),
    notes: z.array(z.string()),
    /** Numbers of the parts that waited for this verdict. */
    openedParts: z.array(z.number().int()),
    /** Where it says how to mend it; a path of this site. */
    see: z.object({ label: z.string(), href: z.string() }).nullable().default(null),
    list: AnswerList.optional(),
  }),
  write: (data, { publicUrl }) => {
    const page = `${publicUrl}/series/${data.seriesSlug}`;
    const weaveOn = data.verdict === 'weave-on';
    const [next] = data.openedParts;
    return {
      subject: weaveOn ? `Weave on: ${data.teacherName} has seen your photo` : `Mend first: ${data.teacherName} has seen your photo`,
      ...(data.list && { list: listOfAnswers(data.list, publicUrl) }),
      blocks: [
        {
          kind: 'words',
          words: weaveOn
            ? `${data.teacherName} has seen your photo of Part ${data.partNumber} of ${data.seriesTitle}. Weave on.${next === undefined ? '' : ` ${partsAreOpen(data.openedParts)}`}`
            : `${data.teacherName} has seen your photo of Part ${data.partNumber} of ${data.seriesTitle}. Mend first, then send another photo.`,
        },
        ...(data.words === '' ? [] : [{ kind: 'words' as const, words: data.words }]),
        ...(data.notes.length === 0 ? [] : [{ kind: 'list' as const, items: data.notes }]),
        ...(data.see === null ? [] : [howToMend(data.see)]),
        weaveOn && next !== undefined
          ? { kind: 'act' as const, label: `Go on with Part ${next}`, href: `${page}/${next}` }
          : { kind: 'act' as const, label: `See the notes on your photo`, href: `${page}/${data.partNumber}#checkpoint` },
        ...(data.list === undefined ? [] : [footOfAnswers(data.list, publicUrl)]),
      ],
    };
  },
});

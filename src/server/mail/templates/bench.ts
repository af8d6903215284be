/** Letters about photos. */
import { z } from 'astro/zod';
import { listed } from '#core/listed.ts';
import { defineTemplate } from '#server/mail/template.ts';

const partsAreOpen = (numbers: readonly number[]): string => (numbers.length === 1 ? `Part ${numbers.join('')} is open.` : `Parts ${listed(numbers.map(String))} are open.`);

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
  }),
  write: (data, { publicUrl }) => {
    const page = `${publicUrl}/series/${data.seriesSlug}`;
    const weaveOn = data.verdict === 'weave-on';
    const [next] = data.openedParts;
    return {
      subject: weaveOn ? `Weave on: ${data.teacherName} has seen your photo` : `Mend first: ${data.teacherName} has seen your photo`,
      blocks: [
        {
          kind: 'words',
          words: weaveOn
            ? `${data.teacherName} has seen your photo of Part ${data.partNumber} of ${data.seriesTitle}. Weave on.${next === undefined ? '' : ` ${partsAreOpen(data.openedParts)}`}`
            : `${data.teacherName} has seen your photo of Part ${data.partNumber} of ${data.seriesTitle}. Mend first, then send another photo.`,
        },
        ...(data.words === '' ? [] : [{ kind: 'words' as const, words: data.words }]),
        ...(data.notes.length === 0 ? [] : [{ kind: 'list' as const, items: data.notes }]),
        weaveOn && next !== undefined
          ? { kind: 'act' as const, label: `Go on with Part ${next}`, href: `${page}/${next}` }
          : { kind: 'act' as const, label: `See the notes on your photo`, href: `${page}/${data.partNumber}#checkpoint` },
      ],
    };
  },
});

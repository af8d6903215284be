/** Letters about parts that open. */
import { z } from 'astro/zod';
import { listed } from '#core/listed.ts';
import { titleHalves } from '#core/series/title.ts';
import { defineTemplate } from '#server/mail/template.ts';

export const partsOpened = defineTemplate({
  data: z.object({
    seriesTitle: z.string(),
    seriesSlug: z.string(),
    workroomName: z.string(),
    /** In the order of the parts; at least one. */
    parts: z.array(z.object({ number: z.number().int(), title: z.string() })).min(1),
  }),
  write: ({ seriesTitle, seriesSlug, workroomName, parts }, { publicUrl }) => {
    const { name } = titleHalves(seriesTitle);
    const one = parts.length === 1;
    const which = `${one ? 'Part' : 'Parts'} ${listed(parts.map(({ number }) => String(number)))} of ${name}`;
    const [first] = parts;
    return {
      subject: `${which} ${one ? 'is' : 'are'} open`,
      blocks: [
        { kind: 'words', words: `${which} ${one ? 'is' : 'are'} open to you now. What is open stays open: take the time you need.` },
        { kind: 'list', items: parts.map(({ number, title }) => `Part ${number}, ${title}`) },
        { kind: 'act', label: `Go to Part ${first?.number ?? 1}`, href: `${publicUrl}/series/${seriesSlug}/${first?.number ?? 1}` },
        { kind: 'foot', words: `You have this letter because you have a seat in ${name} with ${workroomName}. Each part is told of once.` },
      ],
    };
  },
});

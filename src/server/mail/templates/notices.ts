/** Letters a teacher writes to her students, by their own choice. */
import { z } from 'astro/zod';
import { LETTER_KINDS, LETTER_NAMES } from '#core/notices/letter-kinds.ts';
import { SaidBlocks } from '#contracts/notices.ts';
import { defineTemplate } from '#server/mail/template.ts';

export const notice = defineTemplate({
  data: z.object({
    kind: z.enum(LETTER_KINDS),
    title: z.string(),
    /** Who writes, and about what: `Ilse Marrow, Low Tide`. */
    from: z.string(),
    blocks: SaidBlocks,
    seriesTitle: z.string(),
    seriesSlug: z.string(),
    workroomName: z.string(),
    workroomHandle: z.string(),
    postalAddress: z.string(),
    leaveKey: z.string(),
  }),
  write: ({ kind, title, from, blocks, seriesTitle, seriesSlug, workroomName, workroomHandle, postalAddress, leaveKey }, { publicUrl }) => {
    const leaveHref = `${publicUrl}/leave/${leaveKey}`;
    return {
      subject: title,
      list: { label: `${kind}.${workroomHandle}`, leaveHref },
      blocks: [
        { kind: 'words', words: `${from} writes:` },
        ...blocks,
        { kind: 'act', label: `Go to ${seriesTitle}`, href: `${publicUrl}/series/${seriesSlug}` },
        {
          kind: 'foot',
          words: `You have this letter because you asked for ${LETTER_NAMES[kind].toLowerCase()} of ${workroomName} by letter.\n${workroomName}, ${postalAddress.replace(/\s*\n\s*/g, ', ')}`,
          act: { label: 'Leave these letters', href: leaveHref },
        },
      ],
    };
  },
});

/** A storyboard as a file in a series' folder. */
import { z } from 'astro/zod';
import { FIGURE_KINDS } from '#core/craft/figures/figure-kinds.ts';

const share = z.number().min(0).max(1);
const words = (most: number) => z.string().trim().min(1).max(most);

const common = {
  from: share.default(0),
  to: share.default(1),
  seconds: z.number().min(1).max(60),
  caption: words(400),
  chapter: words(80).optional(),
};

export const StoryboardFile = z.object({
  title: words(120),
  scenes: z.array(z.union([
    z.object({ figure: z.enum(FIGURE_KINDS), ...common }).strict(),
    z.object({ cloth: z.enum(['loom', 'hanging']), ...common }).strict(),
  ])).min(1).max(60),
}).strict();

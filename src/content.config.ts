// Collections of our own files, built with the program. Teachers' lessons are read at run time: src/live.config.ts.
import { defineCollection } from 'astro:content';
import { glob } from 'astro/loaders';
import { HandbookHead } from '#contracts/handbook.ts';

const handbook = defineCollection({
  loader: glob({ base: './content/handbook', pattern: '**/*.mdx' }),
  schema: HandbookHead,
});

export const collections = { handbook };

import type { z } from 'astro/zod';
import type { Letter } from '#server/mail/letter.ts';

/** How one kind of letter is written: the shape of its data, and its words. */
export interface Template<S extends z.ZodTypeAny> {
  readonly data: S;
  write(data: z.output<S>, site: { readonly publicUrl: string }): Letter;
}

export function defineTemplate<S extends z.ZodTypeAny>(template: Template<S>): Template<S> {
  return template;
}

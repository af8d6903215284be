import type { z } from 'astro/zod';
import type { Letter } from '#server/mail/letter.ts';

export interface Site {
  readonly publicUrl: string;
}

/** How one kind of letter is written: the shape of its data, and its words. */
export interface Template<S extends z.ZodTypeAny> {
  readonly data: S;
  /** Checks stored data, which may be older than this program, and writes the letter. Throws a ZodError when it does not fit. */
  compose(stored: unknown, site: Site): Letter;
}

export function defineTemplate<S extends z.ZodTypeAny>(template: { data: S; write(data: z.output<S>, site: Site): Letter }): Template<S> {
  return { data: template.data, compose: (stored, site) => template.write(template.data.parse(stored) as z.output<S>, site) };
}

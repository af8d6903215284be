/** One way of making an action of a form: parse by a contract, do one use-case, say where to go. */
import { defineAction, type ActionAPIContext } from 'astro:actions';
import type { z } from 'astro/zod';
import type { Context } from '#server/context.ts';
import { answerForm, type FormAnswer } from '#server/web/form.ts';

export interface Done {
  /** Where the browser goes now. */
  readonly to: string;
  /** A sentence shown there once: what was done. */
  readonly said?: string;
}

export function formAction<T>(schema: z.ZodType<T, z.ZodTypeDef, unknown>, work: (input: T, ctx: Context, api: ActionAPIContext) => Promise<Done>) {
  return defineAction({
    accept: 'form',
    handler: (form: FormData, api): Promise<FormAnswer> => answerForm(schema, form, (input) => work(input, api.locals.ctx, api)),
  });
}

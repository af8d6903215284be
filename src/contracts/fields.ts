/** Kinds of form fields that many forms share. */
import { z } from 'astro/zod';

/** A text that must be filled in, without the blanks around it. A field that comes twice, or not at all, is missing. */
export const filled = (missing: string, longest: number) =>
  z.string({ required_error: missing, invalid_type_error: missing }).trim().min(1, missing).max(longest, `At most ${longest} characters work here.`);

/** Letters, figures or signs: something that is seen. */
const VISIBLE = /[\p{L}\p{N}\p{P}\p{S}]/u;
/** Control signs but for line ends and tabs, and those that turn the direction of all that follows. */
const UNSEEN = /(?![\n\t])\p{Cc}|[\u202A-\u202E\u2066-\u2069]/gu;

/** Plain words of several lines, without signs that nobody sees. */
export const written = (missing: string, longest: number) =>
  z.preprocess(
    (typed) => (typeof typed === 'string' ? typed.replace(/\r\n?/g, '\n').replace(UNSEEN, '') : typed),
    filled(missing, longest).refine((words) => VISIBLE.test(words), missing),
  );

/** A tick box: absent when it is not ticked. */
export const ticked = z.string().optional().catch(undefined).transform((value) => value !== undefined);

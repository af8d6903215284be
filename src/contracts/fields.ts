/** Kinds of form fields that many forms share. */
import { z } from 'astro/zod';

/** A text that must be filled in, without the blanks around it. A field that comes twice, or not at all, is missing. */
export const filled = (missing: string, longest: number) =>
  z.string({ required_error: missing, invalid_type_error: missing }).trim().min(1, missing).max(longest, `At most ${longest} characters work here.`);

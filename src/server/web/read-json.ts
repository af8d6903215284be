/** The body of a machine's request, by a contract. */
import type { z } from 'astro/zod';
import { AppError } from '#server/errors.ts';
import { fieldSentences } from '#server/web/form.ts';

const KIB = 1_024;

/** @throws TOO_LARGE beyond `mostKib`; VALIDATION for what is no JSON or does not fit, by field. */
export async function readJson<T>(request: Request, schema: z.ZodType<T, z.ZodTypeDef, unknown>, mostKib = 64): Promise<T> {
  const text = await request.text();
  if (Buffer.byteLength(text) > mostKib * KIB) throw new AppError('TOO_LARGE', { says: `At most ${mostKib} KiB work here.` });
  let data: unknown;
  try {
    data = JSON.parse(text);
  } catch {
    throw new AppError('VALIDATION', { says: 'This is no JSON.' });
  }
  const parsed = schema.safeParse(data);
  if (!parsed.success) throw new AppError('VALIDATION', { fields: fieldSentences(parsed.error) });
  return parsed.data;
}

/** Forms of the steward's office. */
import { z } from 'astro/zod';
import { filled } from '#contracts/fields.ts';

/** Hidden fields: what is not one of ours finds nothing. */
const publicId = z.string().max(26).catch('');
const rowId = z.coerce.number().int().positive().max(4_294_967_295).catch(0);

export const LetInForm = z.object({
  person: publicId,
  workroom: filled('The name of the workroom is missing.', 120),
  handle: filled('The handle is missing. It is the end of the address of her page.', 40)
    .refine((text) => /^[a-z0-9]+(?:-[a-z0-9]+)*$/.test(text), 'Small letters, figures and single hyphens work, such as saltmarsh-loom-room.'),
});
export type LetInInput = z.output<typeof LetInForm>;

export const SuspendForm = z.object({
  person: publicId,
  reason: filled('The reason is missing. It is kept in the log of the office.', 200),
});
export type SuspendInput = z.output<typeof SuspendForm>;

export const RestoreForm = z.object({ person: publicId });
export const SendAgainForm = z.object({ mail: rowId });
export const TryAgainForm = z.object({ job: rowId });

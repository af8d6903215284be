/** The form of a pattern piece. Its fields are read by `core/craft/piece-form`; here stands what goes with them. */
import { z } from 'astro/zod';
import type { FormTexts } from '#core/craft/piece-form/field-names.ts';

export const PieceForm = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  /** Of the piece the form was drawn from; 0 when there was none. */
  revision: z.coerce.number().int().min(0),
  /** Save over what another window saved since; that is set aside. */
  over: z.string().optional(),
}).catchall(z.union([z.string(), z.array(z.string())]));

/** The form as it stands, to be kept while it is filled in. `over`: over what another window kept, which is set aside. */
export const PieceDraftForm = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  revision: z.number().int().min(0),
  texts: z.record(z.string().max(80), z.string().max(6_000, 'A field holds at most 6,000 characters.')),
  over: z.boolean().default(false),
});
export type PieceDraftInput = z.output<typeof PieceDraftForm>;

/** The form was kept. `savedAt` is a time of day on the teacher's clock. */
export interface PieceDraftKept {
  readonly revision: number;
  readonly savedAt: string;
}

/** What another window kept in the meantime. */
export interface OtherPiece {
  readonly revision: number;
  readonly texts: FormTexts;
  /** Who wrote it; null for the asker herself. */
  readonly by: string | null;
  /** Time of day on the teacher's clock. */
  readonly at: string;
}

/** The form was not kept; what was sent is set aside. */
export interface PieceDraftBehind {
  readonly behind: OtherPiece;
}

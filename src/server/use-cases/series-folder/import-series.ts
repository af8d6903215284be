import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize } from '#server/errors.ts';
import type { Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { refused } from '#server/series-folder/open-zip.ts';
import { checkFolder, type ReadFile } from './_check-folder.ts';
import { makeSeries } from './_make-series.ts';

/**
 * Makes a draft series from a folder of plain files that must be ready to be published, under a known address. Films
 * are put in by the caller.
 * @throws VALIDATION with one sentence for each file; NOT_FOUND for another teacher's workroom.
 */
export async function importSeries(ctx: Context, { workroomId, slug, read }: { workroomId: number; slug: string; read: ReadFile }): Promise<Series> {
  authorize(mayTeachIn(ctx.actor, workroomId));
  const folder = await checkFolder(read);
  if (folder.toMend.length > 0) throw refused(folder.toMend);
  return withTransaction(async () => (await makeSeries({ workroomId, slug }, folder)).series);
}

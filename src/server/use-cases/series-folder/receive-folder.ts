import { rename, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { UniqueConstraintError } from 'sequelize';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, signedIn } from '#server/errors.ts';
import { bringInFolder } from '#server/jobs/definitions/series-folder.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { SeriesImport } from '#server/models/index.ts';
import { withZip } from '#server/series-folder/open-zip.ts';
import { ARRIVED_FOLDERS } from '#server/series-folder/folders.ts';
import { checkList } from './_check-folder.ts';

interface Arrived {
  readonly path: string;
  readonly fileName: string;
  readonly byteCount: number;
  /** Of the form; the same when it is pressed twice. */
  readonly pressKey: string;
}

/**
 * Takes a zip that has arrived at `path`, judges its directory and its list, and hands it to the worker.
 * @returns public id of the import; of the one under way when the form was pressed twice.
 * @throws VALIDATION with a sentence for each file that stands in the way.
 */
export async function receiveFolder(ctx: Context, { path, fileName, byteCount, pressKey }: Arrived): Promise<string> {
  const { userId: ownerId, workroomId } = signedIn(ctx);
  authorize(workroomId !== null, 'FORBIDDEN');
  const press = { ownerId, pressKey, byteCount };
  const known = await SeriesImport.findOne({ where: press });
  if (known !== null) return known.publicId;
  await withZip(path, checkList);
  const publicId = newPublicId();
  const waiting = join(await ctx.services.media.temporaryFolder(ARRIVED_FOLDERS), publicId);
  await rename(path, waiting);
  try {
    await withTransaction(async () => {
      await SeriesImport.create({ ...press, publicId, workroomId, fileName: fileName.slice(0, 200) });
      await enqueue(bringInFolder, { folder: publicId }, { uniqueKey: `${bringInFolder.type}:${publicId}` });
    });
    return publicId;
  } catch (error) {
    await rm(waiting, { force: true });
    if (!(error instanceof UniqueConstraintError)) throw error;
    return (await SeriesImport.findOne({ where: press, rejectOnEmpty: true })).publicId;
  }
}

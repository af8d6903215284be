import type { APIRoute } from 'astro';
import { CountRows } from '#contracts/rows.ts';
import { countRows } from '#server/use-cases/progress/count-rows.ts';
import { readJson } from '#server/web/read-json.ts';
import { answering, json } from '#server/web/respond.ts';

/** Takes the rows one device has counted, and tells it those of the others. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => json(await countRows(ctx, await readJson(request, CountRows))));

import type { APIRoute } from 'astro';
import { TickInput } from '#contracts/ticks.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';
import { readJson } from '#server/web/read-json.ts';
import { sentFrom } from '#server/web/sent-from.ts';
import { answering, json } from '#server/web/respond.ts';

/** Ticks something off, alive on the page. */
export const POST: APIRoute = ({ request, locals: { ctx } }) =>
  answering(ctx.requestId, async () => json(await setTick(ctx, await readJson(request, TickInput), sentFrom(request.headers))));

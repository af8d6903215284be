/** Series folders brought in at once, without the queue. */
import type { BroughtIn } from '#contracts/series-folder.ts';
import { signedIn } from '#server/errors.ts';
import { bringIn } from '#server/use-cases/series-folder/_bring-in.ts';
import type { TestContext } from './context.ts';

/** The series that comes of the zip at `path`, and what is told of it. */
export async function bringInAtOnce(ctx: TestContext, path: string): Promise<BroughtIn & { slug: string; title: string }> {
  const { userId: ownerId, workroomId } = signedIn(ctx);
  let made: (BroughtIn & { slug: string; title: string }) | undefined;
  await bringIn(ctx.services, { ownerId, workroomId: workroomId ?? 0 }, path, {
    signal: new AbortController().signal,
    willPut: () => Promise.resolve(),
    hasPut: () => Promise.resolve(),
    also: ({ slug, title }, told) => { made = { slug, title, ...told }; return Promise.resolve(); },
  });
  if (made === undefined) throw new Error('nothing came in');
  return made;
}

/** A published text by the id of its version. Versions never change, so what was read once is kept. */
import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { LessonVersion } from '#server/models/index.ts';

export interface PublishedText {
  readonly versionId: number;
  readonly tree: LessonTree;
  readonly facts: LessonFacts;
}

const MOST_KEPT = 200;
const kept = new Map<number, PublishedText>();

export async function publishedText(versionId: number): Promise<PublishedText | null> {
  const before = kept.get(versionId);
  if (before !== undefined) return before;
  const version = await LessonVersion.findByPk(versionId);
  if (version === null) return null;
  const text = { versionId, tree: version.tree, facts: version.facts };
  const [oldest] = kept.keys();
  if (kept.size >= MOST_KEPT && oldest !== undefined) kept.delete(oldest);
  kept.set(versionId, text);
  return text;
}

/** A published text by the id of its version. Versions never change, so what was read once is kept. */
import { factsOf, type LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { treeIsValid } from '#core/lesson-text/tree-is-valid.ts';
import { AppError } from '#server/errors.ts';
import { Lesson, LessonVersion } from '#server/models/index.ts';

export interface PublishedText {
  readonly versionId: number;
  readonly tree: LessonTree;
  readonly facts: LessonFacts;
}

const MOST_KEPT = 200;
const kept = new Map<number, PublishedText>();

/** @returns null when there is no such version. Whether somebody may read it is for the caller to ask first. */
export async function publishedText(versionId: number): Promise<PublishedText | null> {
  const before = kept.get(versionId);
  if (before !== undefined) return before;
  const version = await LessonVersion.findByPk(versionId);
  if (version === null) return null;
  const stored: unknown = version.tree;
  const tree = treeIsValid(stored) ? stored : treeAnew(version);
  const text = { versionId, tree, facts: factsOf(tree) };
  const [oldest] = kept.keys();
  if (kept.size >= MOST_KEPT && oldest !== undefined) kept.delete(oldest);
  kept.set(versionId, text);
  return text;
}

/** The published texts of a series, in the order of its parts. */
export async function publishedTexts(seriesId: number): Promise<PublishedText[]> {
  const lessons = await Lesson.findAll({ where: { seriesId, takenOutAt: null }, attributes: ['publishedVersionId'], order: ['position', 'id'] });
  const versionIds = lessons.map(({ publishedVersionId }) => publishedVersionId).filter((id) => id !== null);
  return (await Promise.all(versionIds.map(publishedText))).filter((text) => text !== null);
}

/**
 * The tree was kept by another version of the program; its source still says what it means. No thread is needed: the
 * text was read in one before it was published.
 */
function treeAnew({ id, source }: LessonVersion): LessonTree {
  const reading = parseLessonText(source);
  if (!reading.ok) throw new AppError('BUG', { message: `Lesson version ${String(id)} can no longer be read: ${reading.problems[0]?.reason ?? ''}` });
  return reading.tree;
}

/** A series with everything that `whatIsMissing` looks at. */
import { amountOf } from '#core/craft/amounts.ts';
import type { SeriesMediaFile } from '#contracts/media.ts';
import type { Piece, Plan } from '#core/craft/crafts.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { LessonText, RefusedText } from '#core/lesson-text/parse-lesson-text.ts';
import type { LessonNode } from '#core/lesson-text/tree.ts';
import type { Outcome } from '#core/outcome.ts';
import type { PartInHand, SeriesInHand } from '#core/series/missing.ts';
import { GatheringItem, Lesson, PatternPiece, type Series } from '#server/models/index.ts';
import { mediaOnDesk } from '#server/queries/media/media-of-series.ts';
import { partOpenings } from '#server/queries/series/part-openings.ts';

export interface Draft {
  readonly lesson: Lesson;
  readonly text: LessonText | RefusedText;
  /** Its gathering list, in order. */
  readonly list: readonly GatheringItem[];
  /** Lines that were taken off it. */
  readonly linesOut: readonly GatheringItem[];
}

/** Lines of one part, those on its list apart from those taken off it. */
export function listsOf(lines: readonly GatheringItem[]): Pick<Draft, 'list' | 'linesOut'> {
  return { list: lines.filter(({ takenOutAt }) => takenOutAt === null), linesOut: lines.filter(({ takenOutAt }) => takenOutAt !== null) };
}

/** What was read for it comes along, so that a page asks for none of it twice. */
export interface SeriesRead {
  readonly inHand: SeriesInHand;
  /** All parts that are in, in their order. */
  readonly drafts: readonly Draft[];
  /** The pattern piece; null while it is not described. */
  readonly pattern: { readonly piece: Piece; readonly planned: Outcome<Plan> } | null;
  readonly media: readonly SeriesMediaFile[];
}

export async function seriesInHand(series: Series): Promise<SeriesRead> {
  const [lessons, described, media] = await Promise.all([
    Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'] }),
    PatternPiece.findByPk(series.id),
    mediaOnDesk(series.id),
  ]);
  const items = lessons.length === 0 ? [] : await GatheringItem.findAll({ where: { lessonId: lessons.map(({ id }) => id) }, order: ['position', 'id'] });
  const drafts = lessons.map((lesson): Draft => ({ lesson, text: lesson.draftReading, ...listsOf(items.filter(({ lessonId }) => lessonId === lesson.id)) }));
  const pattern = described === null ? null : { piece: described.data, planned: planPiece(described.data) };
  // While no plan can be reckoned, that is what is missing, not each amount.
  const isUnknown = (key: string): boolean => pattern?.planned.ok === true && !amountOf(key, pattern.piece, pattern.planned.value).ok;
  const openings = partOpenings(lessons);
  const parts = drafts.map(({ lesson, text, list }, index): PartInHand => {
    return {
      ...(openings[index] ?? { number: index + 1, opensAfterPart: null, waitsFor: 'verdict', hasCheckpoint: false, opensAt: null }),
      title: lesson.title,
      isPreview: lesson.isPreview,
      isEmpty: lesson.draftSource.trim() === '',
      list: list.map(({ publicId, kind, name, amountKey, amountText, untilPart }) => ({ publicId, kind, name, amountText, untilPart, hasAmount: amountKey !== null || amountText !== null })),
      saysWhatToLookFor: lesson.checkpoint === null || lesson.checkpoint.look.length > 0,
      unknownListAmounts: [...new Set(list.flatMap(({ amountKey }) => (amountKey !== null && isUnknown(amountKey) ? [amountKey] : [])))],
      ...factsOfText(text, media, isUnknown),
    };
  });
  // Only a woven piece has a form to describe it in: without one, amounts are said in words.
  const pieceFits = pattern?.planned.ok ?? (series.craft === 'frame-loom' ? null : true);
  const { title, summary, story, techniques, priceMinor } = series;
  return { inHand: { title, summary, story, techniques, priceMinor, pieceFits, parts }, drafts, pattern, media };
}

type TextFacts = Pick<PartInHand, 'textProblems' | 'textWarnings' | 'hasCaution' | 'stepCount' | 'unknownAmounts' | 'unknownMedia' | 'uncaptionedVideos'>;

function factsOfText(text: LessonText | RefusedText, media: readonly SeriesMediaFile[], isUnknown: (key: string) => boolean): TextFacts {
  if (!text.ok) return { textProblems: text.problems, textWarnings: [], hasCaution: false, stepCount: 0, unknownAmounts: [], unknownMedia: [], uncaptionedVideos: [] };
  const named = (wanted: LessonText['media'][number]): SeriesMediaFile | undefined => media.find(({ kind, name }) => kind === wanted.kind && name === wanted.name);
  return {
    textProblems: [],
    textWarnings: text.warnings,
    hasCaution: holdsCaution(text.tree.children),
    stepCount: text.steps.length,
    unknownAmounts: text.amounts.filter(isUnknown),
    unknownMedia: text.media.filter((wanted) => named(wanted) === undefined).map(({ name }) => name),
    uncaptionedVideos: text.media.filter((wanted) => wanted.kind === 'video' && hasNoCaptions(named(wanted))).map(({ name }) => name),
  };
}

/** A video that is not there is missing as a whole. */
function hasNoCaptions(video: SeriesMediaFile | undefined): boolean {
  return video !== undefined && (video.detail.cues ?? []).length === 0;
}

function holdsCaution(nodes: readonly LessonNode[]): boolean {
  return nodes.some((node) => (node.type === 'component' && node.name === 'Caution') || ('children' in node && holdsCaution(node.children)));
}

/** A series as plain files: its present draft, with all that its teacher can set. What is left out is told in the list of columns in its test. */
import type { MediaDetail, MediaFile } from '#contracts/media.ts';
import type { GatheringEntry, PictureEntry, VideoEntry, WrittenSeriesFile } from '#contracts/series-folder.ts';
import { captionsToVtt } from '#core/captions/web-vtt.ts';
import { plainSlug } from '#core/lesson-text/slugs.ts';
import type { OpeningRule } from '#core/timetable/opening.ts';
import { listToYaml } from '#core/series-folder/list-as-yaml.ts';
import { GatheringItem, Lesson, Media, PatternPiece, SeriesMedia, type Series } from '#server/models/index.ts';

export interface FolderFile {
  readonly name: string;
  /** Text, or a file of the store. */
  readonly content: string | MediaFile;
}

/** The files in their order: list, piece, lessons, then what belongs to videos and pictures. Films only when asked for. */
export async function seriesAsFolder(series: Series, { withFilms }: { readonly withFilms: boolean }): Promise<FolderFile[]> {
  const lessons = await Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'] });
  const [items, piece, media] = await Promise.all([
    GatheringItem.findAll({ where: { lessonId: lessons.map(({ id }) => id), takenOutAt: null }, order: ['position', 'id'] }),
    PatternPiece.findByPk(series.id),
    mediaFiles(series.id, lessons, withFilms),
  ]);
  const texts = lessons.map((lesson, index): FolderFile => ({ name: `${numbered(index, lesson.title, 'part', 80)}.mdx`, content: lesson.draftSource }));
  const written: WrittenSeriesFile = {
    title: series.title,
    craft: series.craft,
    techniques: series.techniques,
    level: series.level,
    summary: series.summary,
    story: series.story,
    price: { ...(series.priceMinor !== null && { amountMinor: series.priceMinor }), currency: series.currency },
    lessons: lessons.map((lesson, index) => ({
      file: texts[index]?.name ?? '',
      title: lesson.title,
      minutes: lesson.minutes,
      preview: lesson.isPreview,
      opens: opensIn(lesson.opens, lessons),
      ...(lesson.checkpoint !== null && { checkpoint: { ask: lesson.checkpoint.ask, look: [...lesson.checkpoint.look] } }),
      gathering: items.filter(({ lessonId }) => lessonId === lesson.id).map(gatheringEntry),
    })),
    videos: media.videos,
    pictures: media.pictures,
  };
  return [
    { name: 'series.yaml', content: listToYaml(written) },
    ...(piece === null ? [] : [{ name: 'piece.json', content: `${JSON.stringify(piece.data, null, 2)}\n` }]),
    ...texts,
    ...media.files,
  ];
}

function numbered(index: number, words: string, otherwise: string, most: number): string {
  return `${String(index + 1).padStart(2, '0')}-${plainSlug(words, most, otherwise)}`;
}

function opensIn(rule: OpeningRule, lessons: readonly Lesson[]): WrittenSeriesFile['lessons'][number]['opens'] {
  if (rule.rule !== 'after-verdict' && rule.rule !== 'after-part') return rule;
  const index = lessons.findIndex(({ publicId }) => publicId === rule.lesson);
  return { rule: rule.rule, ...(index >= 0 && { part: index + 1 }) };
}

function gatheringEntry({ kind, name, amountKey, amountText, standIn, untilPart, note, lookOut, getFrom }: GatheringItem): GatheringEntry {
  return {
    kind,
    name,
    ...(amountKey !== null && { amount: amountKey }),
    ...(amountText !== null && { amountText }),
    ...(standIn !== null && { standIn }),
    ...(untilPart !== null && { untilPart }),
    ...(note !== null && { note }),
    ...(lookOut !== null && { lookOut }),
    ...(getFrom !== null && { getFrom }),
  };
}

interface MediaInFolder {
  readonly videos: VideoEntry[];
  readonly pictures: PictureEntry[];
  readonly files: FolderFile[];
}

/** What will be shown when the series is published next; of a video that never became ready, what was written for it. */
async function mediaFiles(seriesId: number, lessons: readonly Lesson[], withFilms: boolean): Promise<MediaInFolder> {
  const named = await SeriesMedia.findAll({ where: { seriesId }, order: ['name'] });
  const rows = await Media.findAll({ where: { id: named.flatMap(({ mediaId, draftMediaId }) => [mediaId, draftMediaId]).filter((id) => id !== null) } });
  const byId = (id: number | null): Media | undefined => rows.find((media) => media.id === id);
  const found: MediaInFolder = { videos: [], pictures: [], files: [] };
  for (const { name, title, lessonId, mediaId, draftMediaId } of named) {
    const [shown, draft] = [byId(mediaId), byId(draftMediaId)];
    const media = draft?.state === 'ready' ? draft : (shown ?? draft);
    const part = lessons.findIndex(({ id }) => id === lessonId) + 1;
    const common = { name, title, ...(part > 0 && { part }) };
    if (media?.kind === 'picture') {
      const file = media.files['large'];
      if (file === undefined) continue;
      const path = `pictures/${numbered(found.pictures.length, name, 'picture', 64)}.webp`;
      found.pictures.push({ ...common, file: path, ...(media.detail.alt !== undefined && { alt: media.detail.alt }) });
      found.files.push({ name: path, content: file });
    } else {
      const stem = `videos/${numbered(found.videos.length, name, 'video', 64)}`;
      const { entry, files } = videoEntry(stem, media, withFilms);
      found.videos.push({ ...common, ...entry });
      found.files.push(...files);
    }
  }
  return found;
}

function videoEntry(stem: string, media: Media | undefined, withFilms: boolean): { entry: Partial<VideoEntry>; files: FolderFile[] } {
  const { cues = [], chapters = [], poster }: MediaDetail = media?.draftDetail ?? media?.detail ?? {};
  const film = withFilms && media?.state === 'ready' ? media.files['video'] : undefined;
  const files: FolderFile[] = [];
  if (film !== undefined) files.push({ name: `${stem}.mp4`, content: film });
  if (cues.length > 0) files.push({ name: `${stem}.vtt`, content: captionsToVtt(cues) });
  return {
    files,
    entry: {
      ...(film !== undefined && { film: `${stem}.mp4` }),
      ...(cues.length > 0 && { captions: `${stem}.vtt` }),
      ...(chapters.length > 0 && { chapters: chapters.map(({ atMs, title }) => ({ atMs, title })) }),
      // Other stills than these are not taken anew of a film.
      ...(poster !== undefined && /^still-[1-9]$/.test(poster) && { poster }),
      ...(media?.durationMs != null && { durationMs: media.durationMs }),
    },
  };
}

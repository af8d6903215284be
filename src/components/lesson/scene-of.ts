// Puts a scene together from what a page has fetched: a piece with its plan, the media of the series, the ticks.
import { sizeWords } from '#core/video/limits.ts';
import type { SeriesMediaFile } from '#contracts/media.ts';
import { drawFigure } from '#core/craft/figures/draw-figure.ts';
import { amountFor, type MadeSoFar } from '#core/craft/rest/amount-for.ts';
import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import { formatAmount } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { sceneEntry, type LessonScene, type SceneAmount, type SceneFigure, type ScenePicture, type SceneVideo, type StepForm } from './scene.ts';

export interface SceneSources {
  readonly facts: LessonFacts;
  /** The person's piece, or the pattern piece; absent while a series has none. */
  readonly made?: MadeSoFar;
  readonly units: Units;
  readonly media: readonly SeriesMediaFile[];
  /** Where she stopped in videos, by their names. */
  readonly places?: Readonly<Record<string, { readonly placeMs: number; readonly furthestMs: number }>>;
  readonly ticked: Iterable<string>;
  readonly stepForm?: StepForm;
}

/** The scene of one lesson. What a source does not have is left out of it, and the components say so in its place. */
export function sceneOf(sources: SceneSources): LessonScene {
  const { facts, ticked, stepForm } = sources;
  return {
    amounts: amountsOf(sources),
    figures: figuresOf(sources),
    ...(facts.figures.length > 0 && sources.made !== undefined && { figuresOf: { piece: sources.made.piece, plan: sources.made.plan, units: sources.units } }),
    pictures: entries(namesOf(facts, 'picture'), (name) => pictureOf(mediaNamed(sources, 'picture', name))),
    videos: entries(namesOf(facts, 'video'), (name) => videoOf(mediaNamed(sources, 'video', name), sceneEntry(sources.places ?? {}, name))),
    ticked: new Set(ticked),
    ...(stepForm === undefined ? {} : { stepForm }),
  };
}

function amountsOf({ facts, made, units }: SceneSources): Record<string, SceneAmount> {
  if (made === undefined) return {};
  return entries(facts.amounts, (key) => {
    const amount = amountFor(key, made);
    if (!amount.ok) return undefined;
    const { label, howReckoned } = amount.value;
    const inputs = howReckoned.inputs.map(({ name, value }) => ({ name, parts: formatAmount(value, units) }));
    return { label, parts: formatAmount(amount.value, units), how: { ...howReckoned, inputs } };
  });
}

function figuresOf({ facts, made, units }: SceneSources): Record<string, SceneFigure> {
  if (made === undefined) return {};
  return entries(facts.figures, (kind) => ({ svg: drawFigure(kind, { piece: made.piece, plan: made.plan, units }) }));
}

function entries<T, K extends string>(names: readonly K[], find: (name: K) => T | undefined): Record<string, T> {
  return Object.fromEntries(
    names.flatMap((name): [string, T][] => {
      const found = find(name);
      return found === undefined ? [] : [[name, found]];
    }),
  );
}

function namesOf(facts: LessonFacts, kind: 'picture' | 'video'): string[] {
  return facts.media.filter((entry) => entry.kind === kind).map(({ name }) => name);
}

function mediaNamed({ media }: SceneSources, kind: 'picture' | 'video', name: string): SeriesMediaFile | undefined {
  return media.find((one) => one.kind === kind && one.name === name);
}

function pictureOf(media: SeriesMediaFile | undefined): ScenePicture | undefined {
  const large = media?.files['large'];
  if (media === undefined || large?.width === undefined || large.height === undefined) return undefined;
  return { src: addressOf(media, 'large'), width: large.width, height: large.height };
}

function videoOf(media: SeriesMediaFile | undefined, place: SceneVideo['place']): SceneVideo | undefined {
  const video = media?.files['video'];
  if (media === undefined || video === undefined) return undefined;
  const small = media.files['small'];
  const { poster = 'poster', cues = [], chapters = [] } = media.detail;
  return {
    title: media.title,
    src: addressOf(media, 'video'),
    type: video.contentType,
    durationMs: media.durationMs ?? 0,
    ...(small === undefined ? {} : { small: { src: addressOf(media, 'small'), says: `${sizeWords(small.byteCount)} instead of ${sizeWords(video.byteCount)}` } }),
    ...(media.files[poster] === undefined ? {} : { poster: addressOf(media, poster) }),
    ...(cues.length === 0 ? {} : { captions: addressOf(media, media.isDraft ? 'captions-draft' : 'captions') }),
    chapters,
    cues,
    ...(place === undefined ? {} : { place }),
  };
}

function addressOf(media: SeriesMediaFile, file: string): string {
  return `/media/${media.publicId}/${file}`;
}

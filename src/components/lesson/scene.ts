// Everything a lesson's text needs to be drawn besides its words: amounts in a person's own units, figures drawn with
// her piece, addresses of media, what she has ticked. The page gathers it; drawing itself asks nobody.
import type { Chapter, Cue } from '#contracts/media.ts';
import type { AnyFigureInput } from '#core/craft/figures/figures.ts';
import type { Trust } from '#core/craft/trust.ts';
import type { AmountPart } from '#core/units/format-amount.ts';

export interface SceneAmount {
  /** What it is, in words: `Warp ends`. */
  readonly label: string;
  readonly parts: readonly AmountPart[];
  /** How it was reckoned: in words and signs, what went into it, by whose rule, and how sure that is. */
  readonly how: {
    readonly formula: string;
    readonly inputs: readonly { readonly name: string; readonly parts: readonly AmountPart[] }[];
    readonly source: string;
    readonly trust: Trust;
  };
}

export interface SceneFigure {
  /** A drawing of our own making, as SVG markup. */
  readonly svg: string;
}

export interface ScenePicture {
  readonly src: string;
  readonly width: number;
  readonly height: number;
}

export interface SceneVideo {
  readonly title: string;
  readonly src: string;
  /** The same film for slow lines, and how much smaller it is. */
  readonly small?: { readonly src: string; readonly says: string };
  /** Content type of the file, such as `video/mp4`. */
  readonly type: string;
  readonly durationMs: number;
  readonly poster?: string;
  /** Address of the captions as WebVTT. */
  readonly captions?: string;
  readonly chapters: readonly Chapter[];
  readonly cues: readonly Cue[];
  /** Where she stopped, and how far she ever was. */
  readonly place?: { readonly placeMs: number; readonly furthestMs: number };
}

/** Where a tick is sent; without it (a preview, a draft) steps are drawn without a box to tick. */
export interface StepForm {
  /** Address the form is posted to. */
  readonly action: string;
  /** Slug of the series and public id of the lesson. */
  readonly series: string;
  readonly lesson: string;
}

export interface LessonScene {
  /** By the amount's key. */
  readonly amounts: Readonly<Record<string, SceneAmount>>;
  /** By kind. */
  readonly figures: Readonly<Record<string, SceneFigure>>;
  /** What the figures are drawn from, to draw them step by step; absent where there are none. */
  readonly figuresOf?: AnyFigureInput;
  /** By the name in the series. */
  readonly pictures: Readonly<Record<string, ScenePicture>>;
  readonly videos: Readonly<Record<string, SceneVideo>>;
  /** Ids of the steps that are done. */
  readonly ticked: ReadonlySet<string>;
  readonly stepForm?: StepForm;
}

/** The entry of a scene by name; inherited names find nothing. */
export function sceneEntry<T>(entries: Readonly<Record<string, T>>, name: string | undefined): T | undefined {
  return name !== undefined && Object.hasOwn(entries, name) ? entries[name] : undefined;
}

/** Element id of the note that says how an amount was reckoned. */
export function amountNoteId(key: string): string {
  return `how-${key.replaceAll('.', '_')}`;
}

/** The first step that is not done yet, if steps can be ticked. */
export function stepInHand(stepIds: readonly string[], scene: LessonScene): string | undefined {
  return scene.stepForm === undefined ? undefined : stepIds.find((id) => !scene.ticked.has(id));
}

/** A short video told in scenes: what is drawn, how far the movement goes, how long it takes, and what is said. */
import { cuesFor, type Chapter, type Cue } from '#core/captions/cues.ts';
import type { FigureKind } from '#core/craft/figures/figure-kinds.ts';

/** What a scene shows: a technique between two moments of its movement, or the piece as it grows. */
export type Picture =
  | { readonly figure: FigureKind; readonly cloth?: never }
  | { readonly cloth: 'loom' | 'hanging'; readonly figure?: never };

export type Scene = Picture & {
  readonly from: number;
  readonly to: number;
  readonly seconds: number;
  readonly caption: string;
  /** Title of the chapter that begins with this scene. */
  readonly chapter?: string | undefined;
};

export interface Storyboard {
  readonly title: string;
  readonly scenes: readonly Scene[];
}

export interface TimedScene {
  readonly scene: Scene;
  readonly fromMs: number;
  readonly toMs: number;
  /** Title of the chapter it belongs to. */
  readonly chapter: string;
}

export interface Timing {
  readonly scenes: readonly TimedScene[];
  readonly cues: readonly Cue[];
  readonly chapters: readonly Chapter[];
  readonly durationMs: number;
}

export function timeStoryboard(storyboard: Storyboard): Timing {
  const scenes: TimedScene[] = [];
  const chapters: Chapter[] = [];
  let at = 0;
  let chapter = storyboard.title;
  for (const scene of storyboard.scenes) {
    if (scene.chapter !== undefined) {
      chapter = scene.chapter;
      chapters.push({ atMs: at, title: chapter });
    }
    const to = at + Math.round(scene.seconds * 1000);
    scenes.push({ scene, fromMs: at, toMs: to, chapter });
    at = to;
  }
  const cues = scenes.flatMap(({ scene, fromMs, toMs }) => cuesFor(scene.caption, fromMs, toMs));
  return { scenes, cues, chapters, durationMs: at };
}

/** Hands move for the greater part of a scene and then rest, so that the eye can take in what they made. */
const MOVING_SHARE = 0.6;

/** How far the movement of a scene has come at a moment, between the scene's `from` and `to`. */
export function progressAt({ scene, fromMs, toMs }: TimedScene, atMs: number): number {
  const share = (atMs - fromMs) / Math.max(1, (toMs - fromMs) * MOVING_SHARE);
  return scene.from + (scene.to - scene.from) * Math.max(0, Math.min(1, share));
}

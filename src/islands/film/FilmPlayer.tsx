import { useEffect, useMemo, useRef, useState, type KeyboardEvent, type MouseEvent } from 'react';
import type { Chapter, Cue } from '#contracts/media.ts';
import type { KeepPlaceInput } from '#contracts/video.ts';
import { clockTime } from '#core/captions/clock-time.ts';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { ChapterStrip } from './ChapterStrip.tsx';
import { stretchAt, stretchesOf, watchedWords } from './stretches.ts';
import { Transcript } from './Transcript.tsx';
import { useFilm } from './use-film.ts';
import { useFilmSize } from './use-film-size.ts';
import { sendPlace, useKeptPlace, type SendPlace } from './use-kept-place.ts';

interface FilmPlayerProps {
  title: string;
  src: string;
  type: string;
  durationMs: number;
  /** The same film for slow lines; `says`: `12 MB instead of 48 MB`. */
  small?: { readonly src: string; readonly says: string } | undefined;
  poster?: string | undefined;
  captions?: string | undefined;
  chapters: readonly Chapter[];
  cues: readonly Cue[];
  /** Where she stopped, and how far she ever was. */
  place?: { readonly placeMs: number; readonly furthestMs: number } | undefined;
  /** For whom the place is kept; null without a seat. */
  keep: Omit<KeepPlaceInput, 'placeMs'> | null;
  send?: SendPlace;
}

const RATES = [0.75, 1, 1.25, 1.5] as const;
const STEP_MS = 5_000;
/** Nearer to either end than this, she begins at the beginning. */
const EDGE_MS = 5_000;

/**
 * A film with its chapters and words. As it comes from the server it is the browser's own player, with captions, chapters
 * as links and the transcript; once alive it has the strip, keeps the place, and its chapters and words jump within it.
 */
export function FilmPlayer({ title, src, type, durationMs, small, poster, captions, chapters, cues, place, keep, send = sendPlace }: FilmPlayerProps) {
  const figure = useRef<HTMLElement>(null);
  const element = useRef<HTMLVideoElement>(null);
  const [live, setLive] = useState(false);
  useEffect(() => setLive(true), []);
  const film = useFilm(element, place?.furthestMs ?? 0);
  useKeptPlace(film, keep, send);
  const size = useFilmSize(element, small !== undefined);
  const [hasBegun, setBegun] = useState(false);
  const stretches = useMemo(() => stretchesOf(chapters, durationMs, film.furthestMs), [chapters, durationMs, film.furthestMs]);
  const here = stretchAt(stretches, film.atMs);
  const from = place !== undefined && place.placeMs > EDGE_MS && place.placeMs < durationMs - EDGE_MS ? place.placeMs : 0;

  const begin = (ms: number): void => {
    setBegun(true);
    film.jump(ms);
    film.play();
    element.current?.focus();
  };
  const toggle = (): void => { setBegun(true); if (film.isPlaying) film.pause(); else film.play(); };
  const fill = (): void => { void (document.fullscreenElement === null ? figure.current?.requestFullscreen() : document.exitFullscreen())?.catch(() => undefined); };
  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const isControl = event.target instanceof HTMLButtonElement || event.target instanceof HTMLInputElement;
    const act = { ' ': isControl ? undefined : toggle, ArrowLeft: () => film.jump(Math.max(0, film.atMs - STEP_MS)), ArrowRight: () => film.jump(Math.min(durationMs, film.atMs + STEP_MS)), c: () => film.showCaptions(!film.hasCaptions), f: fill }[event.key];
    if (act === undefined) return;
    event.preventDefault();
    act();
  };
  const onChapter = (ms: number) => (event: MouseEvent): void => {
    if (!live || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    begin(ms);
  };
  const nextRate = RATES[(RATES.findIndex((rate) => rate === film.rate) + 1) % RATES.length] ?? 1;
  return (
    <>
      <figure ref={figure} className="video bleeds" aria-label={`Video: ${title}`} onKeyDown={live ? onKeyDown : undefined}>
        <div className="still">
          <video ref={element} controls={!live} preload="metadata" playsInline poster={poster} tabIndex={live ? 0 : undefined} aria-label={title} onClick={live ? toggle : undefined}>
            <source src={small !== undefined && size.isSmall ? small.src : src} type={type} />
            {captions !== undefined && <track kind="captions" src={captions} srcLang="en" label="Captions" default />}
          </video>
          {live && !hasBegun && <button type="button" className="start" onClick={() => begin(from)}><Glyph name="play" />{from === 0 ? 'Play' : `Go on at ${clockTime(from)}`}</button>}
        </div>
        {live && (
          <>
            <ChapterStrip title={title} stretches={stretches} durationMs={durationMs} atMs={film.atMs} onJump={(ms) => { setBegun(true); film.jump(ms); }} />
            <div className="bar">
              <button type="button" aria-label={film.isPlaying ? 'Pause' : 'Play'} onClick={toggle}><Glyph name={film.isPlaying ? 'pause' : 'play'} /></button>
              <span className="time">{clockTime(film.atMs)} of {clockTime(durationMs)}<span className="hide">, {watchedWords(stretches)}</span></span>
              {captions !== undefined && <button type="button" aria-label="Captions" aria-pressed={film.hasCaptions} aria-keyshortcuts="c" onClick={() => film.showCaptions(!film.hasCaptions)}><Glyph name="captions" /></button>}
              <button type="button" aria-label={`Speed ${film.rate}, make it ${nextRate}`} onClick={() => film.setRate(nextRate)}>{film.rate}×</button>
              {small !== undefined && <button type="button" aria-label={`Small film for slow lines, ${small.says}`} aria-pressed={size.isSmall} onClick={size.toggle}>Small</button>}
              <button type="button" aria-label="Fill the screen" aria-keyshortcuts="f" onClick={fill}><Glyph name="full" /></button>
            </div>
          </>
        )}
      </figure>
      {!live && small !== undefined && <p className="small"><a href={small.src}>Small film for slow lines</a>, {small.says}</p>}
      {chapters.length > 1 && (
        <ol className="chapter-list" role="list" aria-label="Chapters">
          {chapters.map(({ atMs, title: name }, at) => <li key={atMs}><a href={`${src}#t=${String(Math.floor(atMs / 1_000))}`} aria-current={live && hasBegun && at === here ? 'true' : undefined} onClick={onChapter(atMs)}>{clockTime(atMs)}<span>{name}</span></a></li>)}
        </ol>
      )}
      {cues.length > 0 && <Transcript cues={cues} chapters={chapters} atMs={live ? film.atMs : null} isPlaying={film.isPlaying} onJump={begin} />}
    </>
  );
}

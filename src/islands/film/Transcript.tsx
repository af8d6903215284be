import { useEffect, useRef, useState } from 'react';
import type { Chapter, Cue } from '#contracts/media.ts';
import { clockTime } from '#core/captions/clock-time.ts';
import { cueAt, transcriptOf } from '#core/captions/transcript.ts';

interface TranscriptProps {
  cues: readonly Cue[];
  chapters: readonly Chapter[];
  /** Where the film stands; null before the script is there. */
  atMs: number | null;
  isPlaying: boolean;
  onJump: (ms: number) => void;
}

/** The spoken words: to read, to search, and to jump by. Follows the film while it plays. */
export function Transcript({ cues, chapters, atMs, isPlaying, onJump }: TranscriptProps) {
  const [sought, setSought] = useState('');
  const words = useRef<HTMLDivElement>(null);
  const here = atMs === null ? -1 : cueAt(cues, atMs);
  const wanted = sought.trim().toLowerCase();
  const fits = (cue: Cue): boolean => wanted === '' || cue.words.toLowerCase().includes(wanted);
  const found = wanted === '' ? 0 : cues.filter(fits).length;

  useEffect(() => {
    const box = words.current;
    const line = box?.querySelector<HTMLElement>('[aria-current]');
    if (!isPlaying || wanted !== '' || box === null || line == null) return;
    // Only within its own box: the page stays where it is read.
    box.scrollTop = line.offsetTop - box.offsetTop - box.clientHeight / 3;
  }, [here, isPlaying, wanted]);

  return (
    <details className="transcript">
      <summary>The spoken words</summary>
      {atMs !== null && (
        <p className="transcript-search">
          <label htmlFor="transcript-search">Find a word</label>
          <input id="transcript-search" type="search" value={sought} onChange={(event) => setSought(event.currentTarget.value)} />
          <span className="small quiet" role="status">{wanted === '' ? '' : found === 0 ? 'It is not said.' : `${found} ${found === 1 ? 'line' : 'lines'}`}</span>
        </p>
      )}
      <div ref={words} className="transcript-words" tabIndex={0} role="region" aria-label="The spoken words">
        {transcriptOf(cues, chapters).map((stretch) => {
          const lines = stretch.cues.filter(fits);
          return lines.length === 0 ? null : (
            <section key={stretch.atMs}>
              {stretch.title !== null && <h3 className="h4">{stretch.title}</h3>}
              <p>
                {lines.map((cue) => (atMs === null
                  ? <span key={cue.fromMs}>{cue.words} </span>
                  : <span key={cue.fromMs}><button type="button" aria-current={(isPlaying || atMs > 0) && cues[here] === cue ? 'true' : undefined} title={clockTime(cue.fromMs)} onClick={() => onJump(cue.fromMs)}>{cue.words}</button> </span>))}
              </p>
            </section>
          );
        })}
      </div>
    </details>
  );
}

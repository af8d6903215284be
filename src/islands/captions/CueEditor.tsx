import { useCallback, useEffect, useRef, useState, type KeyboardEvent } from 'react';
import type { Cue } from '#core/captions/cues.ts';
import { cueAt } from '#core/captions/transcript.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Notice } from '#islands/ui/Notice.tsx';
import { CueRow } from './CueRow.tsx';
import { isUnsaved, type CueEditing } from './cue-editing.ts';
import { ShiftAll } from './ShiftAll.tsx';
import { postCues, useCues, type KeepCues } from './use-cues.ts';

interface CueEditorProps {
  video: string;
  src: string;
  poster?: string | undefined;
  title: string;
  durationMs: number;
  revision: number;
  cues: readonly Cue[];
  keep?: KeepCues;
}

/** Writing captions beside the film: write a line, mark where it begins and ends while it plays. Kept by itself. */
export function CueEditor({ video, src, poster, title, durationMs, revision, cues, keep = postCues }: CueEditorProps) {
  const { state, faults, tell, save } = useCues(video, cues, revision, durationMs, keep);
  const film = useRef<HTMLVideoElement>(null);
  const list = useRef<HTMLOListElement>(null);
  const [playing, setPlaying] = useState(-1);
  const place = useCallback((): number => Math.round((film.current?.currentTime ?? 0) * 1_000), []);
  const jump = useCallback((ms: number): void => { if (film.current !== null) film.current.currentTime = ms / 1_000; }, []);
  const { inHand, nextKey } = state;

  // A line that was just put in takes the words at once.
  const seen = useRef(nextKey);
  useEffect(() => {
    if (nextKey === seen.current) return;
    seen.current = nextKey;
    list.current?.querySelector<HTMLTextAreaElement>(`[data-key="${String(nextKey - 1)}"] textarea`)?.focus();
  }, [nextKey]);

  const add = (): void => tell({ kind: 'add', atMs: place() });
  const onKeyDown = (event: KeyboardEvent): void => {
    const isWriting = event.target instanceof HTMLTextAreaElement || event.target instanceof HTMLInputElement;
    if (event.ctrlKey || event.metaKey) return;
    if (event.key === 'Enter' && event.target instanceof HTMLTextAreaElement && !event.shiftKey) add();
    else if (isWriting && !event.altKey) return;
    else if (event.code === 'BracketLeft' || event.key === '[') tell({ kind: 'mark-in', atMs: place() });
    else if (event.code === 'BracketRight' || event.key === ']') tell({ kind: 'mark-out', atMs: place() });
    else return;
    event.preventDefault();
  };
  return (
    // The keys work from anywhere within; each has a button too.
    <div className="cue-editor" onKeyDown={onKeyDown}>
      <div className="cue-film">
        <div className="video"><video ref={film} controls playsInline preload="metadata" src={src} poster={poster} aria-label={`Film: ${title}`} onTimeUpdate={() => setPlaying(cueAt(state.lines, place()))} /></div>
        <p className="row mt-3">
          <Button glyph="plus" onClick={add}>Write a line here</Button>
          <Button aria-keyshortcuts="[" onClick={() => tell({ kind: 'mark-in', atMs: place() })}>It begins here <kbd>[</kbd></Button>
          <Button aria-keyshortcuts="]" onClick={() => tell({ kind: 'mark-out', atMs: place() })}>It ends here <kbd>]</kbd></Button>
        </p>
        <p className="row mt-2">
          <Button small glyph="undo" off={state.before.length === 0 ? 'Nothing was changed yet.' : undefined} onClick={() => tell({ kind: 'undo' })}>Undo</Button>
          <ShiftAll onShift={(byMs) => tell({ kind: 'shift', byMs })} />
        </p>
        <p className="small quiet mt-2" role="status">{standing(state, faults.size)}</p>
        {state.trouble !== null && <p className="small mt-1"><Button small onClick={save}>Save now</Button></p>}
        {state.behind !== null && (
          <Notice kind="mend" title="Another window saved captions in the meantime">
            <p>It keeps {state.behind.cues.length} lines, here are {state.lines.length}. Nothing of yours is lost: keep yours, or take the others.</p>
            <p className="row mt-2"><Button onClick={() => tell({ kind: 'keep-mine' })}>Keep mine</Button><Button kind="quiet" onClick={() => tell({ kind: 'take-theirs' })}>Take the others</Button></p>
          </Notice>
        )}
        <details className="mt-3 small"><summary>Keys</summary><p><kbd>[</kbd> and <kbd>]</kbd> mark where the line in hand, or the one that plays, begins and ends; with <kbd>Alt</kbd> also while you write. <kbd>Enter</kbd> in a line begins the next one at the place that plays.</p></details>
      </div>
      <ol ref={list} className="cue-list" role="list" aria-label="Lines of the captions">
        {state.lines.map((line, at) => <CueRow key={line.key} line={line} fault={faults.get(line.key)} isInHand={line.key === inHand} isPlaying={at === playing} tell={tell} jump={jump} />)}
        {state.lines.length === 0 && <li className="quiet">No line yet. Play the film, and write the first one where somebody begins to speak.</li>}
      </ol>
    </div>
  );
}

function standing(state: CueEditing, faults: number): string {
  if (state.trouble !== null) return state.trouble;
  if (faults > 0) return faults === 1 ? 'One line cannot stand as it is. It is saved once you mend it.' : `${faults} lines cannot stand as they are. They are saved once you mend them.`;
  if (state.isSaving) return 'Saving';
  if (isUnsaved(state)) return 'Not saved yet';
  return state.savedAt === null ? 'Students see changes after you publish.' : `Saved ${state.savedAt}. Students see it after you publish.`;
}

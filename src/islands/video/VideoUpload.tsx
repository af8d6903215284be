import { useEffect, useRef, useState, type DragEvent } from 'react';
import type { VideoOnItsWay } from '#contracts/video.ts';
import { sizeWords, VIDEO_ACCEPT, VIDEO_KINDS_WORDS } from '#core/video/limits.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Throw } from '#islands/ui/Throw.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import { startUppyVideoUpload } from './uppy-video-uploader.ts';
import { useVideoUpload } from './use-video-upload.ts';
import type { VideoUploadState } from './video-upload-state.ts';
import type { StartVideoUpload } from './video-uploader.ts';

interface VideoUploadProps {
  lesson: string;
  /** The video it shall replace; null for a new one. */
  name: string | null;
  unfinished: readonly VideoOnItsWay[];
  start?: StartVideoUpload;
  /** Shows what the server has now. */
  onSent?: () => void;
}

const showPage = (): void => { window.location.reload(); };

/** Sending a video in pieces: it can be paused, goes on by itself when the line drops, and after the page was closed. */
export function VideoUpload({ lesson, name, unfinished, start = startUppyVideoUpload, onSent = showPage }: VideoUploadProps) {
  const [live, setLive] = useState(false);
  useEffect(() => setLive(true), []);
  const { state, choose, pause, goOn, stop } = useVideoUpload(start, { lesson, name }, unfinished);
  const isSent = state.at === 'sent';
  useEffect(() => {
    if (isSent) onSent();
  }, [isSent, onSent]);
  if (!live) return <p className="quiet">Sending a video needs scripts in your browser, since it comes in pieces that can go on after the line drops. Turn them on for this page, or open it in another browser.</p>;
  const [first] = unfinished;
  return (
    <div className="upload">
      {state.at === 'choosing' ? (
        <>
          {first !== undefined && <p className="mb-3"><b className="shot-name">{first.fileName}</b>: {sizeWords(first.arrivedBytes)} of {sizeWords(first.byteCount)} are here. Choose the same file again, and it goes on from there.</p>}
          <DropVideo onVideo={choose} again={first !== undefined} />
          {state.fault !== undefined && <div role="alert"><Wrong id="video-wrong" says={state.fault} /></div>}
        </>
      ) : (
        <div className="film-sent">
          <p><b className="shot-name">{state.file.name}</b> <span className="small quiet num">{sentWords(state)}</span></p>
          {state.at !== 'sent' && <Throw label={state.file.name} done={state.sent / state.file.size} />}
          <p className="small quiet" role="status">{wordsOf(state)}</p>
          {state.at !== 'sent' && (
            <p className="row mt-2">
              {state.at === 'paused' ? <Button glyph="play" onClick={goOn}>Go on</Button> : <Button glyph="pause" onClick={pause}>Pause</Button>}
              <Button kind="quiet" glyph="close" onClick={stop}>Stop and take it back</Button>
            </p>
          )}
        </div>
      )}
    </div>
  );
}

function DropVideo({ onVideo, again }: { onVideo: (file: File | undefined) => void; again: boolean }) {
  const chooser = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  const onDrop = (event: DragEvent): void => {
    event.preventDefault();
    setOver(false);
    onVideo(event.dataTransfer.files[0]);
  };
  return (
    <div className={over ? 'drop over' : 'drop'} onDragOver={(event) => { event.preventDefault(); setOver(true); }} onDragLeave={() => setOver(false)} onDrop={onDrop}>
      <input ref={chooser} type="file" accept={VIDEO_ACCEPT} className="hide" tabIndex={-1} aria-hidden onChange={(event) => { onVideo(event.currentTarget.files?.[0]); event.currentTarget.value = ''; }} data-testid="video-chooser" />
      <p className="row">
        <Button glyph="play" onClick={() => chooser.current?.click()}>{again ? 'Choose the file again' : 'Choose a video'}</Button>
        <span className="small quiet by-mouse">or drop it here</span>
      </p>
      <p className="small quiet mt-2">{VIDEO_KINDS_WORDS}. Place and time in the file are taken out.</p>
    </div>
  );
}

function sentWords(state: Exclude<VideoUploadState, { at: 'choosing' }>): string {
  return state.at === 'sent' ? sizeWords(state.file.size) : `${sizeWords(Math.min(state.sent, state.file.size))} of ${sizeWords(state.file.size)}`;
}

function wordsOf(state: Exclude<VideoUploadState, { at: 'choosing' }>): string {
  switch (state.at) {
    case 'sending':
      return 'It goes on by itself if the line drops. Keep this page open.';
    case 'paused':
      return 'Paused. What has come stays here for a week.';
    case 'waiting':
      return `Waits for signal. The line dropped at ${sizeWords(state.sent)}. It goes on by itself.`;
    case 'sent':
      return 'All of it is here.';
  }
}

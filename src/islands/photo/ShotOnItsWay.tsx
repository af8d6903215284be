import { useEffect, useState } from 'react';
import { IconButton } from '#islands/ui/Button.tsx';
import { Throw } from '#islands/ui/Throw.tsx';
import { megabytes, sentOf } from './photo-rules.ts';
import type { UploadState } from './upload-state.ts';

type WithFile = Extract<UploadState, { file: File }>;

interface ShotProps {
  state: WithFile;
  teacher: string;
  answerWords: string;
  onStop: () => void;
}

/** The photo in hand: how it looks, and how far it has come. */
export function ShotOnItsWay({ state, teacher, answerWords, onStop }: ShotProps) {
  const { file } = state;
  const src = useObjectUrl(file);
  const moving = state.at === 'sending' || state.at === 'waiting';
  return (
    <div className="shot">
      <div className="thumb">{src !== undefined && <img src={src} alt="" />}</div>
      <div>
        <p><b className="shot-name">{file.name}</b> <span className="small quiet num">{moving ? sentOf(state.sent, file.size) : megabytes(file.size)}</span></p>
        {moving && <Throw label={file.name} done={state.sent / file.size} />}
        <p className="small quiet" role="status">{wordsOf(state, teacher, answerWords)}</p>
      </div>
      {moving && <IconButton glyph="close" label="Stop sending this photo" onClick={onStop} />}
    </div>
  );
}

function wordsOf(state: WithFile, teacher: string, answerWords: string): string {
  switch (state.at) {
    case 'chosen':
      return 'Not sent yet.';
    case 'sending':
      return 'It goes on by itself if the line drops.';
    case 'waiting':
      return `Waits for signal. The line dropped at ${sentOf(state.sent, state.file.size)}. It is sent again by itself.`;
    case 'sent':
      return `${teacher} has your photo. ${answerWords}`;
  }
}

/** An address for a file on the device, given back when it is no longer shown. */
function useObjectUrl(file: File): string | undefined {
  const [url, setUrl] = useState<string>();
  useEffect(() => {
    const made = URL.createObjectURL(file);
    setUrl(made);
    return () => URL.revokeObjectURL(made);
  }, [file]);
  return url;
}

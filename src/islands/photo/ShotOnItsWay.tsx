import { useEffect, useState } from 'react';
import { Button, IconButton } from '#islands/ui/Button.tsx';
import { Throw } from '#islands/ui/Throw.tsx';
import { CutPhoto } from './CutPhoto.tsx';
import { megabytes, sentOf } from './photo-rules.ts';
import type { Shot } from './showing.ts';

interface ShotProps {
  shot: Shot;
  /** On its way to the server, or waiting for signal. */
  moving: boolean;
  onCut: (file: File) => void;
  onPutAway: () => void;
}

/** One photo in hand: how it looks, how far it has come, and what can still be done to it. */
export function ShotOnItsWay({ shot: { file, sent, isThere }, moving, onCut, onPutAway }: ShotProps) {
  const [cutting, setCutting] = useState(false);
  const src = useObjectUrl(file);
  return (
    <li className="shot">
      <div className="thumb">{src !== undefined && <img src={src} alt="" />}</div>
      <div>
        <p><b className="shot-name">{file.name}</b> <span className="small quiet num">{moving && !isThere ? sentOf(sent, file.size) : megabytes(file.size)}</span></p>
        {moving && <Throw label={file.name} done={isThere ? 1 : sent / file.size} />}
        {!moving && <p><Button small kind="quiet" glyph="scissors" onClick={() => setCutting(true)}>Cut and turn<span className="hide"> {file.name}</span></Button></p>}
      </div>
      {!moving && <IconButton glyph="close" label={`Put ${file.name} away`} onClick={onPutAway} />}
      {cutting && <CutPhoto file={file} onDone={(cut) => { setCutting(false); if (cut !== undefined) onCut(cut); }} />}
    </li>
  );
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

import { Button } from '#islands/ui/Button.tsx';
import { Notice } from '#islands/ui/Notice.tsx';

interface OtherTextProps {
  /** What the other window kept. */
  source: string;
  onKeep: () => void;
  onTake: (source: string) => void;
}

/** Two windows wrote the same part: both texts are here, and the writer says which goes on. */
export function OtherText({ source, onKeep, onTake }: OtherTextProps) {
  return (
    <Notice kind="mend" title="Another window saved this text in the meantime" urgent>
      <p>Yours still stands in the field. Keep yours, or take the other; the field’s undo brings the first back, and the other stays among the versions.</p>
      <details className="mt-2"><summary>Read the other text</summary><pre className="other-text" tabIndex={0}>{source}</pre></details>
      <p className="row mt-3"><Button onClick={onKeep}>Keep mine</Button><Button onClick={() => onTake(source)}>Take the other</Button></p>
    </Notice>
  );
}

import { useEffect, useState } from 'react';
import { Button } from '#islands/ui/Button.tsx';

interface ShareListProps {
  title: string;
  /** Made when it is asked for: it tells the ticks of that moment. */
  textNow: () => string;
  /** The same as a page of plain text, for where nothing runs. */
  address: string;
}

/** Sends the list as text by whatever the device has for it, else copies it. */
export function ShareList({ title, textNow, address }: ShareListProps) {
  const [way, setWay] = useState<'none' | 'share' | 'copy'>('none');
  const [said, setSaid] = useState('');
  useEffect(() => { setWay('share' in navigator ? 'share' : 'copy'); }, []);
  const copy = async (): Promise<void> => {
    try {
      await navigator.clipboard.writeText(textNow());
      setSaid('The list is copied.');
    } catch {
      setSaid('This browser lets nothing be copied by a button. Open it as text and copy it there.');
    }
  };
  const share = async (): Promise<void> => {
    try {
      await navigator.share({ title, text: textNow() });
    } catch (error) {
      // Closed again by herself: nothing to say.
      if (!(error instanceof DOMException && error.name === 'AbortError')) await copy();
    }
  };
  return (
    <div className="share-list">
      <p className="row">
        {way === 'share' && <Button small onClick={() => { void share(); }}>Share as text</Button>}
        {way === 'copy' && <Button small glyph="copy" onClick={() => { void copy(); }}>Copy as text</Button>}
        <a className="small" href={address}>Open as text</a>
      </p>
      <p className="small quiet" role="status">{said}</p>
    </div>
  );
}

/** Keeping what was typed: its own address to copy or to send, and paper. */
import { useState } from 'react';
import { Button } from '#islands/ui/Button.tsx';

export function LinkTools({ address, alive }: { address: string; alive: boolean }) {
  const [said, say] = useState<{ readonly of: string; readonly words: string }>();
  const copy = async (): Promise<void> => {
    try {
      await navigator.clipboard.writeText(new URL(address, location.href).href);
      say({ of: address, words: 'Link copied. It brings back what is typed here.' });
    } catch {
      say({ of: address, words: 'This browser lets nothing be copied by a button. Copy the link beside it.' });
    }
  };
  return (
    <div className="row no-print">
      {alive && <Button small onClick={() => { void copy(); }}>Copy link</Button>}
      <a href={address}>Link to what is typed here</a>
      {alive && <Button kind="quiet" small onClick={() => { window.print(); }}>Print</Button>}
      <span role="status" className="small quiet">{said?.of === address ? said.words : ''}</span>
    </div>
  );
}

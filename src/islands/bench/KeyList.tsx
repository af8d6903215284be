import { useState } from 'react';
import { BENCH_KEYS } from '#islands/bench/bench-keys.ts';
import { Button } from '#islands/ui/Button.tsx';
import { Dialog } from '#islands/ui/Dialog.tsx';
import { setSingleKeys, singleKeysWork } from '#islands/ui/single-keys.ts';

/** Every key of the bench, and whether keys work at all. */
export function KeyList({ open, onClose }: { open: boolean; onClose: () => void }) {
  const [work, setWork] = useState(singleKeysWork);
  return (
    <Dialog open={open} title="Keys of the bench" onClose={onClose} acts={<Button onClick={onClose}>Close</Button>}>
      <dl className="key-list">
        {BENCH_KEYS.map(({ cap, says }) => <div key={cap}><dt><kbd className="key">{cap}</kbd></dt><dd>{says}</dd></div>)}
        <div><dt><kbd className="key">1</kbd> to <kbd className="key">9</kbd></dt><dd>Put in a phrase</dd></div>
        <div><dt><kbd className="key">Esc</kbd></dt><dd>Leave what you write, so that keys work again</dd></div>
      </dl>
      <label className="check-row">
        <input className="check" type="checkbox" checked={work} onChange={(event) => { setWork(event.target.checked); setSingleKeys(event.target.checked); }} />
        <span>Keys pressed alone work in this browser</span>
      </label>
    </Dialog>
  );
}

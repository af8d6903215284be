import { useEffect, useState } from 'react';
import { Button } from '#islands/ui/Button.tsx';
import { askWorker } from './ask-worker.ts';

type Keeping = 'unknown' | 'not' | 'busy' | 'kept';

/** Keeps every open part of a series on this device, not only what was opened lately. Shown where the browser can. */
export function KeepSeries({ series }: { series: string }) {
  const [keeping, setKeeping] = useState<Keeping>('unknown');
  const [said, setSaid] = useState('');
  useEffect(() => {
    if (!('serviceWorker' in navigator)) return;
    void askWorker({ kind: 'what-is-kept' }).then((answer) => { setKeeping(answer?.slugs.includes(series) === true ? 'kept' : 'not'); });
  }, [series]);
  if (keeping === 'unknown') return null;
  const keep = async (): Promise<void> => {
    setKeeping('busy');
    setSaid('Fetching the parts.');
    // Asked of the browser, which may say no: then it may clear the pages when it runs out of room.
    await navigator.storage.persist().catch(() => false);
    const answer = await askWorker({ kind: 'keep-series', slug: series });
    const isKept = answer?.slugs.includes(series) === true;
    setKeeping(isKept ? 'kept' : 'not');
    setSaid(!isKept ? 'The parts could not be fetched just now. Try again where there is signal.' : answer.missing > 0 ? `${String(answer.missing)} pages are still to come: they are fetched with the next page you open.` : 'All open parts are on this device.');
  };
  const drop = async (): Promise<void> => {
    await askWorker({ kind: 'drop-series', slug: series });
    setKeeping('not');
    setSaid('Taken off this device.');
  };
  return (
    <div className="keep-series">
      <p className="row">
        {keeping === 'kept'
          ? <Button small onClick={() => { void drop(); }}>Take it off this device</Button>
          : <Button small busy={keeping === 'busy'} onClick={() => { void keep(); }}>Keep the whole series on this device</Button>}
      </p>
      <p className="small quiet">Lists, texts, figures and the loom side of all open parts, for where there is no signal; films are not kept. Signing out takes them away.</p>
      <p className="small" role="status">{said}</p>
    </div>
  );
}

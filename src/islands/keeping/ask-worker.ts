import type { KeptSeries, ToWorker } from '#contracts/kept-pages.ts';

/** Asks the service worker; never answers where there is none. Null when it could not do it. */
export async function askWorker(said: ToWorker): Promise<KeptSeries | null> {
  const { active } = await navigator.serviceWorker.ready;
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = ({ data }: MessageEvent<KeptSeries | null>) => { resolve(data); };
    active?.postMessage(said, [port2]);
  });
}

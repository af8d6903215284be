import { useEffect, useState } from 'react';
import type { VideoOnItsWay } from '#contracts/video.ts';
import { isMoving, videoWords } from '#core/video/state-words.ts';
import { Throw } from '#islands/ui/Throw.tsx';

interface WatchVideoProps {
  first: VideoOnItsWay;
  ask?: (video: string) => Promise<VideoOnItsWay | null>;
  /** Shows what the server has now. */
  onReady?: () => void;
}

const ASK_EVERY_MS = 2_000;

async function askServer(video: string): Promise<VideoOnItsWay | null> {
  try {
    const answer = await fetch(`/api/workroom/videos/${video}`);
    return answer.ok ? ((await answer.json()) as VideoOnItsWay) : null;
  } catch {
    return null;
  }
}

const showPage = (): void => { window.location.reload(); };

/** How far a video is on its way to being ready. The page tells the same without script, as of when it was loaded. */
export function WatchVideo({ first, ask = askServer, onReady = showPage }: WatchVideoProps) {
  const [now, setNow] = useState(first);
  const moves = isMoving(now);
  useEffect(() => {
    if (!moves) return;
    const timer = setInterval(() => {
      if (document.visibilityState === 'hidden') return;
      void ask(first.video).then((answer) => { if (answer !== null) setNow(answer); });
    }, ASK_EVERY_MS);
    return () => clearInterval(timer);
  }, [moves, ask, first.video]);
  const isReady = now.state === 'ready';
  useEffect(() => {
    if (isReady) onReady();
  }, [isReady, onReady]);
  return (
    <div className="film-way">
      {now.state === 'processing' && <Throw label={`Making ${now.title} ready`} done={now.permille / 1_000} />}
      <p className="small" role="status">{videoWords(now)}</p>
    </div>
  );
}

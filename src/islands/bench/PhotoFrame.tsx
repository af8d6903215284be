import { useEffect, useRef, type Dispatch, type ReactNode, type SetStateAction } from 'react';
import { useGestures } from '#islands/bench/use-gestures.ts';
import { closer, moved, scaleOf, type Place, type View } from '#islands/bench/view.ts';

export interface Shown {
  src: string;
  width: number;
  height: number;
  alt: string;
}

interface Props {
  photo: Shown;
  view: View;
  look: Dispatch<SetStateAction<View>>;
  /** What a press does; without it, a photo is only looked at. */
  onPress?: (at: Place, by: 'mouse' | 'touch') => void;
  /** What lies on the photo and goes with it. */
  children?: ReactNode;
}

/** A photo in its frame, looked at from as close and turned as `view` says. Two frames of one view show the same part. */
export function PhotoFrame({ photo, view, look, onPress, children }: Props) {
  const frame = useRef<HTMLDivElement>(null);
  const aspect = photo.width / photo.height;
  const isClose = view.zoom > 1;
  const hands = useGestures(frame, {
    press: (at, by) => onPress?.(at, by),
    drag: (dx, dy) => look((before) => moved(before, aspect, dx, dy)),
    pinch: (factor, at) => look((before) => closer(before, aspect, factor, at)),
    isClose,
  });
  // Set from script: the content policy takes no style in the page's text.
  useEffect(() => {
    const style = frame.current?.style;
    style?.setProperty('--scale', String(scaleOf(view, aspect)));
    style?.setProperty('--turn', `${view.turns * 90}deg`);
    style?.setProperty('--shift-x', `${view.x * 100}%`);
    style?.setProperty('--shift-y', `${view.y * 100}%`);
  }, [view, aspect]);
  const classes = ['photo photo-frame', onPress && 'pins-can-be-set', isClose && 'is-close'].filter(Boolean).join(' ');
  return (
    <div ref={frame} className={classes} {...hands}>
      <div className="photo-sheet">
        <img src={photo.src} alt={photo.alt} width={photo.width} height={photo.height} draggable={false} />
        {children}
      </div>
    </div>
  );
}

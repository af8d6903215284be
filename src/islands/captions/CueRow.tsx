import { memo } from 'react';
import { clockTime } from '#core/captions/clock-time.ts';
import { IconButton } from '#islands/ui/Button.tsx';
import { Wrong } from '#islands/ui/Wrong.tsx';
import type { CueEvent, EditLine } from './cue-editing.ts';

interface CueRowProps {
  line: EditLine;
  fault: string | undefined;
  isInHand: boolean;
  isPlaying: boolean;
  tell: (event: CueEvent) => void;
  jump: (ms: number) => void;
}

/** `1:02.5`: near enough to see what a mark changed. */
const tenths = (ms: number): string => `${clockTime(ms)}.${Math.floor((ms % 1_000) / 100)}`;

/** One line of captions. Thousands of them may stand in a list, so one is drawn anew only when it changes. */
export const CueRow = memo(function CueRow({ line: { key, fromMs, toMs, words }, fault, isInHand, isPlaying, tell, jump }: CueRowProps) {
  const id = `cue-${key}`;
  return (
    <li data-key={key} className={isInHand ? 'in-hand' : undefined} aria-current={isPlaying || undefined}>
      <button type="button" className="cue-time" onClick={() => { tell({ kind: 'choose', key }); jump(fromMs); }}>
        <span><span className="hide">Play from </span>{tenths(fromMs)}</span><span className="quiet"><span className="hide"> to </span>{tenths(toMs)}</span>
      </button>
      <textarea id={id} rows={2} value={words} maxLength={500} aria-label={`Words from ${tenths(fromMs)} to ${tenths(toMs)}`} aria-invalid={fault !== undefined || undefined} aria-describedby={fault === undefined ? undefined : `${id}-wrong`} onFocus={() => tell({ kind: 'choose', key })} onChange={(event) => tell({ kind: 'write', key, words: event.currentTarget.value })} />
      <IconButton glyph="takeOut" small label={`Take out the line at ${tenths(fromMs)}`} onClick={() => tell({ kind: 'take-out', key })} />
      {fault !== undefined && <Wrong id={`${id}-wrong`} says={fault} />}
    </li>
  );
});

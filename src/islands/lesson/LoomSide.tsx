import { useCallback, useEffect, useState } from 'react';
import { Glyph } from '#islands/ui/Glyph.tsx';
import { hasOwnKeys, pressesByItself } from './own-keys.ts';
import { showStep, stepAsked, stepShown, wordsOfStep } from './side-steps.ts';
import { useScreenAwake, type Awake } from './use-screen-awake.ts';
import { useSwipe } from './use-swipe.ts';
import { canSpeak, hush, say, switchVoice } from './voice.ts';

const TOLD: Readonly<Record<Awake, string>> = {
  asked: '',
  awake: '',
  refused: 'The screen may go dark: the device would not keep it awake just now.',
  never: 'This browser cannot keep the screen awake. Let it stay on longer in the settings of your device.',
};

/**
 * Turns the steps in place, by keys, swipes and the space bar, so that the full screen, the voice and the light stay on;
 * says them aloud when it is asked to. Draws the few buttons for that.
 */
export function LoomSide() {
  const awake = useScreenAwake();
  const [isLive, setLive] = useState(false);
  const [isLoud, setLoud] = useState(false);
  const isFull = useFullScreen();
  const turn = useCallback((number: number): boolean => {
    if (!showStep(number)) return false;
    say(wordsOfStep());
    return true;
  }, []);
  useEffect(() => {
    setLive(true);
    // Without a connection the page may be one that was kept at another step.
    const asked = stepAsked();
    if (asked !== undefined && asked !== stepShown()) showStep(asked);
    // What is out of sight is silent; leaving ends it.
    const quiet = (): void => { if (document.visibilityState === 'hidden') hush(); };
    document.addEventListener('visibilitychange', quiet);
    window.addEventListener('pagehide', hush);
    return () => {
      document.removeEventListener('visibilitychange', quiet);
      window.removeEventListener('pagehide', hush);
      switchVoice(false);
    };
  }, []);
  useTurningLinks(turn);
  useTurningKeys(turn);
  useLooseButtons();
  const onSwipe = useCallback((way: 'back' | 'next') => { turn(stepShown() + (way === 'next' ? 1 : -1)); }, [turn]);
  useSwipe('.side-work', onSwipe);
  const loud = (): void => {
    switchVoice(!isLoud);
    setLoud(!isLoud);
    say(wordsOfStep());
  };
  return (
    <>
      {isLive && canSpeak() && <button type="button" className="btn btn-sm btn-icon" aria-label="Read aloud" title="Read aloud" aria-pressed={isLoud} onClick={loud}><Glyph name={isLoud ? 'sound' : 'quietSound'} /></button>}
      {isLive && document.fullscreenEnabled && <button type="button" className="btn btn-sm btn-icon" aria-label="Full screen" title="Full screen" aria-pressed={isFull} onClick={fillScreen}><Glyph name="full" /></button>}
      <span role="status" className="row">{awake === 'awake' && <><Glyph name="wake" label="Screen stays awake" /><span className="only-desk" aria-hidden="true">Screen stays awake</span></>}</span>
      {TOLD[awake] !== '' && <p className="side-told small" role="status">{TOLD[awake]}</p>}
    </>
  );
}

function fillScreen(): void {
  void (document.fullscreenElement === null ? document.documentElement.requestFullscreen() : document.exitFullscreen()).catch(() => undefined);
}

function useFullScreen(): boolean {
  const [isFull, setFull] = useState(false);
  useEffect(() => {
    const look = (): void => setFull(document.fullscreenElement !== null);
    document.addEventListener('fullscreenchange', look);
    return () => document.removeEventListener('fullscreenchange', look);
  }, []);
  return isFull;
}

/** The big keys are links to a page for each step. */
function useTurningLinks(turn: (number: number) => boolean): void {
  useEffect(() => {
    const onClick = (event: MouseEvent): void => {
      if (event.button !== 0 || event.altKey || event.ctrlKey || event.metaKey || event.shiftKey) return;
      const link = event.target instanceof Element ? event.target.closest<HTMLElement>('a[data-turn]') : null;
      if (link === null || !turn(Number(link.dataset['turn']))) return;
      event.preventDefault();
      // The link has gone with its step: its like among the keys that are seen now has the focus.
      const rel = link.getAttribute('rel');
      const keys = document.querySelector('.side-keys:not([hidden])');
      (keys?.querySelector<HTMLElement>(`[rel="${rel ?? ''}"]`) ?? keys?.querySelector<HTMLElement>('a'))?.focus({ preventScroll: true });
    };
    document.addEventListener('click', onClick);
    return () => document.removeEventListener('click', onClick);
  }, [turn]);
}

/** Space and arrows. A key that something else on the page has answered, such as the row counter, turns nothing. */
function useTurningKeys(turn: (number: number) => boolean): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (event.defaultPrevented || event.altKey || event.ctrlKey || event.metaKey || event.shiftKey || hasOwnKeys(event.target)) return;
      const link = event.target instanceof Element ? event.target.closest<HTMLElement>('a[data-turn]') : null;
      const to = { ' ': link === null ? stepShown() + 1 : Number(link.dataset['turn']), ArrowRight: stepShown() + 1, ArrowLeft: stepShown() - 1 }[event.key];
      if (to === undefined || (event.key === ' ' && pressesByItself(event.target))) return;
      if (turn(to)) event.preventDefault();
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [turn]);
}

/** A button that a finger has pressed lets go of the focus, or the space bar would press it again instead of going on. */
function useLooseButtons(): void {
  useEffect(() => {
    const onClick = (event: MouseEvent): void => {
      if (event.detail > 0 && event.target instanceof Element) event.target.closest<HTMLElement>('button')?.blur();
    };
    document.addEventListener('click', onClick);
    return () => document.removeEventListener('click', onClick);
  }, []);
}

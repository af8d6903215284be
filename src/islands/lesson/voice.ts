/** The browser's own speech, silent until it is switched on and as soon as the page is out of sight. */

let isOn = false;

export function canSpeak(): boolean {
  return 'speechSynthesis' in window && 'SpeechSynthesisUtterance' in window;
}

export function switchVoice(on: boolean): void {
  isOn = on && canSpeak();
  if (!isOn) hush();
}

/** Says something instead of what it was saying; nothing while it is off. */
export function say(words: string): void {
  if (!isOn || document.visibilityState === 'hidden') return;
  hush();
  const said = new SpeechSynthesisUtterance(words);
  said.lang = document.documentElement.lang;
  said.rate = 0.95;
  speechSynthesis.speak(said);
}

export function hush(): void {
  if (canSpeak()) speechSynthesis.cancel();
}

// The steps of the loom side as they stand in the page: all are drawn, one is seen. Without script each is a page of its own.

const all = (): HTMLElement[] => [...document.querySelectorAll<HTMLElement>('[data-step]')];

export function stepCount(): number {
  return Math.max(0, ...all().map((one) => Number(one.dataset['step'])));
}

/** From 1. */
export function stepShown(): number {
  return Number(all().find(({ hidden }) => !hidden)?.dataset['step'] ?? 1);
}

/** The step the address asks for, where a kept page stands in for it; undefined where it asks for none. */
export function stepAsked(): number | undefined {
  const asked = Number(new URLSearchParams(window.location.search).get('step'));
  return Number.isInteger(asked) && asked > 0 ? asked : undefined;
}

/** Shows a step with its figure and its keys; the address follows, so that a reload stays here. False where there is no such step. */
export function showStep(number: number): boolean {
  const parts = all();
  const wanted = parts.filter(({ dataset }) => Number(dataset['step']) === number);
  if (wanted.length === 0) return false;
  for (const part of parts) part.hidden = !wanted.includes(part);
  const figure = wanted.find(({ dataset }) => dataset['figureOf'] !== undefined)?.dataset['figureOf'];
  for (const one of document.querySelectorAll<HTMLElement>('.side-see')) one.hidden = one.dataset['kind'] !== figure;
  const address = new URL(window.location.href);
  address.searchParams.set('step', String(number));
  address.hash = '';
  window.history.replaceState(window.history.state, '', address);
  document.querySelector('.side-say')?.scrollTo({ top: 0 });
  return true;
}

/** What is to be heard of the step that is seen: its cautions, then what to do. */
export function wordsOfStep(): string {
  const part = all().find((one) => !one.hidden && one.matches('.side-one'));
  const texts = [...(part?.querySelectorAll('.side-caution, .side-step') ?? [])].map(({ textContent }) => textContent.replaceAll(/\s+/gu, ' ').trim());
  return texts.map((text) => (/[.!?:]$/u.test(text) ? text : `${text}.`)).join(' ');
}

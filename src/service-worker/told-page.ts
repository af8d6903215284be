/** What a page made earlier says of itself when it is shown without a connection. */
import { clockWords, dayWords, momentWords } from '#core/moment-words.ts';

/** `14:05` of the same day, else with its date; on the clock of the device. */
export function asOfWords(keptAt: Date, now: Date, timeZone: string): string {
  return dayWords(keptAt, timeZone) === dayWords(now, timeZone) ? clockWords(keptAt, timeZone) : momentWords(keptAt, timeZone);
}

/** The page with one plain line above its work; before it, as the loom side lays out what is in it. */
export function withAsOf(html: string, asOf: string): string {
  const line = `<p class="kept-as-of" role="status">You are without a connection: this is as of ${asOf}. <a href="">Try again</a></p>`;
  return html.replace(/<main\b/, (main) => line + main);
}

export interface KeptPage {
  readonly address: string;
  /** As it stands in the page's head: already safe to be put into another. */
  readonly title: string;
}

export function titleIn(html: string): string {
  return (/<title>([^<]*)<\/title>/.exec(html)?.[1] ?? '').replace(/ \| Fellmark$/, '');
}

/** The page for everything that is not kept, with a list of what is. */
export function withKeptList(html: string, pages: readonly KeptPage[]): string {
  const list = pages.map(({ address, title }) => `<li><a href="${address.replaceAll('&', '&amp;')}">${title}</a></li>`).join('');
  return list === '' ? html : html.replace(/<p data-kept-here[^>]*>[^<]*<\/p>/, `<p>Kept on this device:</p><ul class="lined kept-list">${list}</ul>`);
}

/** Which files of the build, and which pictures, a page needs to be whole without a connection. */

const BUILT = /(?:\/?_astro\/|(?<=["'`])\.\/)([\w.@$~%-]+\.(?:js|css|woff2|svg|png|webp|jpg))/g;
const PICTURE = /<img\b[^>]*?\ssrc="(\/media\/[^"]+)"/g;

/**
 * Addresses of built files that a page, script or sheet names, each once. Scripts name each other beside themselves
 * (`./client.js`), pages and sheets from the root.
 */
export function filesIn(text: string): string[] {
  const names = [...text.matchAll(BUILT)].flatMap(([, name]) => (name === undefined || hasOtherLetters(name) ? [] : [`/_astro/${name}`]));
  return [...new Set(names)];
}

/** A font for another script: it comes when such letters are seen, as the house writes in Latin ones. */
const hasOtherLetters = (name: string): boolean => name.endsWith('.woff2') && (!name.includes('-latin-') || name.includes('-latin-ext-'));

/** Addresses of the pictures drawn in a page; films and their stills are no `img`. */
export function picturesIn(html: string): string[] {
  return [...new Set([...html.matchAll(PICTURE)].flatMap(([, address]) => (address === undefined ? [] : [address.replaceAll('&amp;', '&')])))];
}

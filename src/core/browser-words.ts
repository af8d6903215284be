/** What a browser calls itself, said in a few words, so that its owner knows it again in a list. */

const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/\bFxiOS\/|\bFirefox\//, 'Firefox'],
  [/\bEdgA?\/|\bEdgiOS\//, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\bSamsungBrowser\//, 'Samsung Internet'],
  [/\bCriOS\/|\bChrome\/|\bHeadlessChrome\/|\bChromium\//, 'Chrome'],
  [/\bVersion\/[\d.]+.*\bSafari\//, 'Safari'],
];

const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/\biPad\b/, 'an iPad'],
  [/\biPhone\b/, 'an iPhone'],
  [/\bAndroid\b/, 'Android'],
  [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b|\bMacintosh\b/, 'a Mac'],
  [/\bCrOS\b/, 'a Chromebook'],
  [/\bLinux\b/, 'Linux'],
];

/** `Firefox on Linux`, as far as it can be told. Nothing of the text itself is passed on. */
export function browserWords(userAgent: string): string {
  const named = (list: readonly (readonly [RegExp, string])[]): string | undefined => list.find(([pattern]) => pattern.test(userAgent))?.[1];
  const browser = named(BROWSERS) ?? 'A browser';
  const system = named(SYSTEMS);
  return system === undefined ? browser : `${browser} on ${system}`;
}

import { describe, expect, test } from 'vitest';
import { browserWords } from '#core/browser-words.ts';
import { clockWords, dayWords, momentWords } from '#core/moment-words.ts';

describe('a moment in words', () => {
  const moment = new Date('2026-09-08T22:02:30Z');

  test('is said on the clock of whoever reads it', () => {
    expect(momentWords(moment, 'UTC')).toBe('8 September 2026, 22:02');
    expect(momentWords(moment, 'Europe/Berlin')).toBe('9 September 2026, 00:02');
    expect(momentWords(moment, 'America/Los_Angeles')).toBe('8 September 2026, 15:02');
    expect([dayWords(moment, 'Asia/Kolkata'), clockWords(moment, 'Asia/Kolkata')]).toEqual(['9 September 2026', '03:32']);
  });
});

describe('a browser in words', () => {
  test.each([
    ['Mozilla/5.0 (X11; Linux x86_64; rv:130.0) Gecko/20100101 Firefox/130.0', 'Firefox on Linux'],
    ['Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/130.0.0.0 Safari/537.36', 'Chrome on Windows'],
    ['Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/130.0.0.0 Safari/537.36 Edg/130.0.0.0', 'Edge on Windows'],
    ['Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15_7) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.6 Safari/605.1.15', 'Safari on a Mac'],
    ['Mozilla/5.0 (iPhone; CPU iPhone OS 17_6 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.6 Mobile/15E148 Safari/604.1', 'Safari on an iPhone'],
    ['Mozilla/5.0 (Linux; Android 14; SM-G991B) AppleWebKit/537.36 (KHTML, like Gecko) SamsungBrowser/25.0 Chrome/121.0.0.0 Mobile Safari/537.36', 'Samsung Internet on Android'],
    ['curl/8.5.0', 'A browser'],
    ['', 'A browser'],
    ['<b>Linux</b>', 'A browser on Linux'],
  ])('%s', (agent, words) => {
    expect(browserWords(agent)).toBe(words);
  });
});

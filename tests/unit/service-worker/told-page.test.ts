import { describe, expect, test } from 'vitest';
import { filesIn, picturesIn } from '../../../src/service-worker/files-in.ts';
import { asOfWords, titleIn, withAsOf, withKeptList } from '../../../src/service-worker/told-page.ts';

describe('a kept page', () => {
  test('says above its work of when it is', () => {
    expect(withAsOf('<main id="main" tabindex="-1"><h1>', '14:05')).toBe('<p class="kept-as-of" role="status">You are without a connection: this is as of 14:05. <a href="">Try again</a></p><main id="main" tabindex="-1"><h1>');
  });

  test('tells the day where it is another one, by the clock of the device', () => {
    const kept = new Date('2026-12-01T23:30:00Z');
    expect(asOfWords(kept, new Date('2026-12-02T01:00:00Z'), 'Europe/Berlin')).toBe('00:30');
    expect(asOfWords(kept, new Date('2026-12-02T01:00:00Z'), 'UTC')).toBe('1 December 2026, 23:30');
  });

  test('is called by its title in the list of what is kept', () => {
    const offline = '<p data-kept-here="true">Pages are kept.</p>';
    expect(titleIn('<title>Gather for Low Tide | Fellmark</title>')).toBe('Gather for Low Tide');
    expect(withKeptList(offline, [])).toBe(offline);
    expect(withKeptList(offline, [{ address: '/loom', title: 'My loom' }])).toContain('<li><a href="/loom">My loom</a></li>');
  });
});

describe('what a page needs', () => {
  test('are the files that it, its scripts and its sheets name', () => {
    expect(filesIn('<link href="/_astro/_slug_.Dk3@x.css"> component-url="/_astro/Board.B-1_x.js"')).toEqual(['/_astro/_slug_.Dk3@x.css', '/_astro/Board.B-1_x.js']);
    expect(filesIn('import{a}from"./client.js";const d=["_astro/later.js"]')).toEqual(['/_astro/client.js', '/_astro/later.js']);
  });

  test('are Latin letters, and no others before they are seen', () => {
    const fonts = ['lora-latin-500-normal.a.woff2', 'lora-latin-ext-500-normal.b.woff2', 'sofia-sans-greek-wght-normal.c.woff2'];
    expect(filesIn(fonts.map((name) => `url(/_astro/${name})`).join())).toEqual(['/_astro/lora-latin-500-normal.a.woff2']);
  });

  test('are pictures, no films', () => {
    expect(picturesIn('<img alt="" src="/media/a/small"><video poster="/media/b/still"><source src="/media/b/video"></video><img src="https://else.example/media/c">')).toEqual(['/media/a/small']);
  });
});

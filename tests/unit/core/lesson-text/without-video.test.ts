import { expect, test } from 'vitest';
import { withoutVideo } from '#core/lesson-text/without-video.ts';

test.each([
  ['<Video name="wind"/>\n\nWind it.', 'Wind it.'],
  ['Before.\n\n<Video name="wind" title="Winding"/>\n\nAfter.', 'Before.\n\nAfter.'],
  ['<Video title="Winding" name="wind" />', ''],
  ['<Video name="wind-again"/>\n\nWind it.', '<Video name="wind-again"/>\n\nWind it.'],
  ['<Picture name="wind" alt=""/>', '<Picture name="wind" alt=""/>'],
  ['No tag here: wind.', 'No tag here: wind.'],
])('of %j stays %j', (source, left) => {
  expect(withoutVideo(source, 'wind')).toBe(left);
});

import { describe, expect, it } from 'vitest';
import { NEUTRAL, light, shade, yarnColour } from '#core/craft/cloth/colour.ts';

describe('colours of yarn', () => {
  it('takes #rrggbb in either case', () => {
    expect(yarnColour('#2F5366')).toBe('#2f5366');
  });

  it.each(['red', '#fff', '#12345g', 'url(#x)', '#2f5366"/><script>', '', null, undefined, 12])('draws %j as undyed', (value) => {
    expect(yarnColour(value)).toBe(NEUTRAL);
  });

  it('shades towards woad and lights towards wool, never to black or white', () => {
    expect(shade('#93a8a6', 1)).toBe('#101c2d');
    expect(light('#93a8a6', 1)).toBe('#fffdf3');
    expect(shade('#93a8a6', 0)).toBe('#93a8a6');
  });
});

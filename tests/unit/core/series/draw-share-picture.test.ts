import { expect, test } from 'vitest';
import { drawSharePicture } from '#core/series/draw-share-picture.ts';

const WORDS = { name: 'Low Tide', rest: 'A woven wall hanging', teacherName: 'Ilse Marrow', workroomName: 'Saltmarsh Loom Room' };
const lines = (svg: string): string[] => [...svg.matchAll(/<text[^>]*>([^<]*)<\/text>/g)].map(([, words = '']) => words);

test('a share picture says what is made, with whom, and where', () => {
  expect(lines(drawSharePicture(null, WORDS))).toEqual(['Low Tide', 'A woven wall hanging', 'Ilse Marrow', 'Saltmarsh Loom Room', 'Fellmark']);
});

test('a long name is broken, set smaller and in the end cut; nothing runs out of the picture', () => {
  const svg = drawSharePicture(null, { ...WORDS, name: 'An uncommonly long name for a hanging that nobody will be able to read in one breath, whoever tries', rest: 'x'.repeat(200) });
  expect(lines(svg).length).toBeGreaterThan(6);
  for (const [, y = '0'] of svg.matchAll(/<text x="64" y="([\d.]+)"/g)) expect(Number(y)).toBeLessThan(630);
  expect(Math.max(...lines(svg).map((line) => line.length))).toBeLessThan(40);
  expect(lines(svg).some((line) => line.endsWith('…'))).toBe(true);
});

test('a teacher’s words are words in it', () => {
  expect(drawSharePicture(null, { ...WORDS, name: '<script>&' })).not.toContain('<script>');
});

import { describe, expect, test } from 'vitest';
import { meantBy, nearness, searchTerms } from '#core/series/search-words.ts';

describe('what is looked for', () => {
  test('is the stems of the words, without those of every sentence', () => {
    expect(searchTerms('Warping for the Tides')).toEqual(['warp', 'tid']);
    expect(searchTerms('100 % rya')).toEqual(['100', '%', 'rya']);
    expect(searchTerms('  ')).toEqual([]);
  });

  test('is everything where there is nothing else, and never more than six', () => {
    expect(searchTerms('how to')).toEqual(['how', 'to']);
    expect(searchTerms('a b c d e f g h')).toHaveLength(6);
  });
});

describe('a word typed badly', () => {
  const KNOWN = ['Low Tide: a woven wall hanging', 'soumak wedges hem-stitch', 'Ilse Marrow', 'macramé knotting'];

  test.each([
    ['soumack', 'soumak'],
    ['suomak', 'soumak'],
    ['hangnig wall', 'hanging wall'],
    ['macrmae', 'macrame'],
    ['ilse marow', 'ilse marrow'],
    ['wegdes', 'wedges'],
  ])('%s means %s', (typed, meant) => {
    expect(meantBy(typed, KNOWN)).toBe(meant);
  });

  test.each(['soumak', 'Tides', 'rye', 'zeppelin', '1000', ''])('%s is left as it is', (typed) => {
    expect(meantBy(typed, KNOWN)).toBeNull();
  });
});

test('the name weighs more than a technique, that more than the teacher, and all more than the summary', () => {
  const texts = { title: 'Low Tide', techniques: ['soumak'], teacherName: 'Ilse Marrow', workroomName: 'Saltmarsh', summary: 'A quiet sky of macramé' };
  const weights = ['tid', 'soum', 'marrow', 'sky'].map((term) => nearness([term], texts));
  expect(weights).toEqual(weights.toSorted((a, b) => b - a));
  expect(new Set(weights).size).toBe(4);
  expect(nearness(['macrame'], texts)).toBe(1);
  expect(nearness(['ide'], texts)).toBe(0);
});

import { describe, expect, test } from 'vitest';
import type { z } from 'astro/zod';
import { GatheringForm, LessonDraftForm, LessonSettingsForm, MoveLessonForm, NewLessonForm, NewSeriesForm, SeriesDetailsForm } from '#contracts/workroom.ts';

const id = '0'.repeat(26);
const settings = { lesson: id, title: 'Dress the loom', minutes: '90', rule: 'at-once' };
const details = { series: 'low-tide', revision: '0', title: 'Low Tide', level: 'beginner', currency: 'EUR' };
const line = { item: id, kind: 'tool', name: 'Comb' };

function sentences(schema: z.ZodTypeAny, given: unknown): [string, string][] {
  const parsed = schema.safeParse(given);
  return parsed.success ? [] : parsed.error.issues.map(({ path, message }) => [path.join('.'), message]);
}

describe('what a teacher reads at a field', () => {
  test.each<[string, z.ZodTypeAny, Record<string, unknown>, string, string]>([
    ['a series without a title', NewSeriesForm, { title: '  ' }, 'title', 'The title is missing.'],
    ['a series whose title did not come', NewSeriesForm, {}, 'title', 'The title is missing.'],
    ['a title too long', NewLessonForm, { series: 'low-tide', title: 'x'.repeat(121) }, 'title', 'At most 120 characters work here.'],
    ['a summary too long', SeriesDetailsForm, { ...details, summary: 'x'.repeat(401) }, 'summary', 'At most 400 characters work here.'],
    ['a story too long', SeriesDetailsForm, { ...details, story: 'x'.repeat(5_001) }, 'story', 'At most 5,000 characters work here.'],
    ['too many techniques', SeriesDetailsForm, { ...details, techniques: 'a,'.repeat(21) }, 'techniques', 'At most 20 techniques work here.'],
    ['no minutes', LessonSettingsForm, { ...settings, minutes: '' }, 'minutes', 'Between 1 and 6,000 minutes works.'],
    ['minutes in letters', LessonSettingsForm, { ...settings, minutes: 'an hour' }, 'minutes', 'Between 1 and 6,000 minutes works.'],
    ['minutes without end', LessonSettingsForm, { ...settings, minutes: '6001' }, 'minutes', 'Between 1 and 6,000 minutes works.'],
    ['too many things to look at', LessonSettingsForm, { ...settings, look: 'a\n'.repeat(13) }, 'look', 'At most 12 lines work here.'],
    ['a line to look at that is too long', LessonSettingsForm, { ...settings, look: `a\n${'x'.repeat(201)}` }, 'look.1', 'At most 200 characters work in a line.'],
    ['a text that did not come', LessonDraftForm, { lesson: id, revision: '0' }, 'source', 'The text did not arrive, so nothing was changed.'],
    ['a text too long', LessonDraftForm, { lesson: id, revision: '0', source: 'x'.repeat(220_001) }, 'source', 'A part holds at most 200,000 characters. Make two of it.'],
    ['a thing without a name', GatheringForm, { ...line, name: '' }, 'name', 'The name is missing.'],
    ['a part that is no number', GatheringForm, { ...line, untilPart: 'the last' }, 'untilPart', 'Write the number of a part, or leave it empty.'],
    ['a move to nowhere', MoveLessonForm, { lesson: id }, 'to', 'Say which number the part shall have.'],
    ['a move to a place in letters', MoveLessonForm, { lesson: id, to: 'first' }, 'to', 'Say which number the part shall have.'],
  ])('%s', (_words, schema, given, field, sentence) => {
    expect(sentences(schema, given)).toContainEqual([field, sentence]);
  });
});

describe('what is taken from a form', () => {
  test('techniques are parted by commas, empty ones left out', () => {
    expect(SeriesDetailsForm.parse({ ...details, techniques: ' tabby, , soumak ,' }).techniques).toEqual(['tabby', 'soumak']);
  });

  test('a date may be typed with a blank between day and time', () => {
    expect(LessonSettingsForm.parse({ ...settings, wall: '2027-03-01 09:00' }).wall).toBe('2027-03-01T09:00');
  });

  test('a box that is not ticked is no, and what stays empty is nothing', () => {
    expect(LessonSettingsForm.parse(settings)).toMatchObject({ isPreview: false, asksForPhoto: false, ask: '', look: [] });
    expect(GatheringForm.parse({ ...line, amountKey: '', amountText: ' ', standIn: '', untilPart: '', note: '' })).toMatchObject({ amountKey: null, amountText: null, standIn: null, untilPart: null, note: null });
  });

  test('a text as long as a part may be, with both signs at the ends of its lines, is taken', () => {
    expect(LessonDraftForm.safeParse({ lesson: id, revision: '3', source: 'x'.repeat(200_000) }).success).toBe(true);
  });
});

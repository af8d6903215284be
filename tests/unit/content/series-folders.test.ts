// The series that ship with the program: complete enough to teach from, and told the way the loom side needs them.
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parse } from 'yaml';
import { z } from 'astro/zod';

const root = new URL('../../../content/series/', import.meta.url);

const Name = z.string().regex(/^[a-z0-9][a-z0-9-]{0,63}$/);

const Gathering = z
  .object({
    kind: z.enum(['tool', 'yarn', 'material']),
    name: z.string().min(3).max(80),
    amount: z.string().optional(),
    amountText: z.string().min(1).optional(),
    standIn: z.string().min(3).optional(),
    untilPart: z.number().int().min(1),
    note: z.string().min(3).optional(),
  })
  .strict()
  .refine((item) => (item.amount === undefined) !== (item.amountText === undefined), 'an amount from the plan or in words, not both');

const Opens = z.discriminatedUnion('rule', [
  z.object({ rule: z.literal('at-once') }).strict(),
  z.object({ rule: z.literal('on-date'), wall: z.string(), zone: z.string() }).strict(),
  z.object({ rule: z.literal('after-seat'), days: z.number().int().min(0) }).strict(),
  z.object({ rule: z.literal('after-verdict'), part: z.number().int().min(1) }).strict(),
]);

const Lesson = z
  .object({
    file: z.string().regex(/^\d\d-[a-z0-9-]+\.mdx$/),
    title: z.string().min(3),
    minutes: z.number().int().min(10),
    preview: z.boolean(),
    opens: Opens,
    checkpoint: z.object({ ask: z.string().min(3), look: z.array(z.string().min(10)).min(3).max(5) }).strict().optional(),
    gathering: z.array(Gathering).min(5),
  })
  .strict();

const Series = z
  .object({
    title: z.string(),
    craft: z.string(),
    techniques: z.array(z.string()).min(1),
    level: z.enum(['beginner', 'some practice', 'practised']),
    summary: z.string().max(300),
    story: z.string().min(200),
    price: z.object({ amountMinor: z.number().int().positive(), currency: z.literal('EUR') }).strict(),
    lessons: z.array(Lesson).min(1),
    videos: z.array(z.object({ name: Name, title: z.string(), file: z.string() }).strict()),
  })
  .strict();

function read(path: string): string {
  return readFileSync(new URL(path, root), 'utf8');
}

function seriesOf(folder: string): z.infer<typeof Series> {
  return Series.parse(parse(read(`${folder}/series.yaml`)));
}

/** The attribute values of every such component in a lesson's source. */
function valuesOf(source: string, component: string, attribute: string): string[] {
  return [...source.matchAll(new RegExp(`<${component}\\s[^>]*?${attribute}="([^"]*)"`, 'gu'))].map((match) => match[1] ?? '');
}

/** The words of each step as the loom side shows them; an amount counts as two words, a number and its unit. */
function stepsOf(source: string): { id: string; words: number }[] {
  return [...source.matchAll(/<Step id="([^"]+)">\n([\s\S]*?)\n<\/Step>/gu)].map((match) => ({
    id: match[1] ?? '',
    words: (match[2] ?? '').replaceAll(/<Amount[^>]*\/>/gu, 'number unit').split(/\s+/u).filter((word) => word !== '').length,
  }));
}

const folders = readdirSync(root);

describe.each(folders)('the series in %s', (folder) => {
  const series = seriesOf(folder);

  test('names a file for every part, in the order of their numbers', () => {
    const files = readdirSync(new URL(`${folder}/`, root)).filter((file) => file.endsWith('.mdx'));
    expect(series.lessons.map((lesson) => lesson.file)).toEqual(files.sort());
    series.lessons.forEach((lesson, index) => expect(Number(lesson.file.slice(0, 2))).toBe(index + 1));
  });

  test('lets a visitor read the first part and no other', () => {
    expect(series.lessons.map((lesson) => lesson.preview)).toEqual(series.lessons.map((_, index) => index === 0));
  });

  test('opens a part after a verdict only where an earlier part asks for a photo', () => {
    series.lessons.forEach((lesson, index) => {
      if (lesson.opens.rule !== 'after-verdict') return;
      expect(lesson.opens.part).toBeLessThanOrEqual(index);
      expect(series.lessons[lesson.opens.part - 1]?.checkpoint).toBeDefined();
    });
  });

  test('needs no thing until a part before the one it is gathered for, nor after the last one planned', () => {
    series.lessons.forEach((lesson, index) => {
      for (const item of lesson.gathering) expect(item.untilPart, item.name).toBeGreaterThanOrEqual(index + 1);
    });
  });

  test('puts every yarn in with what can stand in for it', () => {
    const yarns = series.lessons.flatMap((lesson) => lesson.gathering).filter((item) => item.kind === 'yarn');
    for (const yarn of yarns) expect(yarn.standIn, yarn.name).toBeDefined();
  });

  test.each(series.lessons)('$file has steps short enough to read at the loom', ({ file }) => {
    const steps = stepsOf(read(`${folder}/${file}`));
    expect(steps.length).toBe(read(`${folder}/${file}`).split('<Step ').length - 1);
    for (const step of steps) expect(step.words, step.id).toBeLessThanOrEqual(18);
    expect(new Set(steps.map((step) => step.id)).size).toBe(steps.length);
  });

  test.each(series.lessons)('$file holds nothing a lesson text may not hold', ({ file }) => {
    const source = read(`${folder}/${file}`);
    expect(source).not.toMatch(/[{}]/u);
    expect(source).not.toMatch(/^(import|export) /mu);
    expect(source).not.toMatch(/<(?!\/?(Step|Caution|Tip|Amount|Figure|Video)\b)/u);
    expect(source).not.toMatch(/^# /mu);
    expect(source).not.toMatch(/[!…“”]|e\.g\.|etc\./u);
  });
});

describe('Low Tide', () => {
  const series = seriesOf('low-tide');

  test('has seven parts and costs 68 euros', () => {
    expect(series.lessons).toHaveLength(7);
    expect(series.price).toEqual({ amountMinor: 6800, currency: 'EUR' });
  });

  test('asks for photos of the warped loom and of the slopes, and waits for both verdicts', () => {
    expect(series.lessons.flatMap((lesson, index) => (lesson.checkpoint ? [index + 1] : []))).toEqual([2, 5]);
    expect(series.lessons.map((lesson) => lesson.opens)).toEqual([
      { rule: 'at-once' },
      { rule: 'at-once' },
      { rule: 'after-verdict', part: 2 },
      { rule: 'after-verdict', part: 2 },
      { rule: 'after-verdict', part: 2 },
      { rule: 'after-verdict', part: 5 },
      { rule: 'after-verdict', part: 5 },
    ]);
  });

  test.each(series.lessons)('$file is a whole lesson: film, figures, caution, faults, end', ({ file }) => {
    const source = read(`low-tide/${file}`);
    const words = source.replaceAll(/<Amount[^>]*\/>/gu, 'number unit').replaceAll(/<[^>]*>|[|#*-]/gu, ' ').split(/\s+/u).filter(Boolean).length;
    expect(words).toBeGreaterThanOrEqual(900);
    expect(words).toBeLessThanOrEqual(1500);
    const steps = stepsOf(source).length;
    expect(steps).toBeGreaterThanOrEqual(8);
    expect(steps).toBeLessThanOrEqual(16);
    expect(valuesOf(source, 'Figure', 'of').length).toBeGreaterThanOrEqual(2);
    expect(source.startsWith('<Video name="')).toBe(true);
    expect(source).toMatch(/<Caution title="[^"]+">/u);
    expect(source).toMatch(/^## .*mend/mu);
    expect(source).toMatch(/^## When to stop|^## Show your/mu);
  });

  test('shows in each part a film the series has, and uses every film', () => {
    const shown = series.lessons.flatMap(({ file }) => valuesOf(read(`low-tide/${file}`), 'Video', 'name'));
    expect(shown).toEqual(series.videos.map((video) => video.name));
  });

  test('closes every caution with what it is worth and who to ask', () => {
    for (const { file } of series.lessons) {
      const cautions = [...read(`low-tide/${file}`).matchAll(/<Caution[^>]*>([\s\S]*?)<\/Caution>/gu)].map((match) => match[1] ?? '');
      for (const caution of cautions) {
        expect(caution, file).toMatch(/general information/u);
        expect(caution, file).toMatch(/qualified person|doctor/u);
      }
    }
  });
});

// The series that ship with the program: complete enough to teach from, and told the way the loom side needs them.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { load as parse } from 'js-yaml';
import { LOW_TIDE } from '#components/handbook/pattern.ts';
import { SeriesFile } from '#contracts/series-folder.ts';
import { amountOf } from '#core/craft/amounts.ts';
import { fitPiece } from '#core/craft/fit.ts';
import type { MacramePiece } from '#core/craft/macrame/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { contradictions } from '#core/gathering/contradictions.ts';
import { parseLessonText, type LessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { plainWords } from '#core/lesson-text/plain-text.ts';
import type { Block, Component, LessonNode } from '#core/lesson-text/tree.ts';

const content = new URL('../../../content/', import.meta.url);
const folders = readdirSync(new URL('series/', content));

function read(folder: string, file: string): string {
  return readFileSync(new URL(`series/${folder}/${file}`, content), 'utf8');
}

function seriesOf(folder: string): SeriesFile {
  return SeriesFile.parse(parse(read(folder, 'series.yaml')));
}

function lessonOf(folder: string, file: string): LessonText {
  const lesson = parseLessonText(read(folder, file));
  if (!lesson.ok) throw new Error(lesson.problems.map(({ line, reason }) => `${file}, line ${String(line)}: ${reason}`).join('\n'));
  return lesson;
}

/** Words as they are read: an amount is a number and a unit. */
function wordsIn(nodes: readonly LessonNode[]): string[] {
  return plainWords(nodes, () => ' number unit ').split(/\s+/u).filter((word) => word !== '');
}

function componentsNamed(blocks: readonly Block[], name: Component['name']): Component[] {
  return blocks.filter((block): block is Component => block.type === 'component' && block.name === name);
}

function linksIn(nodes: readonly LessonNode[]): string[] {
  return nodes.flatMap((node) => [...(node.type === 'link' ? [node.url] : []), ...('children' in node ? linksIn(node.children) : [])]);
}

describe.each(folders)('the series in %s', (folder) => {
  const series = seriesOf(folder);

  test('names a file for every part, in the order of their numbers', () => {
    const files = readdirSync(new URL(`series/${folder}/`, content)).filter((file) => file.endsWith('.mdx'));
    expect(series.lessons.map((lesson) => lesson.file)).toEqual(files.sort());
    series.lessons.forEach((lesson, index) => expect(Number(lesson.file.slice(0, 2))).toBe(index + 1));
  });

  test('lets a visitor read the first part and no other', () => {
    expect(series.lessons.map((lesson) => lesson.preview)).toEqual(series.lessons.map((_, index) => index === 0));
  });

  test('opens a part after a verdict only where an earlier part asks for a photo', () => {
    series.lessons.forEach((lesson, index) => {
      if (lesson.opens.rule !== 'after-verdict') return;
      const { part = Number.POSITIVE_INFINITY } = lesson.opens;
      expect(part).toBeLessThanOrEqual(index);
      expect(series.lessons[part - 1]?.checkpoint).toBeDefined();
    });
  });

  test('has lists that do not contradict one another', () => {
    const lines = series.lessons.flatMap(({ gathering }, index) => gathering.map(({ kind, name, amountText, untilPart }, at) => (
      { publicId: `${index}-${at}`, part: index + 1, kind, name, amountText: amountText ?? null, untilPart: untilPart ?? null })));
    expect(contradictions(lines, series.lessons.length).map(({ part, says }) => `Part ${part}: ${says}`)).toEqual([]);
  });

  test('says of each thing to gather how much of it, and until which part', () => {
    series.lessons.forEach((lesson, index) => {
      expect(lesson.gathering.length, lesson.title).toBeGreaterThanOrEqual(5);
      for (const item of lesson.gathering) {
        expect([item.amount, item.amountText].filter((amount) => amount !== undefined), item.name).toHaveLength(1);
        expect(item.untilPart, item.name).toBeGreaterThanOrEqual(index + 1);
      }
    });
  });

  test('says of every yarn what can stand in for it', () => {
    const yarns = series.lessons.flatMap((lesson) => lesson.gathering).filter((item) => item.kind === 'yarn');
    for (const yarn of yarns) expect(yarn.standIn, yarn.name).toBeDefined();
  });

  test.each(series.lessons)('$file reads without a problem or a warning', ({ file }) => {
    expect(lessonOf(folder, file).warnings).toEqual([]);
  });

  test.each(series.lessons)('$file has steps short enough to read at the loom', ({ file }) => {
    const steps = componentsNamed(lessonOf(folder, file).tree.children, 'Step');
    for (const step of steps) expect(wordsIn(step.children).length, step.props['id']).toBeLessThanOrEqual(18);
  });

  test.each(series.lessons)('$file keeps to the words of the house', ({ file }) => {
    expect(read(folder, file)).not.toMatch(/[!…“”″—]|e\.g\.|etc\.|approx|\bfix(es|ed)?\b/u);
  });
});

describe('Low Tide', () => {
  const series = seriesOf('low-tide');

  test('has seven parts and costs 68 euros', () => {
    expect(series.lessons).toHaveLength(7);
    expect(series.price).toEqual({ amountMinor: 6800, currency: 'EUR' });
  });

  test('asks for photos of the warped loom and of the slopes, and holds back what comes after them', () => {
    expect(series.lessons.flatMap((lesson, index) => (lesson.checkpoint ? [index + 1] : []))).toEqual([2, 5]);
    expect(series.lessons.map(({ opens }) => (opens.rule === 'after-verdict' ? opens.part : opens.rule))).toEqual(['at-once', 'at-once', 2, 2, 2, 5, 5]);
    for (const { checkpoint } of series.lessons) if (checkpoint) expect(checkpoint.look.length).toBeGreaterThanOrEqual(3);
  });

  test.each(series.lessons)('$file is a whole lesson: film first, then steps, figures, faults and an end', ({ file }) => {
    const { tree, steps, figures, outline } = lessonOf('low-tide', file);
    const words = wordsIn(tree.children).length;
    expect(words).toBeGreaterThanOrEqual(900);
    expect(words).toBeLessThanOrEqual(1500);
    expect(steps.length).toBeGreaterThanOrEqual(8);
    expect(steps.length).toBeLessThanOrEqual(16);
    expect(figures.length).toBeGreaterThanOrEqual(2);
    expect(tree.children[0]).toMatchObject({ type: 'component', name: 'Video' });
    const headings = outline.map((entry) => entry.words);
    expect(headings.some((heading) => heading.startsWith('What'))).toBe(true);
    expect(headings.some((heading) => heading.includes('mend'))).toBe(true);
    expect(headings.some((heading) => heading.startsWith('When to stop') || heading.startsWith('Show your'))).toBe(true);
  });

  test('shows in each part a film the series has, and uses every film', () => {
    const shown = series.lessons.flatMap(({ file }) => lessonOf('low-tide', file).media.map((media) => media.name));
    expect(shown).toEqual(series.videos.map((video) => video.name));
  });

  test.each(series.lessons)('$file puts its caution before a step, and says whom to ask', ({ file }) => {
    const blocks = lessonOf('low-tide', file).tree.children;
    const cautions = componentsNamed(blocks, 'Caution');
    expect(cautions.length).toBeGreaterThanOrEqual(1);
    for (const caution of cautions) {
      const after = blocks.slice(blocks.indexOf(caution) + 1);
      expect(componentsNamed(after, 'Step').length).toBeGreaterThan(0);
      expect(plainWords(caution.children)).toMatch(/general information/u);
      expect(plainWords(caution.children)).toMatch(/qualified person|doctor/u);
    }
  });

  test.each(series.lessons)('$file asks only for amounts the plan gives, in its text and in its list', ({ file, gathering }) => {
    const keys = [...lessonOf('low-tide', file).amounts, ...gathering.flatMap(({ amount }) => amount ?? [])];
    for (const key of keys) expect(amountOf(key, LOW_TIDE.piece, LOW_TIDE.plan).ok, key).toBe(true);
  });

  test('has its amounts for a student with coarser nails and ends in pairs as well', () => {
    const fitted = fitPiece(LOW_TIDE.piece, { loom: { nailPitchMm: 6.35, insideWidthMm: 500, insideHeightMm: 650, warping: 'zigzag' }, endsTogether: 2 });
    if (!fitted.ok) throw new Error(fitted.problems.map(({ message }) => message).join(' '));
    const { piece, plan } = fitted.value;
    for (const { file, gathering } of series.lessons) {
      const keys = [...lessonOf('low-tide', file).amounts, ...gathering.flatMap(({ amount }) => amount ?? [])];
      for (const key of keys) expect(amountOf(key, piece, plan).ok, key).toBe(true);
    }
  });

  // What the texts say in words of their own, because no amount of the plan says it.
  test('says of the piece what the piece is', () => {
    const { bands, yarns } = LOW_TIDE.piece;
    const named = (name: string) => bands.find((band) => band.name === name);
    expect(named('fringe-under')).toMatchObject({ technique: 'rya', strands: 8, legEnds: 1, trimMm: 10 });
    expect(named('fringe-over')).toMatchObject({ technique: 'rya', strands: 8, legEnds: 1 });
    for (const ridge of ['ridge-low', 'ridge-middle', 'ridge-high']) {
      expect(named(ridge)).toMatchObject({ technique: 'soumak', over: 4, back: 2, tabbyBetween: 0, yarn: 'ridge' });
    }
    expect(yarns['ridge']?.strands).toBe(4);
    expect([named('calm-low'), named('calm-high'), named('sky')]).toMatchObject([{ yarn: 'sand' }, { yarn: 'water' }, { yarn: 'water' }]);
    expect(named('foot-hem')).toMatchObject({ bundleEnds: 2, reachPicks: 2 });
  });

  test('draws the dunes in the shares the fifth part tells', () => {
    const dunes = LOW_TIDE.piece.bands.find((band) => band.name === 'dunes');
    if (dunes?.technique !== 'tabby' || dunes.heightMm === undefined) throw new Error('the dunes are tabby of a set height');
    const { widthMm } = LOW_TIDE.piece.size;
    const [sand, bank, samphire] = dunes.shapes ?? [];
    expect([sand?.yarn, bank?.yarn, samphire?.yarn]).toEqual(['sand', 'shore', 'green']);
    const shares: [typeof sand, number, number, number][] = [[sand, 1 / 2, 4 / 5, 2 / 3], [bank, 1 / 5, 1 / 5, 1 / 2], [samphire, 1 / 4, 1 / 2, 0.4]];
    for (const [shape, foot, height, top] of shares) {
      const { baseMm = 0, heightMm = 0, leanMm = 0 } = shape ?? {};
      expect(Math.abs(baseMm / widthMm - foot)).toBeLessThan(0.03);
      expect(Math.abs(heightMm / dunes.heightMm - height)).toBeLessThan(0.03);
      expect(Math.abs((baseMm / 2 + leanMm) / baseMm - top)).toBeLessThan(0.03);
    }
  });

  test('links only to handbook pages that are there', () => {
    const links = series.lessons.flatMap(({ file }) => linksIn(lessonOf('low-tide', file).tree.children));
    expect(links.length).toBeGreaterThan(5);
    for (const link of links) {
      expect(link).toMatch(/^\/handbook\/[a-z-]+$/u);
      expect(existsSync(new URL(`${link.slice(1)}.mdx`, content)), link).toBe(true);
    }
  });
});

describe('Three Knotted Cords', () => {
  const piece = JSON.parse(read('three-knotted-cords', 'piece.json')) as MacramePiece;
  const planned = planPiece(piece);
  const { lessons } = seriesOf('three-knotted-cords');

  test('has a piece that can be knotted without a warning', () => {
    expect(planned.ok ? planned.warnings : planned.problems).toEqual([]);
  });

  test('every amount its texts and lists ask for is told by the plan', () => {
    if (!planned.ok) throw new Error('it can be knotted');
    const asked = lessons.flatMap(({ file, gathering }) => [...lessonOf('three-knotted-cords', file).amounts, ...gathering.flatMap(({ amount }) => amount ?? [])]);
    expect(asked.length).toBeGreaterThan(15);
    for (const key of asked) expect(amountOf(key, piece, planned.value).ok, key).toBe(true);
  });

  test.each(lessons.map(({ file }) => file))('%s reads without a problem or a warning, with a caution that names who to ask', (file) => {
    const lesson = lessonOf('three-knotted-cords', file);
    expect(lesson.warnings).toEqual([]);
    expect(read('three-knotted-cords', file)).toMatch(/<Caution[^]*qualified person|<Caution[^]*ask a qualified/u);
  });
});

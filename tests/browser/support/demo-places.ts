/** Ids of things in the demo world, found where people find them: in the pages. */
import { request } from 'playwright/test';
import { cookieOf, type DemoName } from './demo-people.ts';

export interface DemoPlaces {
  /** Maud's photo on the bench. */
  readonly photo: string;
  /** The film of Part 1, which is free, and of Part 2, which is not. */
  readonly freeVideo: string;
  readonly gatedVideo: string;
  /** Public id of Part 2. */
  readonly secondPart: string;
  /** Public id of a part of Low Tide, as its teacher's pages name it. */
  readonly workroomPart: string;
  /** A notice of Ilse's, and the seat of a student of hers. */
  readonly notice: string;
  readonly seat: string;
  /** Public id of Maud, as the office names her. */
  readonly person: string;
}

async function pageAs(name: DemoName, path: string): Promise<string> {
  const context = await request.newContext({ baseURL: process.env['FELLMARK_TEST_URL'] ?? '', extraHTTPHeaders: { cookie: await cookieOf(name) } });
  const html = await (await context.get(path)).text();
  await context.dispose();
  return html;
}

function firstIn(html: string, pattern: RegExp, what: string): string {
  const found = pattern.exec(html)?.[1];
  if (found === undefined) throw new Error(`${what} is nowhere on the page`);
  return found;
}

let kept: Promise<DemoPlaces> | undefined;

export function demoPlaces(): Promise<DemoPlaces> {
  kept ??= find();
  return kept;
}

async function find(): Promise<DemoPlaces> {
  const [bench, one, two, people, desk, notices, students] = await Promise.all([
    pageAs('ilse', '/workroom/bench'),
    pageAs('ilse', '/series/low-tide/1'),
    pageAs('ilse', '/series/low-tide/2'),
    pageAs('pell', '/office/people?q=maud'),
    pageAs('ilse', '/workroom/series/low-tide'),
    pageAs('ilse', '/workroom/notices'),
    pageAs('ilse', '/workroom/students'),
  ]);
  return {
    photo: firstIn(bench, /\/media\/([0-9a-z]{26})\/large/, 'the photo'),
    freeVideo: firstIn(one, /\/media\/([0-9a-z]{26})\/video/, 'the film of Part 1'),
    gatedVideo: firstIn(two, /\/media\/([0-9a-z]{26})\/video/, 'the film of Part 2'),
    secondPart: firstIn(await pageAs('maud', '/series/low-tide/2'), /name="lesson" value="([0-9a-z]{26})"/, 'the id of Part 2'),
    workroomPart: firstIn(desk, /\/workroom\/series\/low-tide\/parts\/([0-9a-z]{26})/, 'a part'),
    notice: firstIn(notices, /\/workroom\/notices\/([0-9a-z]{26})/, 'a notice'),
    seat: firstIn(students, /\/workroom\/students\/([0-9a-z]{26})/, 'a seat'),
    person: firstIn(people, /\/office\/people\/([0-9a-z]{26})/, 'Maud'),
  };
}

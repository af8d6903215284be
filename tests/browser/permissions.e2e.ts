/**
 * Every route as everybody. The list of routes is the program's own table of rules, so that a route without a line here
 * fails; what each line expects is written out, since it is what people may rely on.
 */
import { expect, request, test } from 'playwright/test';
import { ROUTE_RULES } from '#server/web/route-rules.ts';
import { cookieOf, type DemoName } from './support/demo-people.ts';
import { demoPlaces, type DemoPlaces } from './support/demo-places.ts';

/** Amara has no seat, Maud has one and is in Part 2, Teodor is another teacher, Ilse owns Low Tide, Wren helps her, Pell is the steward. */
const ASKERS = ['visitor', 'amara', 'maud', 'teodor', 'ilse', 'wren', 'pell'] as const satisfies readonly (DemoName | 'visitor')[];

interface Line {
  /** Address with the demo world's own ids put in. */
  readonly at: string | ((places: DemoPlaces) => string);
  /** Statuses in the order of ASKERS; a single one stands for all. */
  readonly answers: string;
  /** Asked by POST with an empty body of JSON. */
  readonly post?: true;
}

const EVERYBODY = '200';
const SIGNED_IN = '303 200 200 200 200 200 200';
/** Who is in already is sent on. */
const AT_THE_DOOR = '200 303 303 303 303 303 303';
const TEACHERS = '303 403 403 200 200 403 403';
/** Another teacher finds nothing at the address of somebody else's series. */
const OWNER = '303 403 403 404 200 403 403';
const SEAT = '303 303 200 303 303 303 303';
const BENCH = '303 403 403 200 200 200 403';
const STEWARD = '303 404 404 404 404 404 200';

const ofPart = (page: string) => ({ workroomPart }: DemoPlaces): string => `/workroom/series/low-tide/parts/${workroomPart}${page}`;

const ROUTES: Readonly<Record<string, readonly Line[]>> = {
  '/': [{ at: '/', answers: EVERYBODY }],
  '/404': [{ at: '/404', answers: '404' }],
  '/500': [{ at: '/500', answers: '404' }],
  '/account': [{ at: '/account', answers: SIGNED_IN }],
  '/account/looms': [{ at: '/account/looms', answers: SIGNED_IN }],
  '/api/openapi.json': [{ at: '/api/openapi.json', answers: EVERYBODY }],
  '/api/payments/events': [{ at: '/api/payments/events', post: true, answers: '400' }],
  '/api/photos/finished': [{ at: '/api/photos/finished', post: true, answers: '401 422 422 422 422 422 422' }],
  '/api/photos': [{ at: '/api/photos', post: true, answers: '401 422 422 422 422 422 422' }],
  '/api/kept-pages': [{ at: '/api/kept-pages', answers: EVERYBODY }],
  '/series/[slug]/gather.txt': [{ at: '/series/low-tide/gather.txt', answers: EVERYBODY }],
  '/offline': [{ at: '/offline', answers: EVERYBODY }],
  '/api/photos/pieces/[...upload]': [{ at: '/api/photos/pieces', post: true, answers: '401 412 412 412 412 412 412' }],
  '/api/photos/show': [{ at: '/api/photos/show', post: true, answers: '401 422 422 422 422 422 422' }],
  '/api/reckon': [{ at: '/api/reckon', post: true, answers: '422' }],
  '/api/seats/[slug]': [{ at: '/api/seats/low-tide', answers: SIGNED_IN.replace('303', '401') }],
  '/api/rows': [{ at: '/api/rows', post: true, answers: '401 422 422 422 422 422 422' }],
  '/api/ticks': [{ at: '/api/ticks', post: true, answers: '401 422 422 422 422 422 422' }],
  '/api/video-place': [{ at: '/api/video-place', post: true, answers: '401 422 422 422 422 422 422' }],
  '/api/videos/[...upload]': [{ at: '/api/videos', post: true, answers: '401 403 403 412 412 403 403' }],
  '/confirm/[token]': [{ at: '/confirm/nothing', answers: '410' }],
  '/forgotten': [{ at: '/forgotten', answers: EVERYBODY }],
  '/gifts': [{ at: '/gifts', answers: EVERYBODY }],
  '/handbook': [{ at: '/handbook', answers: EVERYBODY }],
  '/handbook/[...slug]': [{ at: '/handbook/tabby', answers: EVERYBODY }, { at: '/handbook/nothing', answers: '404' }],
  '/leave/[key]': [{ at: `/leave/${'0'.repeat(26)}-${'0'.repeat(26)}-notices-${'A'.repeat(43)}`, answers: '404' }, { at: '/leave/nothing', answers: '404' }],
  '/loom': [{ at: '/loom', answers: SIGNED_IN }],
  '/media/[id]/[file]': [
    { at: ({ photo }) => `/media/${photo}/large`, answers: '404 404 200 404 200 200 404' },
    { at: ({ freeVideo }) => `/media/${freeVideo}/video`, answers: EVERYBODY },
    { at: ({ gatedVideo }) => `/media/${gatedVideo}/video`, answers: '404 404 200 404 200 200 404' },
    { at: ({ gatedVideo }) => `/media/${gatedVideo}/captions`, answers: '404 404 200 404 200 200 404' },
    { at: ({ gatedVideo }) => `/media/${gatedVideo}/captions-draft`, answers: '404 404 404 404 200 200 404' },
    { at: ({ photo }) => `/media/${photo}/original`, answers: '404' },
    { at: `/media/${'0'.repeat(26)}/large`, answers: '404' },
  ],
  '/notices': [{ at: '/notices', answers: SIGNED_IN }],
  '/helping/[token]': [{ at: '/helping/nothing', answers: '410' }],
  '/new-password/[token]': [{ at: '/new-password/nothing', answers: '410' }],
  '/office': [{ at: '/office', answers: STEWARD }],
  '/office/jobs': [{ at: '/office/jobs', answers: STEWARD }],
  '/office/log': [{ at: '/office/log', answers: STEWARD }],
  '/office/mail': [{ at: '/office/mail', answers: STEWARD }],
  '/office/reports': [{ at: '/office/reports', answers: STEWARD }],
  '/office/reviews': [{ at: '/office/reviews', answers: STEWARD }],
  '/office/people': [{ at: '/office/people', answers: STEWARD }],
  '/office/people/[person]': [{ at: ({ person }) => `/office/people/${person}`, answers: STEWARD }],
  '/prove': [{ at: '/prove', answers: SIGNED_IN }],
  '/reckoner': [{ at: '/reckoner', answers: EVERYBODY }],
  '/refused': [{ at: '/refused', answers: '404' }],
  '/robots.txt': [{ at: '/robots.txt', answers: EVERYBODY }],
  '/sitemap.xml': [{ at: '/sitemap.xml', answers: EVERYBODY }],
  '/series/feed.atom': [{ at: '/series/feed.atom', answers: EVERYBODY }],
  '/series': [{ at: '/series', answers: EVERYBODY }],
  '/series/[slug]': [
    { at: '/series/low-tide', answers: EVERYBODY },
    { at: '/series/three-knotted-cords', answers: EVERYBODY },
    { at: '/series/nothing', answers: '404' },
  ],
  '/series/[slug]/[part]': [
    { at: '/series/low-tide/1', answers: EVERYBODY },
    { at: '/series/low-tide/2', answers: '402 402 200 402 200 200 402' },
    { at: '/series/low-tide/3', answers: '402 402 200 402 200 200 402' },
    { at: '/series/low-tide/8', answers: '404' },
    { at: '/series/three-knotted-cords/1', answers: EVERYBODY },
  ],
  '/series/[slug]/[part]/loomside': [{ at: '/series/low-tide/1/loomside', answers: EVERYBODY }, { at: '/series/low-tide/2/loomside', answers: '303 303 200 303 200 200 303' }],
  '/series/[slug]/calendar.ics': [{ at: '/series/low-tide/calendar.ics', answers: '303 404 200 404 404 404 404' }],
  '/series/[slug]/timetable': [{ at: '/series/low-tide/timetable', answers: SEAT }],
  '/calendar/[key].ics': [{ at: `/calendar/${'0'.repeat(26)}-${'A'.repeat(43)}.ics`, answers: '404' }, { at: '/calendar/nothing.ics', answers: '404' }],
  '/series/[slug]/gather': [{ at: '/series/low-tide/gather', answers: EVERYBODY }],
  '/series/[slug]/certificate.pdf': [{ at: '/series/low-tide/certificate.pdf?day=2026-12-01', answers: '303 404 404 404 404 404 404' }],
  '/series/[slug]/finish': [{ at: '/series/low-tide/finish', answers: '303 404 200 404 404 404 404' }],
  '/series/[slug]/piece': [{ at: '/series/low-tide/piece', answers: SEAT }],
  '/series/[slug]/seat': [{ at: '/series/low-tide/seat', answers: SEAT }],
  '/series/[slug]/share.png': [{ at: '/series/low-tide/share.png', answers: EVERYBODY }, { at: '/series/nothing/share.png', answers: '404' }],
  '/wall': [{ at: '/wall', answers: EVERYBODY }],
  '/sign-in': [{ at: '/sign-in', answers: AT_THE_DOOR }],
  '/sign-out': [{ at: '/sign-out', answers: '303' }],
  '/sign-up': [{ at: '/sign-up', answers: AT_THE_DOOR }],
  '/teachers/[handle]': [{ at: '/teachers/saltmarsh', answers: EVERYBODY }, { at: '/teachers/nobody', answers: '404' }],
  '/teachers/[handle]/feed.atom': [{ at: '/teachers/saltmarsh/feed.atom', answers: EVERYBODY }, { at: '/teachers/nobody/feed.atom', answers: '404' }],
  '/techniques/[name]': [{ at: '/techniques/soumak', answers: EVERYBODY }, { at: '/techniques/nothing-like-it', answers: '404' }],
  '/api/workroom/captions': [{ at: '/api/workroom/captions', post: true, answers: '401 403 403 422 422 403 403' }],
  '/api/workroom/lesson-draft': [{ at: '/api/workroom/lesson-draft', post: true, answers: '401 403 403 422 422 403 403' }],
  '/api/workroom/piece-draft': [{ at: '/api/workroom/piece-draft', post: true, answers: '401 403 403 422 422 403 403' }],
  '/api/workroom/pictures': [{ at: '/api/workroom/pictures', post: true, answers: '401 403 403 422 422 403 403' }],
  '/api/workroom/videos/[video]': [{ at: ({ gatedVideo }) => `/api/workroom/videos/${gatedVideo}`, answers: '401 403 403 404 200 403 403' }],
  '/api/workroom/series-folder/[slug]': [{ at: '/api/workroom/series-folder/low-tide', answers: '401 403 403 404 200 403 403' }],
  '/workroom': [{ at: '/workroom', answers: BENCH }],
  '/workroom/bench': [{ at: '/workroom/bench', answers: BENCH }],
  '/workroom/bench/settings': [{ at: '/workroom/bench/settings', answers: BENCH }],
  '/workroom/helpers': [{ at: '/workroom/helpers', answers: BENCH }],
  '/workroom/questions': [{ at: '/workroom/questions', answers: BENCH }],
  '/workroom/money': [{ at: '/workroom/money', answers: TEACHERS }],
  '/workroom/series/new': [{ at: '/workroom/series/new', answers: TEACHERS }],
  '/workroom/settings': [{ at: '/workroom/settings', answers: TEACHERS }],
  '/workroom/series/bring-in': [{ at: '/workroom/series/bring-in', answers: TEACHERS }],
  '/workroom/series/bring-in/[folder]': [{ at: '/workroom/series/bring-in/no-such-folder', answers: '303 403 403 404 404 403 403' }],
  '/workroom/series/[slug]': [{ at: '/workroom/series/low-tide', answers: OWNER }],
  '/workroom/series/[slug]/folder': [{ at: '/workroom/series/low-tide/folder', answers: OWNER }],
  '/workroom/series/[slug]/piece': [{ at: '/workroom/series/low-tide/piece', answers: OWNER }],
  '/workroom/series/[slug]/parts/[part]': [{ at: ofPart(''), answers: OWNER }],
  '/workroom/series/[slug]/before': [{ at: '/workroom/series/low-tide/before', answers: OWNER }],
  '/workroom/series/[slug]/timetable': [{ at: '/workroom/series/low-tide/timetable', answers: OWNER }, { at: '/workroom/series/low-tide/timetable?start=2027-02-31', answers: OWNER }],
  '/workroom/series/[slug]/parts/[part]/gather': [{ at: ofPart('/gather'), answers: OWNER }],
  '/workroom/series/[slug]/parts/[part]/preview': [{ at: ofPart('/preview'), answers: OWNER }],
  '/workroom/series/[slug]/parts/[part]/settings': [{ at: ofPart('/settings'), answers: OWNER }],
  '/workroom/series/[slug]/parts/[part]/versions': [{ at: ofPart('/versions'), answers: OWNER }],
  '/workroom/series/[slug]/parts/[part]/video': [{ at: ofPart('/video'), answers: OWNER }],
  '/workroom/series/[slug]/videos/[name]': [{ at: '/workroom/series/low-tide/videos/dress-the-loom', answers: OWNER }, { at: '/workroom/series/low-tide/videos/nothing', answers: '303 403 403 404 404 403 403' }],
  '/workroom/things': [{ at: '/workroom/things', answers: TEACHERS }],
  '/workroom/series/[slug]/lists': [{ at: '/workroom/series/low-tide/lists', answers: OWNER }],
  '/workroom/notices': [{ at: '/workroom/notices', answers: TEACHERS }],
  '/workroom/notices/new': [{ at: '/workroom/notices/new', answers: TEACHERS }],
  '/workroom/notices/[notice]': [{ at: ({ notice }) => `/workroom/notices/${notice}`, answers: OWNER }],
  // What is out is not written over any more: its teacher is led to it.
  '/workroom/notices/[notice]/edit': [{ at: ({ notice }) => `/workroom/notices/${notice}/edit`, answers: OWNER.replace('200', '303') }],
  '/workroom/students/[seat]': [{ at: ({ seat }) => `/workroom/students/${seat}`, answers: OWNER }],
  '/workroom/students': [{ at: '/workroom/students', answers: TEACHERS }],
};

/** Astro's own doors: actions decide by themselves (their tests are with the use-cases), pictures of the build are public. */
const ASTROS_OWN = new Set(['/_actions/[...path]', '/_image', '/_server-islands/[name]', '/_components']);

test('every route of the program is asked here, and nothing else', () => {
  const patterns = Object.keys(ROUTE_RULES).filter((pattern) => !ASTROS_OWN.has(pattern));
  expect(Object.keys(ROUTES).toSorted()).toEqual(patterns.toSorted());
});

for (const [pattern, lines] of Object.entries(ROUTES)) {
  test(`${pattern} answers everybody as it should`, async () => {
    const places = await demoPlaces();
    for (const { at, answers, post } of lines) {
      const path = typeof at === 'string' ? at : at(places);
      const said: number[] = [];
      for (const asker of ASKERS) {
        const headers = { 'sec-fetch-site': 'same-origin', ...(asker === 'visitor' ? {} : { cookie: await cookieOf(asker) }) };
        const context = await request.newContext({ baseURL: process.env['FELLMARK_TEST_URL'] ?? '', extraHTTPHeaders: headers });
        const answer = post === true ? await context.post(path, { data: {}, maxRedirects: 0 }) : await context.get(path, { maxRedirects: 0 });
        said.push(answer.status());
        await context.dispose();
      }
      const expected = answers.includes(' ') ? answers : Array.from(ASKERS, () => answers).join(' ');
      expect(said.join(' '), `${path} as ${ASKERS.join(', ')}`).toBe(expected);
    }
  });
}

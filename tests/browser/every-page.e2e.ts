/**
 * Every page a person can open, in both schemes, wide and on a phone: nothing that a program can find stands between it
 * and those who hear or zoom it, nothing scrolls sideways even at 320 px, nothing is said in the console, and the
 * content policy has nothing to report.
 */
import { expect } from 'playwright/test';
import { ROUTE_RULES } from '#server/web/route-rules.ts';
import { stateOf, type DemoName } from './support/demo-people.ts';
import { demoPlaces, type DemoPlaces } from './support/demo-places.ts';
import { expectFaultlessEverywhere, test } from './support/test.ts';

type Address = string | ((places: DemoPlaces) => string);

const ofPart = (page: string) => ({ workroomPart }: DemoPlaces): string => `/workroom/series/low-tide/parts/${workroomPart}${page}`;

/** By whom each page is looked at: by those for whom it is fullest. */
const PAGES: Readonly<Record<string, readonly (readonly [who: DemoName | 'visitor', at: Address])[]>> = {
  '/': [['visitor', '/']],
  '/404': [['visitor', '/nothing-here']],
  '/account': [['maud', '/account']],
  '/account/looms': [['maud', '/account/looms']],
  '/confirm/[token]': [['visitor', '/confirm/x']],
  '/forgotten': [['visitor', '/forgotten']],
  '/gifts': [['visitor', '/gifts?series=low-tide&to=Amara&from=Maud&words=For+the+long+evenings']],
  '/handbook': [['visitor', '/handbook']],
  '/handbook/[...slug]': [['visitor', '/handbook/tabby'], ['visitor', '/handbook/yarn-counts']],
  '/loom': [['maud', '/loom'], ['jonas', '/loom'], ['amara', '/loom']],
  '/new-password/[token]': [['visitor', '/new-password/x']],
  '/notices': [['maud', '/notices'], ['amara', '/notices']],
  '/offline': [['visitor', '/offline']],
  '/office': [['pell', '/office']],
  '/office/jobs': [['pell', '/office/jobs']],
  '/office/log': [['pell', '/office/log']],
  '/office/mail': [['pell', '/office/mail']],
  '/office/reports': [['pell', '/office/reports']],
  '/office/reviews': [['pell', '/office/reviews']],
  '/office/people': [['pell', '/office/people'], ['pell', '/office/people?q=nobody-of-this-name']],
  '/office/people/[person]': [['pell', ({ person }) => `/office/people/${person}`]],
  '/prove': [['ilse', '/prove']],
  '/reckoner': [['visitor', '/reckoner']],
  '/refused': [['maud', '/workroom/bench']],
  '/series': [['visitor', '/series'], ['visitor', '/series?q=nothing+like+it']],
  '/series/[slug]': [['visitor', '/series/low-tide'], ['visitor', '/series/low-tide?inside=abc&spacing=8&paying=stopped'], ['maud', '/series/low-tide']],
  '/series/[slug]/[part]': [['visitor', '/series/low-tide/1'], ['maud', '/series/low-tide/2'], ['maud', '/series/low-tide/3'], ['amara', '/series/low-tide/2'], ['jonas', '/series/low-tide/5'], ['ilse', '/series/low-tide/6']],
  '/series/[slug]/timetable': [['maud', '/series/low-tide/timetable']],
  '/series/[slug]/gather': [['visitor', '/series/low-tide/gather'], ['maud', '/series/low-tide/gather'], ['jonas', '/series/low-tide/gather?part=3&show=open']],
  '/series/[slug]/seat': [['maud', '/series/low-tide/seat']],
  '/sign-in': [['visitor', '/sign-in']],
  '/sign-up': [['visitor', '/sign-up']],
  '/wall': [['visitor', '/wall']],
  '/teachers/[handle]': [['visitor', '/teachers/saltmarsh']],
  '/techniques/[name]': [['visitor', '/techniques/soumak'], ['visitor', '/techniques/dovetail']],
  '/series/[slug]/[part]/loomside': [['maud', '/series/low-tide/2/loomside'], ['visitor', '/series/low-tide/1/loomside']],
  '/series/[slug]/finish': [['maud', '/series/low-tide/finish']],
  '/series/[slug]/piece': [['maud', '/series/low-tide/piece']],
  '/workroom': [['ilse', '/workroom'], ['wren', '/workroom'], ['teodor', '/workroom']],
  '/workroom/money': [['ilse', '/workroom/money']],
  '/workroom/series/new': [['ilse', '/workroom/series/new']],
  '/workroom/settings': [['ilse', '/workroom/settings']],
  '/workroom/series/bring-in': [['ilse', '/workroom/series/bring-in']],
  '/workroom/series/[slug]': [['ilse', '/workroom/series/low-tide'], ['teodor', '/workroom/series/three-knotted-cords']],
  '/workroom/series/[slug]/before': [['ilse', '/workroom/series/low-tide/before']],
  '/workroom/series/[slug]/timetable': [['ilse', '/workroom/series/low-tide/timetable']],
  '/workroom/series/[slug]/folder': [['ilse', '/workroom/series/low-tide/folder']],
  '/workroom/series/[slug]/piece': [['ilse', '/workroom/series/low-tide/piece'], ['teodor', '/workroom/series/three-knotted-cords/piece']],
  '/workroom/series/[slug]/parts/[part]': [['ilse', ofPart('')]],
  '/workroom/series/[slug]/parts/[part]/gather': [['ilse', ofPart('/gather')]],
  '/workroom/series/[slug]/parts/[part]/preview': [['ilse', ofPart('/preview')]],
  '/workroom/series/[slug]/parts/[part]/settings': [['ilse', ofPart('/settings')]],
  '/workroom/series/[slug]/parts/[part]/versions': [['ilse', ofPart('/versions')]],
  '/workroom/series/[slug]/parts/[part]/video': [['ilse', ofPart('/video')]],
  '/workroom/series/[slug]/videos/[name]': [['ilse', '/workroom/series/low-tide/videos/dress-the-loom']],
  '/workroom/things': [['ilse', '/workroom/things']],
  '/workroom/series/[slug]/lists': [['ilse', '/workroom/series/low-tide/lists']],
  '/workroom/notices': [['ilse', '/workroom/notices'], ['teodor', '/workroom/notices']],
  '/workroom/notices/new': [['ilse', '/workroom/notices/new'], ['teodor', '/workroom/notices/new']],
  '/workroom/notices/[notice]': [['ilse', ({ notice }) => `/workroom/notices/${notice}`]],
  '/workroom/students/[seat]': [['ilse', ({ seat }) => `/workroom/students/${seat}`]],
  '/workroom/students': [['ilse', '/workroom/students']],
  '/workroom/helpers': [['ilse', '/workroom/helpers'], ['wren', '/workroom/helpers']],
  '/workroom/questions': [['ilse', '/workroom/questions'], ['wren', '/workroom/questions'], ['teodor', '/workroom/questions']],
  '/workroom/bench': [['ilse', '/workroom/bench'], ['teodor', '/workroom/bench']],
  '/workroom/bench/settings': [['ilse', '/workroom/bench/settings'], ['wren', '/workroom/bench/settings']],
};

/** Answers that are no pages of their own, or only after a step that a journey tests. */
const NO_PAGES = new Set([
  '/500', '/_actions/[...path]', '/_image', '/_server-islands/[name]', '/_components', '/helping/[token]', '/leave/[key]', '/workroom/notices/[notice]/edit', '/workroom/series/bring-in/[folder]', '/media/[id]/[file]', '/sign-out', '/series/[slug]/calendar.ics', '/series/[slug]/gather.txt', '/calendar/[key].ics',
  '/robots.txt', '/sitemap.xml', '/series/feed.atom', '/teachers/[handle]/feed.atom', '/series/[slug]/share.png', '/series/[slug]/certificate.pdf',
]);

test('every page of the program is looked at', () => {
  const patterns = Object.keys(ROUTE_RULES).filter((pattern) => !NO_PAGES.has(pattern) && !pattern.startsWith('/api/'));
  expect(Object.keys(PAGES).toSorted()).toEqual(patterns.toSorted());
});

for (const [pattern, looks] of Object.entries(PAGES)) {
  for (const [who, at] of looks) {
    test.describe(() => {
      if (who !== 'visitor') test.use({ storageState: stateOf(who) });
      test(`${pattern} for ${who} (${typeof at === 'string' ? at : pattern})`, async ({ page }) => {
        await page.goto(typeof at === 'string' ? at : at(await demoPlaces()));
        await expectFaultlessEverywhere(page);
      });
    });
  }
}

test('a form that was refused', async ({ page }) => {
  await page.goto('/sign-up');
  await page.getByRole('main').getByRole('button', { name: 'Make my account', exact: true }).click();
  await expect(page.getByRole('heading', { name: '3 things do not work yet' })).toBeVisible();
  await expectFaultlessEverywhere(page);
});

test('a series tried on a loom, with all that is folded away', async ({ page }) => {
  await page.goto('/series/low-tide?inside=14&spacing=5%2F16&ends=2&units=in&wide=most#try');
  await expect(page.getByRole('button', { name: 'Reckon for this loom' })).toHaveCount(0);
  await page.getByText('See every number').click();
  await page.getByText('What can stand in for what').click();
  await expectFaultlessEverywhere(page);
});
